import type { DemoClock } from '../demo-clock.ts';
import type { Cast } from '../demo-shop.ts';
import { Story } from '../story.ts';

/** Worn frets and a new nut: on the bench, the new frets being levelled. */
export function mandolin({ workday, hoursAgo, dayAhead }: DemoClock, cast: Cast, series: number) {
  const { tomasz, priya } = cast;
  const picture = (name: string, caption: string) => ({ file: `mandolin/${name}`, caption });
  return new Story()
    .takenIn(
      workday(8, '11:05'),
      priya,
      {
        owner: {
          name: 'Dana Whitlock',
          email: 'dana@whitlock.example',
          telephone: '0000 000 034',
          tellBy: 'email',
        },
        instrument: {
          kind: 'Mandolin',
          maker: 'Haldane',
          serial: 'H 2209',
          year: '1991',
          finish: 'Sunburst, nitrocellulose lacquer',
          woods: 'Spruce top, maple back and sides, ebony fingerboard',
          strings: 'Eight in four courses, 11–40',
          tuning: 'G D A E',
          marks: 'Pearl dots; a small dent on the treble side near the tail',
        },
        job: 'Refret and new nut',
        complaint: 'It buzzes on the first few frets and the A course rattles in the nut.',
        accessories: 'Shaped case, shoulder strap',
        consentPhotos: 'on',
        publishWork: 'on',
        promisedOn: dayAhead(7),
        technicianId: tomasz.personId,
        nextStep: 'Look over the frets',
        place: 'Rail by the window',
      },
      {
        phase: 'before',
        title: 'Taken in at the counter',
        text: 'In for a refret and a new nut. Frets 1 to 7 are dented under the courses, flat on top elsewhere; the A course has worn its nut slots too low. Shaped case and shoulder strap came with it.',
        photos: [
          picture(
            '01-before-worn-frets.jpg',
            'Fingerboard from low down: frets notched under the courses',
          ),
        ],
      },
      { by: priya, minutesLater: 16 },
      series,
    )
    .estimate(
      workday(8, '16:20'),
      priya,
      'All frets out and new ones in, levelled and crowned; new bone nut; strung and set up',
      '384.00',
    )
    .authorised(workday(6, '10:15'), priya)
    .entry(
      workday(3, '13:44'),
      tomasz,
      {
        phase: 'during',
        title: 'Frets out, top taped',
        text: 'Each fret warmed and eased out with ground nippers, kept flat on the board. Slots cleaned to depth; no chips worth filling. Board levelled along its length with a radius block, 254 mm.',
        used: ['Into the tray: the old frets, kept for the owner'],
        temperature: '21',
        humidity: '47',
        minutes: 150,
        photos: [
          picture(
            '02-during-frets-pulled-top-taped.jpg',
            'Empty fret slots, masking tape round the board end, the old frets in a row',
          ),
        ],
      },
      { by: tomasz, minutesLater: 171 },
    )
    .entry(
      workday(1, '11:05'),
      tomasz,
      {
        phase: 'during',
        title: 'New frets in',
        text: 'Nickel-silver wire, 1.1 mm crown, pressed and the ends nipped flush. Crowns inked and levelled with the beam: ink gone from all but the last three.',
        used: ['Fret wire, nickel silver, 2.0 × 1.1 mm'],
        temperature: '21',
        humidity: '47',
        minutes: 200,
        photos: [
          picture(
            '03-during-levelling-new-frets.jpg',
            'Levelling beam on the new frets, ink left on a few crowns',
          ),
        ],
      },
      { by: tomasz, minutesLater: 215 },
    )
    .entry(
      hoursAgo(1.5),
      tomasz,
      {
        phase: 'during',
        title: 'Nut blank seated and marked',
        text: 'Bone blank down on a clean slot. Half-pencil line along the frets, string spacing marked in pairs; bass slots started.',
        used: ['Bone blank, 6 mm'],
        minutes: 30,
        photos: [
          picture(
            '04-during-nut-blank-marked.jpg',
            'Nut blank with the pencil line and eight slot marks, file in the outer slot',
          ),
        ],
      },
      null,
    )
    .next(hoursAgo(1.4), tomasz, 'File the slots, level the last three frets');
}
