import type { Route } from './+types/log';
import { dateYearTime } from '#app/lib/format/date.ts';
import { groupedDigest } from '#app/lib/format/digest.ts';
import { refuse } from '#app/lib/problem.ts';
import { describeLog, type OwnEntry } from '#server/evidence/describe-log.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { PublicFrame } from './frame.tsx';

const KIND: Record<OwnEntry['kind'], string> = {
  'log-start': 'The log began',
  key: 'A key',
  stamps: 'Time-stamps listed',
  clock: 'The clock was set',
  lost: 'Contents lost',
};
const ACT: Record<string, string> = { add: 'added', retire: 'retired', revoke: 'revoked' };
const USE: Record<string, string> = {
  log: 'signs the log’s heads',
  credential: 'signs warranties and their standing',
  paper: 'signs papers, for PDF readers',
  witness: 'signs heads of other shops’ logs',
};

export async function loader() {
  const [{ origin, head, keys, own }, { timeZone: zone }] = await Promise.all([
    describeLog(),
    readShop(),
  ]).catch(refuse);
  return {
    origin,
    head: head && {
      note: head.note,
      size: head.size,
      at: dateYearTime(head.madeAt, zone),
    },
    keys: keys.map(({ id, use, alg, addedAt, retiredAtLeaf, revokedAtLeaf }) => ({
      id: groupedDigest(id),
      does: USE[use] ?? use,
      alg,
      since: dateYearTime(addedAt, zone),
      state: revokedAtLeaf !== null ? 'revoked' : retiredAtLeaf !== null ? 'retired' : 'in use',
    })),
    own: own.map(({ leafIndex, kind, recordedAt, key }) => ({
      leafIndex,
      at: dateYearTime(recordedAt, zone),
      text: key
        ? `${KIND[kind]} was ${ACT[key.act] ?? key.act}: ${USE[key.use] ?? key.use}`
        : KIND[kind],
    })),
  };
}

export default function LogPage({ loaderData }: Route.ComponentProps) {
  const { origin, head, keys, own } = loaderData;
  return (
    <PublicFrame current="log">
      <title>The witness log · Witnessmark</title>
      <main className="mx-auto max-w-[52rem] px-8 pt-10 pb-20 max-phone:px-4">
        <h1>The witness log</h1>
        <p className="mt-4 text-note">
          Everything this shop seals takes its place in one log that is only ever added to. Its
          entries are public and say nothing but when and how many. Its head is signed, and goes out
          with every paper and every mail: keep one, and the log can never be rewritten unseen.
        </p>
        <p className="mt-4 [overflow-wrap:anywhere]">
          Its name is <code>{origin}</code>.
        </p>
        <h2 className="mt-10">The newest signed head</h2>
        {head ? (
          <>
            <p className="mt-2">
              {head.size} entries, made {head.at}. For programs:{' '}
              <a href="/api/log/checkpoint">the head as it was signed</a>,{' '}
              <a href="/api/log/entries">all entries up to it</a>.
            </p>
            <pre className="mt-3 bg-well p-4 text-micro break-all whitespace-pre-wrap">
              {head.note}
            </pre>
          </>
        ) : (
          <p className="mt-2">No head is signed yet. Look again in a minute.</p>
        )}
        <h2 className="mt-10">The shop’s keys</h2>
        <p className="mt-2">
          Compare the first with the one on your paper. For programs:{' '}
          <a href="/api/log/keys">all keys</a>.
        </p>
        <ul className="mt-3 grid gap-3">
          {keys.map(({ id, does, alg, since, state }) => (
            <li key={id} className="panel p-4">
              <code className="[overflow-wrap:anywhere]">{id}</code>
              <p className="mt-1 text-ink-2">
                {does}; {alg}; since {since}; {state}
              </p>
            </li>
          ))}
        </ul>
        <h2 className="mt-10">The log’s own entries</h2>
        <ol className="mt-3 grid gap-1">
          {own.map(({ leafIndex, at, text }) => (
            <li key={leafIndex}>
              <span className="text-ink-3">
                {leafIndex}, {at}:
              </span>{' '}
              {text}
            </li>
          ))}
        </ol>
      </main>
    </PublicFrame>
  );
}
