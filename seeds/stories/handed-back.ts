import type { DemoClock } from '../demo-clock.ts';
import type { Cast } from '../demo-shop.ts';
import { Story } from '../story.ts';

/** Small jobs that went home again, so that numbers run without gaps and there is something to find. */
export function handedBack(
  { workday }: DemoClock,
  { tomasz, priya }: Cast,
  series: number,
): Story[] {
  const job = (
    daysAgo: number,
    owner: { name: string; email: string },
    instrument: { kind: string; maker: string; serial?: string },
    words: { job: string; came: string; done: string; title: string },
  ) =>
    new Story()
      .takenIn(
        workday(daysAgo, '15:40'),
        priya,
        {
          owner: { ...owner, tellBy: 'email' },
          instrument,
          job: words.job,
          complaint: words.came,
          accessories: '',
          consentPhotos: 'on',
          technicianId: tomasz.personId,
        },
        { phase: 'before', title: 'Taken in at the counter', text: words.came },
        { by: priya, minutesLater: 5 },
        series,
      )
      .entry(
        workday(daysAgo - 1, '14:05'),
        tomasz,
        { phase: 'after', title: words.title, text: words.done, minutes: 45 },
        { by: tomasz, minutesLater: 8 },
      )
      .closed(workday(daysAgo - 1, '16:30'), priya)
      .handedBack(workday(daysAgo - 2, '12:10'), priya);

  return [
    job(
      18,
      { name: 'Ottoline Reeve', email: 'ottoline.reeve@saltmere.example' },
      { kind: 'Ukulele', maker: 'Pell & Sons' },
      {
        job: 'New strings, sharp fret ends',
        came: 'Fret ends scratch the hand along the treble side.',
        title: 'Fret ends dressed, restrung',
        done: 'Ends filed flush and rounded, board oiled, new fluorocarbon strings.',
      },
    ),
    job(
      14,
      { name: 'Fergus Tannahill', email: 'fergus.tannahill@saltmere.example' },
      { kind: 'Banjo', maker: 'Enright', serial: '530' },
      {
        job: 'Head slack',
        came: 'The head has gone slack and the action with it.',
        title: 'Head brought up, bridge placed',
        done: 'Hooks brought up crosswise by quarter turns to an even note all round; bridge placed at the twelfth fret.',
      },
    ),
    job(
      11,
      { name: 'Imre Sandor Holt', email: 'imre.holt@saltmere.example' },
      { kind: 'Classical guitar', maker: 'unknown' },
      {
        job: 'Buzz on the open sixth',
        came: 'Buzzes on the open sixth string only.',
        title: 'Nut slot filled and recut',
        done: 'Sixth slot had gone below the fret plane; filled with bone dust and recut to height.',
      },
    ),
    job(
      9,
      { name: 'Rosalind Achterberg', email: 'rosalind.achterberg@saltmere.example' },
      { kind: 'Electric guitar', maker: 'Corvane', serial: 'C1990' },
      {
        job: 'Crackling jack',
        came: 'The jack crackles when the lead moves.',
        title: 'Jack replaced',
        done: 'Contact worn through; jack replaced, solder joints redone, earth checked.',
      },
    ),
    job(
      7,
      { name: 'Saltmere Sinfonia', email: 'saltmere.sinfonia@saltmere.example' },
      { kind: 'Violin', maker: 'Brandreth & Daughter', serial: 'B&D 6' },
      {
        job: 'Soundpost fell',
        came: 'The post fell when the strings were changed. Strings slack, bridge off.',
        title: 'Soundpost set',
        done: 'Post set to its old marks, bridge up, brought to pitch evenly.',
      },
    ),
  ];
}
