import { Tick } from '../mark/tick.tsx';
import type { CheckRowView } from '../types.ts';
import './verify.css';

const states = { good: 'aligned', bad: 'displaced', open: 'hollow' } as const;

function Row({ row }: { row: CheckRowView }) {
  const codes = [row.heldCode ?? []].flat();
  return (
    <li className={`check-row check-${row.result}`}>
      <div className="check-held">
        {row.held && <b>{row.held}</b>}
        {codes.length > 0 && (
          <span>
            {codes.map((code) => (
              <code key={code} className="block">
                {code}
              </code>
            ))}
          </span>
        )}
        {row.heldNote && <span>{row.heldNote}</span>}
      </div>
      <Tick state={states[row.result]} />
      <div className="check-found">
        <b>{row.word}</b>
        {(row.note || row.noteCode) && (
          <span>
            {row.note} {row.noteCode && <code>{row.noteCode}</code>}
          </span>
        )}
      </div>
    </li>
  );
}

interface Props {
  /** "What you hold" and "What was checked here" unless said otherwise. */
  heads?: { held: string; found: string };
  rows: CheckRowView[];
}

/** One row for each check. A row says only what was done. */
export function CheckRows({ heads, rows }: Props) {
  return (
    <>
      <div className="check-heads">
        <h2>{heads?.held ?? 'What you hold'}</h2>
        <h2>{heads?.found ?? 'What was checked here'}</h2>
      </div>
      <ul>
        {rows.map((row) => (
          <Row key={`${row.held}${[row.heldCode].flat().join()}`} row={row} />
        ))}
      </ul>
    </>
  );
}
