/** A person of the demo shop as the identity provider knows them. */
export interface DemoPerson {
  /** The subject id; stays the same for ever. */
  sub: string;
  name: string;
  email: string;
  /** What they do in the shop, in the words of the screens. */
  does: string;
}

/** The staff of the demo shop, all invented. */
export const demoStaff: readonly DemoPerson[] = [
  {
    sub: 'staff-ines-lund',
    name: 'Ines Lund',
    email: 'ines@witnessmark.example',
    does: 'shop owner',
  },
  {
    sub: 'staff-tomasz-rell',
    name: 'Tomasz Rell',
    email: 'tomasz@witnessmark.example',
    does: 'technician',
  },
  {
    sub: 'staff-priya-damm',
    name: 'Priya Damm',
    email: 'priya@witnessmark.example',
    does: 'front desk',
  },
];
