/** An invented owner whose instrument is in the demo shop, and who can sign in with a code. */
export interface DemoOwner {
  name: string;
  email: string;
  /** What they will find: "parlour guitar, resting". */
  has: string;
}

/** The owners worth signing in as; `npm start` prints them. */
export const demoOwners = [
  { name: 'Marguerite Osei', email: 'marguerite@osei.example', has: 'parlour guitar, resting' },
  {
    name: 'Callum Ferreira',
    email: 'callum@ferreira.example',
    has: 'electric bass, repaired, with a warranty',
  },
  { name: 'Dana Whitlock', email: 'dana@whitlock.example', has: 'mandolin, on the bench' },
] as const satisfies readonly DemoOwner[];
