import type { RestTimeView, RestView } from '../types.ts';
import { RestRule } from './rest-rule.tsx';

/** Share of the rule's length that one label needs. */
const ROOM = 0.24;

/** Labels under the rule, each at its hour; one that would touch another is left to the words below. */
function endsThatFit(rest: RestView): { hour: number; text: string; left?: string }[] {
  const total = rest.rule.hours;
  const [first, last] = [rest.ends[0], rest.ends.at(-1)];
  if (!first || !last) return [];
  let reached = ROOM / 2;
  const between = rest.ends.slice(1, -1).filter((end) => {
    const at = end.hour / total;
    if (at - ROOM / 2 < reached || at + ROOM / 2 > 1 - ROOM / 2) return false;
    reached = at + ROOM / 2;
    return true;
  });
  return [
    first,
    ...between.map((end) => ({ ...end, left: `${((end.hour / total) * 100).toFixed(2)}%` })),
    last,
  ];
}

/** "Thu 09:40"; once passed "Thu 09:40, off", "since Thu 09:40". */
function timeWords({ name, when, state }: RestTimeView): string {
  if (state !== 'passed') return when;
  return name === 'Clamps off' ? `${when}, off` : `since ${when}`;
}

/** A rest with its up to three times: the next in a sentence, the rule, all of them in words. */
export function RestClock({ rest }: { rest: RestView }) {
  return (
    <div className={`rest-clock ${rest.over ? 'rest-clock-over' : ''}`}>
      <p className="rest-head">
        <b>{rest.sentence}</b>
        {rest.left && <span className="text-ink-2">{rest.left}</span>}
      </p>
      <RestRule rule={rest.rule} height={30} over={rest.over} />
      <p className="rest-ends">
        {endsThatFit(rest).map((end) => (
          <span key={end.hour} style={end.left ? { left: end.left } : undefined}>
            {end.text}
          </span>
        ))}
      </p>
      <dl className="rest-times">
        {rest.times.map((time) => (
          <div key={time.name} className={time.state === 'next' ? 'rest-next' : undefined}>
            <dt>{time.name}</dt>
            <dd>{timeWords(time)}</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}
