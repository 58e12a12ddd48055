import {
  CloseShownSchema,
  ErasedShownSchema,
  PaperShownSchema,
  StandingShownSchema,
  TEXT_ONLY_KINDS,
  VisibilityShownSchema,
  WarrantyShownSchema,
} from '#evidence/chain/case-shown.ts';
import { EntryShownSchema, TextShownSchema } from '#evidence/chain/entry-shown.ts';
import {
  ClockShownSchema,
  KeyShownSchema,
  LogStartShownSchema,
  LostShownSchema,
  StampsShownSchema,
} from '#evidence/chain/log-shown.ts';
import {
  BenchNoteSchema,
  BenchPartSchema,
  MoneyPartSchema,
  PartyPartSchema,
  StaffPartSchema,
} from '#evidence/chain/other-parts.ts';
import type { Kind, PartName } from '#evidence/seal/kinds.ts';

const story = { 1: TextShownSchema, 2: EntryShownSchema } as const;

/** What `shown` holds, by kind and form. */
const SHOWN = {
  entry: story,
  amendment: story,
  inspection: story,
  incident: story,
  imported: story,
  authorisation: { 1: TEXT_ONLY_KINDS.authorisation },
  payment: { 1: TEXT_ONLY_KINDS.payment },
  'rest-override': { 1: TEXT_ONLY_KINDS['rest-override'] },
  'handed-back': { 1: TEXT_ONLY_KINDS['handed-back'] },
  claim: { 1: TEXT_ONLY_KINDS.claim },
  close: { 1: CloseShownSchema },
  warranty: { 1: WarrantyShownSchema },
  paper: { 1: PaperShownSchema },
  standing: { 1: StandingShownSchema },
  visibility: { 1: VisibilityShownSchema },
  erased: { 1: ErasedShownSchema },
  'log-start': { 1: LogStartShownSchema },
  key: { 1: KeyShownSchema },
  stamps: { 1: StampsShownSchema },
  clock: { 1: ClockShownSchema },
  lost: { 1: LostShownSchema },
} as const satisfies Record<Kind, object>;

/** What the parts hold that are the same whatever the kind, by form. */
const OTHER = {
  owner: { 1: PartyPartSchema },
  bringer: { 1: PartyPartSchema },
  payer: { 1: PartyPartSchema },
  staff: { 1: StaffPartSchema },
  money: { 1: MoneyPartSchema },
  bench: { 1: BenchNoteSchema, 2: BenchPartSchema },
} as const satisfies Record<Exclude<PartName, 'shown'>, object>;

/** The forms a part can have, by `v`. */
export function partForms(kind: Kind, name: PartName) {
  return name === 'shown' ? SHOWN[kind] : OTHER[name];
}

type Forms<K extends Kind, N extends PartName> = N extends 'shown'
  ? (typeof SHOWN)[K]
  : (typeof OTHER)[Exclude<N, 'shown'>];
type Outputs<F> = { [V in keyof F]: F[V] extends { _zod: { output: infer O } } ? O : never };

/** What a part of this kind and name holds, in any of its forms. */
export type PartValue<K extends Kind, N extends PartName> = Outputs<Forms<K, N>>[keyof Forms<K, N>];
