import { randomUUID } from 'node:crypto';

/** A person of the tests who has an address of their own, so that mails do not mix. */
export const anOwner = (name = 'Orla Vance') => ({
  id: '',
  name,
  email: `${randomUUID()}@vance.example`,
  telephone: '',
  address: '',
  tellBy: 'email',
});

/** What the counter's form sends, with some of it changed. */
export const takeInForm = (change: object = {}) => ({
  owner: anOwner(),
  instrument: { id: '', kind: 'Mandolin', maker: 'Tern & Lowe', serial: randomUUID() },
  job: 'Worn frets',
  complaint: 'It buzzes on the first frets.',
  accessories: 'Soft bag',
  consentPhotos: 'on',
  promisedOn: '',
  ...change,
});
