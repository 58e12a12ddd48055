import type { StaffViewer } from '#domain/viewer.ts';
import type { DemoClock } from '../demo-clock.ts';
import type { Cast } from '../demo-shop.ts';
import { Story, type Words } from '../story.ts';

interface Taken {
  at: Date;
  by: StaffViewer;
  technician: StaffViewer;
  owner: string;
  instrument: { kind: string; maker: string; model?: string; serial?: string };
  job: string;
  text: string;
  nextStep: string;
  promisedOn?: string;
  picture?: string;
  series: number;
}

const addressOf = (owner: string) =>
  `${owner
    .toLowerCase()
    .replace(/[^a-z]+/g, '.')
    .replace(/\.$/, '')}@saltmere.example`;

/** Takes an instrument in as the counter does on an ordinary day: one entry, at most one photo. */
function taken({ at, by, technician, owner, picture, ...about }: Taken): Story {
  const { instrument, job, text, nextStep, promisedOn = '', series } = about;
  return new Story().takenIn(
    at,
    by,
    {
      owner: { name: owner, email: addressOf(owner), tellBy: 'email' },
      instrument,
      job,
      complaint: text,
      accessories: 'Case',
      consentPhotos: 'on',
      promisedOn,
      technicianId: technician.personId,
      nextStep,
    },
    {
      phase: 'before',
      title: 'Taken in at the counter',
      text,
      photos: picture
        ? [
            {
              file: `other/${picture}.jpg`,
              caption: `${instrument.kind}, whole front, as received`,
            },
          ]
        : [],
    },
    { by, minutesLater: 14 },
    series,
  );
}

/** Cases on the bench or resting. */
export function atWork(
  { workday, hoursAgo, dayAhead }: DemoClock,
  cast: Cast,
  series: number,
): Story[] {
  const { ines, priya } = cast;
  const varnish: Words = {
    phase: 'during',
    title: 'Retouching varnish on the upper bout',
    text: 'Wear from the player’s hand cleaned and sealed; three thin coats of oil varnish over two weeks, this one the last. Nothing touches it before it is hard.',
    used: ['Oil varnish'],
    temperature: '20',
    humidity: '47',
    minutes: 30,
    rest: {
      product: 'Oil varnish, drying oil',
      clampsOffHours: null,
      workedHours: '336',
      stringsHours: null,
    },
  };
  return [
    taken({
      at: workday(15, '10:40'),
      by: priya,
      technician: ines,
      series,
      owner: 'R. Castellane',
      instrument: { kind: 'Viola', maker: 'Tobias Enright', serial: '88' },
      job: 'Worn varnish on the upper bout',
      text: 'Varnish worn through to the wood where the hand rests.',
      nextStep: 'Look at the varnish',
      promisedOn: dayAhead(12),
      picture: 'viola',
    }).entry(workday(8, '15:30'), ines, varnish, { by: ines, minutesLater: 20 }),
    taken({
      at: workday(6, '09:20'),
      by: priya,
      technician: ines,
      series,
      owner: 'Saltmere Sinfonia',
      instrument: { kind: 'Cello', maker: 'Brandreth & Daughter', serial: 'B&D 14' },
      job: 'Open seam, lower bout, bass side',
      text: 'Buzzes on the open G. Seam open 60 mm at the lower bout; a knuckle tap sounds hollow there.',
      nextStep: 'Clean the open seam',
      promisedOn: dayAhead(5),
      picture: 'cello',
    }),
    taken({
      at: workday(4, '11:10'),
      by: priya,
      technician: ines,
      series,
      owner: 'Piet Anholt',
      instrument: { kind: 'Classical guitar', maker: 'Ysolde Yarrow', serial: '212' },
      job: 'Worn roller holes in the slotted head',
      text: 'The fourth and fifth strings slip. Roller holes worn oval; machines themselves run true.',
      nextStep: 'Bush the worn roller holes',
      promisedOn: dayAhead(13),
      picture: 'classical-guitar',
    }),
    taken({
      at: hoursAgo(2.2),
      by: priya,
      technician: priya,
      series,
      owner: 'Nell Farrow',
      instrument: { kind: 'Violin', maker: 'Enright', model: '3/4' },
      job: 'Bridge leans, one peg slips',
      text: 'The bridge leans towards the fingerboard and the A peg will not hold.',
      nextStep: 'Look over, write estimate',
      picture: 'violin-small',
    }),
  ];
}

