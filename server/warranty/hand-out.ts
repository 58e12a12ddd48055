import { dayIn } from '#domain/calendar.ts';
import { formatCode } from '#evidence/code/format-code.ts';
import { run, transaction } from '#server/db/sql.ts';
import { signHead } from '#server/evidence/sign-head.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { mailOwner } from '#server/record/mail-owner.ts';
import { readShop } from '#server/shop/read-shop.ts';
import type { Warranty } from './warranty.ts';
import { dayInWords } from './words.ts';

/** Last step: a checkpoint over the paper, and only then is it handed out and the owner told. */
export async function handOut(warranty: Warranty, now: Date): Promise<void> {
  await signHead({ now });
  const { timeZone } = await readShop();
  await transaction(async (tx) => {
    const issued = await run(
      "UPDATE warranties SET step = 'issued', issued_at = ? WHERE id = ? AND step = 'paper'",
      [now, warranty.id],
      tx,
    );
    if (issued === 0) return;
    await mailOwner(tx, warranty.caseId, `warranty-issued/${warranty.id}`, (about) => ({
      template: 'warranty-issued',
      data: {
        ...about,
        code: formatCode(warranty.code),
        validUntil: dayInWords(dayIn(warranty.validUntil, timeZone)),
      },
    }));
    await touchCase(tx, warranty.caseId);
  });
}
