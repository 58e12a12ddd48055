import type { DemoClock } from '../demo-clock.ts';
import type { Cast } from '../demo-shop.ts';
import { Story } from '../story.ts';

const GLUE = 'Hot hide glue, 192 gram strength';

/** Lifted bridge and a crack in the top: resting, the bridge under clamps. */
export function parlourGuitar(
  { workday, hoursAgo, dayAhead }: DemoClock,
  cast: Cast,
  series: number,
) {
  const { tomasz, priya } = cast;
  const picture = (name: string, caption: string) => ({ file: `parlour-guitar/${name}`, caption });
  return new Story()
    .takenIn(
      workday(12, '10:12'),
      priya,
      {
        owner: {
          name: 'Marguerite Osei',
          email: 'marguerite@osei.example',
          telephone: '0000 000 031',
          address: '12 Salter’s Rise, Saltmere',
          tellBy: 'email',
        },
        instrument: {
          kind: 'Parlour guitar',
          maker: 'Aldous Pike',
          serial: '0417',
          year: 'about 1968',
          finish: 'French polish',
          woods: 'Spruce top, mahogany back and sides, rosewood bridge and fingerboard',
          strings: 'Steel, 12–53',
          tuning: 'E A D G B E',
          marks:
            'Label inside, pencilled 0417 on the centre strip; a small knot by the tail, bass side',
        },
        job: 'Lifted bridge; crack in the top below it',
        complaint:
          'The bridge is coming up along the back and there is a crack below it. It stood near a radiator.',
        accessories: 'Hard case, strap, spare saddle',
        consentPhotos: 'on',
        publishWork: 'on',
        promisedOn: dayAhead(9),
        technicianId: tomasz.personId,
        nextStep: 'Look over the damage',
        place: 'Humid cupboard, left',
      },
      {
        phase: 'before',
        title: 'Taken in at the counter',
        text: 'The bridge is coming up along its back edge. It stood near a radiator and the crack opened last week. Came in its hard case, which reads 35 % inside; strings slackened at the counter before anything else.',
        photos: [picture('01-before-whole-front.jpg', 'Whole front, steel rule beside it')],
      },
      { by: priya, minutesLater: 19 },
      series,
    )
    .entry(
      workday(11, '09:25'),
      tomasz,
      {
        phase: 'before',
        title: 'Damage looked over',
        text: 'A slip of paper goes in 14 mm under the back edge, a 0.6 mm feeler just enters. The crack runs from the bridge towards the tail, treble side, 82 mm, and goes right through. White glue under the bridge from somebody’s earlier try; that has to come off before anything will hold.',
        benchNote: 'Braces tapped: none loose. Bridge plate sound.',
        temperature: '20',
        humidity: '41',
        minutes: 35,
        photos: [
          {
            ...picture(
              '02-before-bridge-lifted-back-edge.jpg',
              'Bridge from behind, gap along the back edge, paper slip pushed in, crack towards the tail',
            ),
            pins: [
              {
                x: 67,
                y: 49.5,
                kind: 'damage',
                label: 'Back edge lifted',
                note: 'Open from the middle to the treble wing.',
              },
              {
                x: 52,
                y: 69,
                kind: 'damage',
                label: 'Crack in the top',
                note: '82 mm long, open 0.3 mm at the bridge.',
              },
              {
                x: 46,
                y: 54.5,
                kind: 'remark',
                label: 'Slip of paper',
                note: 'As far in as it goes.',
              },
            ],
          },
        ],
      },
      { by: tomasz, minutesLater: 33 },
    )
    .entry(
      workday(11, '10:20'),
      tomasz,
      {
        phase: 'before',
        title: 'Into the humid cupboard',
        text: 'A dryness crack: the clean edges would meet if the top were not so dry. Never glue it shut while it is. It stays at 48 % and 20 °C until the estimate is answered, and is looked at each morning.',
        temperature: '20',
        humidity: '48',
        minutes: 10,
        photos: [
          picture(
            '03-before-top-crack-raking-light.jpg',
            'The crack in raking light, treble side, paper scale beside it',
          ),
        ],
      },
      { by: tomasz, minutesLater: 21 },
    )
    .estimate(
      workday(10, '11:30'),
      priya,
      'Bridge off and reglued on its marks; crack glued and cleated from inside, back off and on again; strung and set up',
      '616.80',
    )
    .authorised(workday(6, '17:48'), priya)
    .entry(
      workday(5, '09:10'),
      tomasz,
      {
        phase: 'during',
        title: 'Witness marks scribed, bridge off, back off',
        text: 'At 48 % the crack has closed by itself. Scribed across bridge and top at three corners before lifting. Twenty minutes under the heat blanket, then the palette knife in from the treble end; white glue scraped off both faces. Back taken off along its seam, so that the cleats can be fitted in the open.',
        used: [
          'Into the tray: bridge (rosewood), saddle (bone), six bridge pins; the back on its own board',
        ],
        temperature: '21',
        humidity: '48',
        minutes: 190,
        photos: [
          picture(
            '04-during-bridge-off-crack-cleaned.jpg',
            'Bridge off, old glue gone, footprint bare, crack brushed clean',
          ),
        ],
      },
      { by: tomasz, minutesLater: 194 },
    )
    .entry(
      workday(4, '10:30'),
      tomasz,
      {
        phase: 'during',
        title: 'Crack glued and cleated',
        text: 'Hot hide glue worked through the closed crack from both sides, levelled by finger. Three cleats inside, grain across the crack. The back is off, so they could be clamped straight down and seen.',
        used: [GLUE, 'Spruce for cleats, quarter-sawn, 1.8 mm'],
        temperature: '21',
        humidity: '48',
        minutes: 50,
        rest: {
          product: 'Hot hide glue',
          clampsOffHours: '24',
          workedHours: '24',
          stringsHours: '48',
        },
        photos: [
          picture(
            '05-during-three-cleats-inside.jpg',
            'Inside, back off: three cleats across the crack, grain at right angles',
          ),
        ],
      },
      { by: tomasz, minutesLater: 50 },
    )
    .entry(
      workday(2, '09:15'),
      tomasz,
      {
        phase: 'during',
        title: 'Back on again',
        text: 'Lining and back brushed with glue, back down on its own line, spool clamps all round. Seam even, nothing pulled.',
        used: [GLUE, 'Out of the tray: the back'],
        temperature: '21',
        humidity: '48',
        minutes: 40,
        rest: {
          product: 'Hot hide glue',
          clampsOffHours: '24',
          workedHours: '24',
          stringsHours: '48',
        },
      },
      { by: tomasz, minutesLater: 37 },
    )
    .entry(
      hoursAgo(4.4),
      tomasz,
      {
        phase: 'during',
        title: 'Bridge reglued on its marks',
        text: 'Dry run first: all three marks line up. Glue at 62 °C, bridge down and both clamps on in 40 seconds. Squeeze-out even along the back edge.',
        used: [GLUE, 'Out of the tray: the bridge'],
        temperature: '21',
        humidity: '48',
        minutes: 45,
        rest: {
          product: 'Hot hide glue',
          clampsOffHours: '24',
          workedHours: '24',
          stringsHours: '48',
        },
        photos: [
          picture(
            '06-during-bridge-glued-clamped.jpg',
            'Slotted caul on the bridge, two clamps through the soundhole',
          ),
        ],
      },
      null,
    )
    .next(hoursAgo(4.3), tomasz, 'Clamps off, clean the edge');
}
