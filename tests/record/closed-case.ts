import { sealEntry } from '#server/record/seal-entry.ts';
import { closeCase } from '#server/record/close-case.ts';
import { addPhoto, writeDraft } from './entries.ts';
import { keepCopy } from './picture.ts';
import { takeInCase, type TestCase, type TestShop } from './shop.ts';

/** A case with three sealed entries, one of them for the bench only, and photos; closed at `now`. */
export async function closedCase(
  shop: TestShop,
  { now, consent = 'work' }: { now: Date; consent?: 'number' | 'work' },
): Promise<TestCase> {
  const repair = await takeInCase(shop, { consent });
  const { technician } = shop;
  const entries = [
    { title: 'Taken in', phase: 'before', caption: 'Bridge lifted along its back edge' },
    { title: 'Bridge reglued', phase: 'during', caption: null },
    { title: 'Strung up', phase: 'after', caption: 'Bridge seated on its marks' },
  ] as const;
  for (const { title, phase, caption } of entries) {
    const entryId = await writeDraft(repair, technician, { title, phase, benchNote: 'Clamp 4.' });
    if (caption) {
      const n = await addPhoto(repair, entryId, technician, { caption, stored: true });
      await keepCopy(repair, n, phase === 'before' ? 90 : 160);
    }
    await sealEntry(technician, { caseNumber: repair.number, entryId }, { now });
  }
  const hidden = await writeDraft(repair, technician, {
    title: 'Neck angle',
    visibility: 'bench',
    phase: 'during',
  });
  await sealEntry(technician, { caseNumber: repair.number, entryId: hidden }, { now });
  await closeCase(shop.desk, { caseNumber: repair.number }, { now });
  return repair;
}
