import type { CaseTagView } from '../types.ts';
import './tag.css';

/** The tag of a case. On the phone it lies on its side and keeps its three most needed rows. */
export function Tag({ tag }: { tag: CaseTagView }) {
  return (
    <section className="tag tag-paper" aria-label="Instrument tag">
      <svg className="tag-string" viewBox="0 0 28 46" aria-hidden>
        <path d="M14 43C10 28.5 9 13.8 4 0M14 43C18 28.5 19 13.8 24 0" />
      </svg>
      <span className="eyelet" aria-hidden />
      <p className="tag-year">{tag.year}</p>
      <p className="tag-number">{tag.number}</p>
      <dl>
        <div>
          <dt>Instrument</dt>
          <dd>
            {tag.instrument}
            {tag.maker && <small>{tag.maker}</small>}
          </dd>
        </div>
        {tag.serial && (
          <div className="tag-desk">
            <dt>Serial</dt>
            <dd className="font-mono font-normal">{tag.serial}</dd>
          </div>
        )}
        <div>
          <dt>Owner</dt>
          <dd className="tag-light">{tag.owner}</dd>
        </div>
        <div className="tag-desk">
          <dt>Taken in</dt>
          <dd>{tag.takenIn}</dd>
        </div>
        <div>
          <dt className="tag-said">Promised</dt>
          <dd>{tag.promised}</dd>
        </div>
        <div className="tag-desk">
          <dt>For</dt>
          <dd className="font-normal">{tag.complaint}</dd>
        </div>
      </dl>
    </section>
  );
}
