import type { RestNextView } from '../types.ts';
import { RestRule } from './rest-rule.tsx';

/** The rule up to the next time alone; `ends` are what stands under its two ends. */
export function RestNext({ rest, right }: { rest: RestNextView; right?: string }) {
  return (
    <>
      <RestRule rule={rest.rule} over={rest.over} />
      <p className="rest-ends">
        <span>{rest.from}</span>
        <span>{right ?? rest.left}</span>
      </p>
    </>
  );
}
