import { ShapeError } from '#evidence/errors.ts';
import { ENTRIES_PER_CASE } from '#evidence/limits.ts';
import { LOG_CASE, type Header } from '#evidence/seal/header.ts';
import { isCaseKind, isLogKind } from '#evidence/seal/kinds.ts';

/**
 * The rules that join a header's members and hold without any other entry.
 * @throws ShapeError naming the first rule that is broken
 */
export function checkHeader(header: Header): void {
  for (const [broken, path, rule] of header.case === LOG_CASE ? ownChain(header) : inCase(header)) {
    if (broken) throw new ShapeError(`The header breaks a rule: ${rule}.`, path);
  }
}

type Rule = [broken: boolean, path: string, rule: string];

function always({ seq, prev }: Header): Rule {
  return [(seq === 0) !== (prev === null), 'prev', 'the first entry alone has none before it'];
}

function ownChain(header: Header): Rule[] {
  const { kind, seq, visibility, photos, parts, occurredAt } = header;
  return [
    always(header),
    [isCaseKind(kind), 'kind', 'this kind belongs to a case'],
    [(kind === 'log-start') !== (seq === 0), 'kind', 'a log starts once, with its first entry'],
    [visibility !== 'shared', 'visibility', 'the log’s own entries are open to all'],
    [photos.length > 0, 'photos', 'the log’s own entries have no photos'],
    [Object.keys(parts).join() !== 'shown', 'parts', 'the log’s own entries have one part, shown'],
    [occurredAt !== null, 'occurredAt', 'the log’s own entries tell of no other time'],
  ];
}

function inCase(header: Header): Rule[] {
  const { kind, seq, visibility, photos, parts, occurredAt } = header;
  const bench = visibility === 'bench';
  return [
    always(header),
    [isLogKind(kind), 'kind', 'this kind belongs to the log’s own chain'],
    [seq >= ENTRIES_PER_CASE, 'seq', `a case has at most ${ENTRIES_PER_CASE} entries`],
    [bench && 'shown' in parts, 'parts', 'an entry for the bench only shows nothing'],
    [bench && occurredAt !== null, 'occurredAt', 'an entry for the bench only tells no time'],
    [
      bench && photos.some((photo) => photo.visibility === 'shared'),
      'photos',
      'an entry for the bench only shares no photo',
    ],
  ];
}
