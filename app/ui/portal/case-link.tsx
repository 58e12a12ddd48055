import { Link } from 'react-router';
import { WitnessMark } from '../mark/witness-mark.tsx';
import type { PortalCaseLinkView } from '../types.ts';

const tones = { plain: '', waiting: 'text-amber', sealed: 'text-verdigris' };

/** One of the owner's instruments: picture, state, one sentence. */
export function CaseLink({ item }: { item: PortalCaseLinkView }) {
  const { photo } = item;
  return (
    <Link to={item.href} className="panel case-link">
      <span className="mat mat-small">
        <span className="mat-window">
          {photo ? (
            <img
              src={photo.src}
              width={photo.width}
              height={photo.height}
              alt={photo.alt ?? ''}
              style={{ backgroundImage: photo.placeholder && `url(${photo.placeholder})` }}
            />
          ) : (
            <span className="mat-empty">
              <WitnessMark state="hollow" size={24} />
            </span>
          )}
        </span>
      </span>
      <span>
        <span className="block font-serif text-lead leading-tight font-medium">
          {item.instrument}
        </span>
        <span className="block text-label text-ink-3">
          {[item.maker, item.number].filter(Boolean).join(', ')}
        </span>
        <b className={`mt-1.5 block ${tones[item.tone]}`}>{item.state}</b>
        {item.sentence}
      </span>
    </Link>
  );
}
