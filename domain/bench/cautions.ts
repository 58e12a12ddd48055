import type { Basis } from './figure.ts';

/** Where in the work a caution is shown. */
export type CautionPlace =
  | 'strings at pitch'
  | 'joint check'
  | 'glue-up'
  | 'crack'
  | 'climate'
  | 'arrival'
  | 'moisture figure'
  | 'lacquer'
  | 'oil finish'
  | 'two-part finish'
  | 'cyanoacrylate'
  | 'epoxy'
  | 'hide glue'
  | 'sanding'
  | 'restricted material'
  | 'machine work'
  | 'soldering'
  | 'electronics'
  | 'lifting';

export interface Caution {
  id: string;
  text: string;
  at: readonly CautionPlace[];
  basis: Basis;
}

/** Stands under every list of cautions. */
export const CAUTIONS_DEFER =
  'The label and the safety data sheet of the product in your hand, and local rules, decide.';

const practice = (id: string, text: string, ...at: CautionPlace[]): Caution => ({
  id,
  text,
  at,
  basis: 'common practice',
});
const remembered = (id: string, text: string, ...at: CautionPlace[]): Caution => ({
  ...practice(id, text, ...at),
  basis: 'from memory',
});

/** With every joint check, all of them, always open. */
const JOINT: readonly Caution[] = [
  practice(
    'average',
    'An average says nothing of peel or of stress peaks at the ends of the joint, which break real joints.',
    'joint check',
  ),
  {
    id: 'resolved-force',
    text: 'The force is the one resolved on that face, not the string pull.',
    at: ['joint check'],
    basis: 'computed',
  },
  remembered(
    'short-term',
    'Table values are short-term and free of defects, with a scatter of about ±14 %.',
    'joint check',
  ),
  remembered('long-load', 'Decades of load leave about 60 % of them.', 'joint check'),
  practice(
    'weakened',
    'End grain, run-out, oil, old glue, starved or thick lines, heat and damp each take most of it.',
    'joint check',
  ),
  practice(
    'fresh-joint',
    'Glue is taken to match wood only for a fresh, tight side-grain joint.',
    'joint check',
  ),
  practice(
    'no-certificate',
    'A ratio, not a promise: it does not certify a repair. The repairer judges.',
    'joint check',
  ),
];

const CLIMATE: readonly Caution[] = [
  {
    id: 'about',
    text: 'Moisture contents are about, ±1 %; wood takes weeks to reach them.',
    at: ['moisture figure', 'crack'],
    basis: 'published',
  },
  practice(
    'upper-bound',
    'A plate held all round opens a crack by at most this: an upper bound.',
    'crack',
  ),
  practice('dry-crack', 'Humidify slowly before gluing; never cleat a dry crack shut.', 'crack'),
  practice('slow-change', 'Slow change matters more than the number.', 'climate'),
  practice(
    'cold-case',
    'A cold case in a room below whose dew point it is gets wet: leave it shut to warm.',
    'arrival',
    'climate',
  ),
];

const HAZARDS: readonly Caution[] = [
  practice(
    'string-energy',
    'A string at pitch stores energy: slacken before cutting, eyes covered, coil ends away.',
    'strings at pitch',
  ),
  practice(
    'solvent-vapour',
    'Nitrocellulose and solvent vapour: explosive range, flash point often below room temperature. No sparks, earthed extraction, metal can for rags.',
    'lacquer',
  ),
  practice('oily-rags', 'Drying-oil rags self-ignite: wet, flat or sealed.', 'oil finish'),
  practice(
    'isocyanates',
    'Isocyanates (two-part and some polyurethane): asthma for life. Supplied air, not a dust mask.',
    'two-part finish',
  ),
  practice(
    'sensitising-woods',
    'Rosewood, ebony, cocobolo, some cedars: skin and lung sensitisers. Extract at source, P2 or P3, wash.',
    'sanding',
  ),
  practice(
    'wood-dust',
    'All wood dust: suspected or known carcinogen, fire load. No dry sweeping.',
    'sanding',
    'machine work',
  ),
  practice(
    'shell-dust',
    'Abalone and shell, bone, old celluloid: lung dust. Celluloid is highly flammable, its shavings too.',
    'sanding',
  ),
  practice(
    'cyanoacrylate',
    'Cyanoacrylate: bonds skin and eyes, fumes; heats on cotton.',
    'cyanoacrylate',
  ),
  practice('epoxy', 'Epoxy and hardeners sensitise: nitrile gloves.', 'epoxy'),
  practice(
    'hot-glue',
    'Hot glue pot and bending iron: scald, unattended heat, mains lead.',
    'hide glue',
  ),
  practice(
    'machines',
    'Power tools (router, saw, buffer): kickback, entanglement, catch. Guard on, no gloves at the wheel.',
    'machine work',
  ),
  practice(
    'lead',
    'Old finish and solder: lead. Test before sanding; wash.',
    'sanding',
    'soldering',
  ),
  practice(
    'burn-test',
    'Ivory, tortoiseshell: permits before crossing a border; do not burn to test.',
    'restricted material',
  ),
  practice(
    'mains',
    'Mains amplification and valve circuits: lethal voltage after unplugging. Qualified person only; check earth.',
    'electronics',
  ),
  practice('heavy', 'Heavy cello or bass on a bench: cradle, two people.', 'lifting'),
  practice(
    'post-falls',
    'Post and bridge may fall when strings go slack: slacken evenly.',
    'lifting',
    'strings at pitch',
  ),
  practice('closed-case', 'Cold or hot case: let it reach room temperature closed.', 'arrival'),
];

export const CAUTIONS: readonly Caution[] = [...JOINT, ...CLIMATE, ...HAZARDS];

/** The cautions for one place in the work, in the order they are shown. */
export function cautionsAt(place: CautionPlace): Caution[] {
  return CAUTIONS.filter((caution) => caution.at.includes(place));
}
