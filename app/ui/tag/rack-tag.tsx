import { Link } from 'react-router';
import { WitnessMark } from '../mark/witness-mark.tsx';
import { RestRule } from '../rest/rest-rule.tsx';
import type { RackTagView } from '../types.ts';
import './tag.css';

const tones = { plain: '', waiting: 'text-amber', sealed: 'text-verdigris' };

function Waits({ tag }: { tag: RackTagView }) {
  const tone = tag.rest?.over ? '' : tones[tag.tone];
  return (
    <span className={`rack-waits ${tone}`}>
      {tag.tone === 'sealed' && <WitnessMark state="aligned" size={18} />}
      <span>{tag.waitsFor}</span>
    </span>
  );
}

/** One case on its rail. The whole tag is one link. */
export function RackTag({ tag }: { tag: RackTagView }) {
  const { photo, rest } = tag;
  return (
    <Link className="rack-tag tag-paper" to={tag.href} aria-label={tag.name}>
      <svg className="rack-string" viewBox="0 0 30 30" aria-hidden>
        <path d="M15 24C11 17 10 12 8 0M15 24C19 17 20 12 22 0" />
      </svg>
      <span className="eyelet" />
      <span className="rack-top">
        <span>
          <span className="rack-year">{tag.year}</span>
          <span className="rack-number">{tag.number}</span>
        </span>
        <span className="rack-thumb">
          {photo ? (
            <img
              src={photo.src}
              width={60}
              height={45}
              alt=""
              loading="lazy"
              decoding="async"
              style={
                photo.placeholder ? { backgroundImage: `url(${photo.placeholder})` } : undefined
              }
            />
          ) : (
            <span className="grid place-items-center">
              <WitnessMark state="hollow" size={22} className="text-ink-3" />
            </span>
          )}
        </span>
      </span>
      <span>
        <b>{tag.instrument}</b>
        {tag.maker && `, ${tag.maker}`}
      </span>
      <span className="text-ink-2">{tag.owner}</span>
      <Waits tag={tag} />
      {rest && (
        <span className="mt-1.5 block">
          <RestRule rule={rest.rule} height={14} over={rest.over} />
        </span>
      )}
      <span className="rack-foot">
        {rest && <span>{rest.left}</span>}
        <span>{tag.promised}</span>
        {!rest && tag.who && <span>{tag.who}</span>}
      </span>
    </Link>
  );
}

/** The same in one line, for a rail with more tags than can hang on it. */
export function RackRow({ tag }: { tag: RackTagView }) {
  return (
    <Link to={tag.href} aria-label={tag.name}>
      <span className="font-serif text-h3 leading-none">{tag.number}</span>
      <span>
        <b>{tag.instrument}</b>
        {tag.maker && `, ${tag.maker}`}
      </span>
      <span className="text-ink-2">{tag.owner}</span>
      <span className={`font-semibold ${tones[tag.tone]}`}>{tag.waitsFor}</span>
      <span className="text-label text-ink-3">{tag.promised}</span>
    </Link>
  );
}
