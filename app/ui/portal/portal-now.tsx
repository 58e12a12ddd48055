import { RestNext } from '../rest/rest-next.tsx';
import { Stressed } from '../stressed.tsx';
import type { PortalNowView } from '../types.ts';

const tones = { plain: '', waiting: 'text-amber', sealed: 'text-verdigris' };

/** Where an instrument is now, in one word and one sentence. */
export function PortalNow({ now }: { now: PortalNowView }) {
  return (
    <section className="panel portal-now" aria-label="Now">
      <p className="portal-state">
        <b className={now.rest?.over ? '' : tones[now.tone]}>{now.state}</b>
        {now.since && <span className="text-ink-2">{now.since}</span>}
      </p>
      <p className="mt-2">
        <Stressed sentence={now.sentence} stress={now.stress} />
      </p>
      {now.rest && <RestNext rest={now.rest} right={now.rest.to} />}
      <PlainRows rows={now.rows} />
    </section>
  );
}

/** Label left, value right, a hairline between. */
export function PlainRows({ rows }: { rows: { label: string; value: string; mono?: boolean }[] }) {
  return (
    <dl className="plain-rows">
      {rows.map((row) => (
        <div key={row.label}>
          <dt>{row.label}</dt>
          <dd className={row.mono ? 'font-mono font-normal' : ''}>{row.value}</dd>
        </div>
      ))}
    </dl>
  );
}