/** Cases that wait for their owner's answer. */
export function waiting({ workday, hoursAgo }: DemoClock, cast: Cast, series: number): Story[] {
  const { ines, tomasz, priya } = cast;
  return [
    taken({
      at: workday(5, '14:50'),
      by: priya,
      technician: ines,
      series,
      owner: 'Joan Abernathy',
      instrument: { kind: 'Archtop guitar', maker: 'Pell & Sons', serial: '3061' },
      job: 'Neck joint moves',
      text: 'The action climbs when it is strung up: the heel opens by 0.4 mm at the back.',
      nextStep: 'Estimate sent',
      picture: 'archtop-guitar',
    }).estimate(
      workday(2, '12:15'),
      priya,
      'Neck out, joint cleaned and refitted, neck set to its line, strung and set up',
      '612.00',
    ),
    taken({
      at: workday(2, '16:25'),
      by: priya,
      technician: tomasz,
      series,
      owner: 'Ade Boateng',
      instrument: { kind: 'Electric guitar', maker: 'Corvane', serial: 'C2043' },
      job: 'High frets above the twelfth',
      text: 'Chokes out on bends above the twelfth fret, first and second string.',
      nextStep: 'Estimate sent',
      picture: 'electric-guitar',
    }).estimate(
      hoursAgo(3.5),
      priya,
      'Frets 12 to 22 levelled, crowned and polished; set up',
      '95.00',
    ),
  ];
}

/** Cases that are closed and wait to be collected. */
export function readyToGoHome(
  { workday, dayAhead }: DemoClock,
  cast: Cast,
  series: number,
): Story[] {
  const { ines, tomasz, priya } = cast;
  return [
    taken({
      at: workday(35, '15:15'),
      by: priya,
      technician: ines,
      series,
      owner: 'Bea Lindqvist',
      instrument: { kind: 'Tenor guitar', maker: 'Ysolde Yarrow', serial: '97' },
      job: 'Loose brace',
      text: 'Rattles on the low string. A brace end has come away at the lower bout.',
      nextStep: 'Glue the brace',
      promisedOn: dayAhead(0),
      picture: 'tenor-guitar',
    })
      .entry(
        workday(12, '11:00'),
        ines,
        {
          phase: 'after',
          title: 'Brace glued down',
          text: 'Brace end cleaned, hot hide glue worked in with a thin blade, jack under it for a day. No rattle at pitch.',
          used: ['Hot hide glue, 192 gram strength'],
          temperature: '20',
          humidity: '47',
          minutes: 60,
        },
        { by: ines, minutesLater: 15 },
      )
      .closed(workday(4, '15:30'), ines),
    taken({
      at: workday(20, '09:50'),
      by: priya,
      technician: tomasz,
      series,
      owner: 'Hugo Marchetti',
      instrument: { kind: 'Violin', maker: 'Haldane', serial: '1127' },
      job: 'Pegs fitted anew',
      text: 'Pegs stick and slip by turns with the weather; the holes are worn out of round.',
      nextStep: 'Fit the pegs',
      promisedOn: dayAhead(1),
      picture: 'violin',
    })
      .entry(
        workday(5, '10:20'),
        tomasz,
        {
          phase: 'after',
          title: 'Four pegs fitted',
          text: 'Holes reamed to 1 : 30, new pegs shaved to fit and dressed. All four hold at pitch and turn without a jump.',
          used: ['Four boxwood pegs', 'Peg paste'],
          minutes: 110,
        },
        { by: tomasz, minutesLater: 20 },
      )
      .closed(workday(1, '16:40'), ines),
  ];
}
