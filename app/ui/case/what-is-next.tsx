import type { ReactNode } from 'react';
import { WitnessMark } from '../mark/witness-mark.tsx';
import { RestNext } from '../rest/rest-next.tsx';
import type { WhatIsNextView } from '../types.ts';
import './case.css';

const tones = { plain: '', waiting: 'text-amber', sealed: 'text-verdigris' };

interface Props {
  next: WhatIsNextView;
  /** "Add to timeline", and what else can be done; the phone has it in its dock. */
  children?: ReactNode;
}

/** What the case waits for and the steps that are left. */
export function WhatIsNext({ next, children }: Props) {
  const { rest, restNote, headline } = next;
  return (
    <aside className="panel what-is-next" aria-labelledby="what-is-next">
      <h2 id="what-is-next">What is next</h2>
      {rest && (
        <div className="next-rest">
          <p>
            <b className={rest.over ? '' : 'text-amber'}>
              {rest.over ? '' : 'Resting. '}
              {rest.headline}
            </b>
          </p>
          {restNote && <p className="text-ink-2">{restNote}</p>}
          <RestNext rest={rest} />
        </div>
      )}
      {headline && <p className={`mb-3 font-semibold ${tones[headline.tone]}`}>{headline.text}</p>}
      {next.steps.length > 0 && (
        <ol className="next-steps">
          {next.steps.map((step) => (
            <li key={step}>
              <WitnessMark state="hollow" size={20} className="text-ink-3" />
              <span>{step}</span>
            </li>
          ))}
        </ol>
      )}
      {children && <div className="next-do">{children}</div>}
      <dl className="next-facts">
        {next.facts.map((fact) => (
          <div key={fact.label}>
            <dt>{fact.label}</dt>
            <dd>
              {fact.value}
              {fact.note && <small>{fact.note}</small>}
            </dd>
          </div>
        ))}
      </dl>
    </aside>
  );
}
