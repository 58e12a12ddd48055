import type { DemoClock } from '../demo-clock.ts';
import type { Cast } from '../demo-shop.ts';
import { Story } from '../story.ts';
import { bassWarranty } from './electric-bass-warranty.ts';

const GLUE = 'Wood glue, aliphatic; times by its label';

/** Headstock broken off, glued, two splines, refinished: closed with a warranty, ready to go home. */
export function electricBass({ now, workday, dayAhead }: DemoClock, cast: Cast, series: number) {
  const { ines, tomasz, priya } = cast;
  const picture = (name: string, caption: string) => ({ file: `electric-bass/${name}`, caption });
  return new Story()
    .takenIn(
      workday(34, '14:20'),
      priya,
      {
        owner: {
          name: 'Callum Ferreira',
          email: 'callum@ferreira.example',
          telephone: '0000 000 026',
          tellBy: 'email',
        },
        instrument: {
          kind: 'Electric bass',
          maker: 'Corvane',
          serial: 'C1187',
          finish: 'Nitrocellulose lacquer, amber',
          woods: 'Mahogany neck, rosewood fingerboard',
          strings: 'Nickel-plated steel, 45–105, scale 864 mm',
          tuning: 'E A D G',
        },
        job: 'Headstock broken off just past the nut',
        complaint: 'It fell from its stand on to the tip of the headstock. I have every piece.',
        accessories: 'Gig bag; strings, loose',
        consentPhotos: 'on',
        publishWork: 'on',
        promisedOn: dayAhead(2),
        technicianId: tomasz.personId,
        nextStep: 'Look over the break',
        place: 'Bench two',
      },
      {
        phase: 'before',
        title: 'Taken in at the counter',
        text: 'Fell from its stand on to the tip of the headstock. Broken clean off just past the nut; the strings came off at home. Everything is there.',
        photos: [
          picture(
            '01-before-headstock-break.jpg',
            'Neck on blocks, headstock dropped away just behind the nut',
          ),
        ],
      },
      { by: priya, minutesLater: 18 },
      series,
    )
    .entry(
      workday(33, '09:40'),
      tomasz,
      {
        phase: 'before',
        title: 'Break looked over',
        text: 'A fresh break through short grain, 26 mm along the neck, where it is 43 by 17 mm. Both faces are dry and bare and close by hand with no gap, so nothing has to be cut away. No old glue.',
        benchNote: 'Truss rod channel ends 12 mm short of the break.',
        temperature: '20',
        humidity: '46',
        minutes: 30,
        photos: [
          {
            ...picture(
              '02-before-break-from-back.jpg',
              'The break from behind, paper scale beside it',
            ),
            pins: [
              {
                x: 47,
                y: 43,
                kind: 'damage',
                label: 'Short grain',
                note: 'Runs out through the back in 26 mm.',
              },
              {
                x: 49.5,
                y: 62,
                kind: 'damage',
                label: 'Splinter',
                note: 'Bass side, still hanging on.',
              },
            ],
          },
        ],
      },
      { by: tomasz, minutesLater: 26 },
    )
    .estimate(
      workday(32, '10:00'),
      priya,
      'Headstock glued, two maple splines across the break, back refinished, tuners back on, strung and set up',
      '408.00',
    )
    .authorised(workday(30, '12:05'), priya)
    .entry(
      workday(29, '11:30'),
      tomasz,
      {
        phase: 'during',
        title: 'Tuners off and laid out',
        text: 'Off before glue comes near them. Each lies with its own ferrule and screws, as it sat on the head, from the nut outwards.',
        used: ['Into the tray: four tuners, four ferrules, sixteen screws'],
        minutes: 20,
        photos: [
          picture(
            '06-during-tuners-laid-out.jpg',
            'Tray: four tuners, four ferrules, screws with their own',
          ),
        ],
      },
      { by: tomasz, minutesLater: 22 },
    )
    .entry(
      workday(28, '15:10'),
      tomasz,
      {
        phase: 'during',
        title: 'Break glued',
        text: 'Dry run in shaped, corked cauls until the line closed all round. Glue on both faces, worked into the splinters with a thin blade. Two clamps, even squeeze-out, washed off wet.',
        used: [GLUE],
        temperature: '20',
        humidity: '47',
        minutes: 60,
        rest: {
          product: 'Wood glue, aliphatic',
          clampsOffHours: '24',
          workedHours: '48',
          stringsHours: '72',
        },
        photos: [
          picture(
            '03-during-headstock-in-clamps.jpg',
            'Shaped caul on the back, two clamps across the break',
          ),
        ],
      },
      { by: tomasz, minutesLater: 34 },
    )
    .entry(
      workday(26, '09:30'),
      tomasz,
      {
        phase: 'during',
        title: 'Will it hold? Two splines decided',
        text: 'The set it is to carry, 45–105 at 864 mm, pulls about 814 N, ± 8 %, cores assumed: a turning moment of about 10.8 N m on the break. Glued alone, the largest shear with bending is about 3.0 MPa, a ratio of 2.9 to mahogany along the grain; with two splines about 0.49 MPa, a ratio of 17. A ratio, not a promise: averages hide the peaks at the ends of a joint, and short grain, oil, old glue or a starved line take most of it away.',
        minutes: 25,
      },
      { by: tomasz, minutesLater: 28 },
    )
    .entry(
      workday(25, '10:05'),
      tomasz,
      {
        phase: 'during',
        title: 'Two slots cut across the break',
        text: 'From the back, along a fence, in four passes; ends round. The break stayed shut.',
        minutes: 70,
        photos: [picture('04-during-two-slots-routed.jpg', 'Two slots over the glue line')],
      },
      { by: tomasz, minutesLater: 35 },
    )
    .entry(
      workday(25, '16:10'),
      tomasz,
      {
        phase: 'during',
        title: 'Splines glued in',
        text: 'Maple, grain along the neck, a push fit by hand. Left 3 mm proud, to be trimmed when they have rested.',
        used: [GLUE, 'Maple, quarter-sawn, two splines 80 × 9 × 8 mm'],
        temperature: '21',
        humidity: '47',
        minutes: 45,
        rest: {
          product: 'Wood glue, aliphatic',
          clampsOffHours: '4',
          workedHours: '24',
          stringsHours: '48',
        },
        photos: [
          picture(
            '05-during-splines-fitted-proud.jpg',
            'Splines in, proud of the back, offcut beside them',
          ),
        ],
      },
      { by: tomasz, minutesLater: 142 },
    )
    .entry(
      workday(20, '14:30'),
      tomasz,
      {
        phase: 'during',
        title: 'Trimmed, coloured, last coat of lacquer',
        text: 'Splines planed and scraped to the back, grain filled, colour brought in from the sides. Three coats a day for three days; this was the last.',
        benchNote: 'Second coat blushed a little at 63 %; waited for drier air.',
        used: ['Nitrocellulose lacquer, amber'],
        temperature: '21',
        humidity: '45',
        minutes: 240,
        rest: {
          product: 'Nitrocellulose lacquer',
          clampsOffHours: null,
          workedHours: '432',
          stringsHours: null,
        },
      },
      { by: tomasz, minutesLater: 40 },
    )
    .entry(
      workday(5, '15:20'),
      tomasz,
      {
        phase: 'after',
        title: 'Rubbed out, tuners back, strung and set up',
        text: 'Back rubbed out and polished; the splines are left showing. Tuners back from the tray in their order, strung to E A D G with the set it had. After a day at pitch no line has opened. Action 2.2 mm bass, 1.8 mm treble, relief 0.30 mm.',
        used: ['Out of the tray: four tuners, four ferrules, sixteen screws'],
        temperature: '21',
        humidity: '46',
        minutes: 150,
        photos: [
          picture(
            '07-after-refinished-back.jpg',
            'Back of neck and head, tuners on, two splines under the finish',
          ),
        ],
      },
      { by: tomasz, minutesLater: 55 },
    )
    .entry(
      workday(3, '10:30'),
      ines,
      {
        phase: 'after',
        title: 'Looked over before it goes home',
        text: 'Done by someone who did not do the work. Glue line shut all round under a lens, splines tight at both ends, tuners turn freely, in tune after two days at pitch.',
        minutes: 20,
      },
      { by: ines, minutesLater: 12 },
    )
    .closed(workday(2, '16:05'), ines)
    .then(now, (caseNumber) => bassWarranty(ines, caseNumber, now))
    .next(workday(2, '16:06'), ines, 'To be collected');
}
