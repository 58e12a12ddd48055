import type { StaffViewer } from '#domain/viewer.ts';
import { drawWarranty } from '#server/warranty/draw-warranty.ts';
import { issueWarranty } from '#server/warranty/issue-warranty.ts';

/** Issues the bass's warranty for two years on what holds the head on. */
export async function bassWarranty(by: StaffViewer, caseNumber: string, now: Date): Promise<void> {
  const { lines } = await drawWarranty(by, { caseNumber });
  const workOf = (title: string, text: string) => {
    const line = lines.find((proposed) => proposed.text === title);
    if (!line) throw new Error(`The case has no sealed entry “${title}”.`);
    return { text, personId: line.personId };
  };
  await issueWarranty(
    by,
    {
      caseNumber,
      months: '24',
      work: [
        workOf('Break glued', 'Headstock break glued, wood glue, aliphatic'),
        workOf('Splines glued in', 'Two maple splines across the break, 80 × 9 × 8 mm'),
        workOf('Trimmed, coloured, last coat of lacquer', 'Back of neck and head refinished'),
        workOf('Rubbed out, tuners back, strung and set up', 'Tuners back in their order, set up'),
        workOf('Looked over before it goes home', 'Looked over before hand-back'),
      ],
    },
    { now },
  );
}
