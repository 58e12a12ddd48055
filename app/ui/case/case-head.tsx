import type { CaseTagView } from '../types.ts';
import './case.css';

/** The tag in one line, over the parts of a case that need the whole width. */
export function CaseHead({ tag }: { tag: CaseTagView }) {
  const instrument = [tag.instrument, tag.maker].filter(Boolean).join(', ');
  return (
    <div className="case-head">
      <p className="case-head-number">
        {tag.year} <b>{tag.number}</b>
      </p>
      <p>
        <b className="text-note">
          {instrument} {tag.serial}
        </b>
        <br />
        <span className="text-ink-2">
          {tag.owner}, promised {tag.promised}
        </span>
      </p>
    </div>
  );
}
