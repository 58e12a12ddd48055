/** A kind of instrument the shop takes in, with the photos its record is to have. */
export interface InstrumentKind {
  /** As it stands on the tag: "Parlour guitar". */
  name: string;
  /** Views to take before anything is touched, and again after: common practice for condition records. */
  photoList: readonly string[];
}

const EVERY = [
  'Whole front',
  'Whole back',
  'Bass side',
  'Treble side',
  'Head, front',
  'Head, back',
];

const NECKED = [...EVERY, 'Heel and neck joint', 'Bridge', 'Label or serial, close up'];
const BOWED = [
  ...NECKED,
  'Scroll',
  'Bridge and soundpost from the treble side',
  'Edges and corners',
];
const ELECTRIC = [...EVERY, 'Neck joint', 'Bridge', 'Serial, close up', 'Controls and jack'];

/** Kinds in the order of the list people choose from; the last stands for all others. */
export const INSTRUMENT_KINDS: readonly InstrumentKind[] = [
  { name: 'Steel-string guitar', photoList: NECKED },
  { name: 'Parlour guitar', photoList: NECKED },
  { name: 'Classical guitar', photoList: NECKED },
  { name: 'Archtop guitar', photoList: [...NECKED, 'Tailpiece'] },
  { name: 'Tenor guitar', photoList: NECKED },
  { name: 'Electric guitar', photoList: ELECTRIC },
  { name: 'Electric bass', photoList: ELECTRIC },
  { name: 'Acoustic bass guitar', photoList: NECKED },
  { name: 'Mandolin', photoList: [...NECKED, 'Tailpiece'] },
  { name: 'Ukulele', photoList: NECKED },
  {
    name: 'Banjo',
    photoList: [...EVERY, 'Head and rim', 'Neck joint and coordinator rod', 'Tailpiece'],
  },
  { name: 'Violin', photoList: BOWED },
  { name: 'Viola', photoList: BOWED },
  { name: 'Cello', photoList: BOWED },
  { name: 'Double bass', photoList: BOWED },
  { name: 'Other stringed instrument', photoList: NECKED },
];

/** The kind by its name as on the list. */
export function instrumentKind(name: string): InstrumentKind | undefined {
  return INSTRUMENT_KINDS.find((kind) => kind.name === name);
}

/** The kind within a sentence: "parlour guitar". */
export function kindInSentence(name: string): string {
  return name.charAt(0).toLowerCase() + name.slice(1);
}
