import type { FactView } from '../types.ts';

const faces = { measured: '', 'worked-out': 'italic', words: 'fact-words' };

/** Measurements upright, worked-out values in italic, the rest in words. */
export function Facts({ facts }: { facts: FactView[] }) {
  if (facts.length === 0) return null;
  return (
    <dl className="facts">
      {facts.map((fact) => (
        <div key={fact.label}>
          <dt>{fact.label}</dt>
          <dd className={faces[fact.kind]}>
            {fact.value}
            {fact.unit && (
              <>
                {'\u00a0'}
                <small>{fact.unit}</small>
              </>
            )}
          </dd>
        </div>
      ))}
    </dl>
  );
}
