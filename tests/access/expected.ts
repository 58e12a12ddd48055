import { NOBODY, type Things } from './scene.ts';

/** One address of a route, and what each is answered who asks for it by GET. */
export interface Visit {
  path: string;
  answers: Answers;
}

/** In this order: proprietor, technician, desk, the owner, another owner, the public. */
export type Answers = readonly [number, number, number, number, number, number];

// RIGHTS, column by column. 302 for the public is the way to the sign-in, 401 the same for programs.
const BENCH: Answers = [200, 200, 200, 403, 403, 302];
const BENCH_NOT_THERE: Answers = [404, 404, 404, 403, 403, 302];
const PORTAL: Answers = [403, 403, 403, 200, 200, 302];
const OWN: Answers = [403, 403, 403, 200, 404, 302];
const NOT_THERE: Answers = [403, 403, 403, 404, 404, 302];
const OPEN: Answers = [200, 200, 200, 200, 200, 200];
const OPEN_NOT_THERE: Answers = [404, 404, 404, 404, 404, 404];
const SENT_ON: Answers = [302, 302, 302, 302, 302, 302];
const MEDIA: Answers = [200, 200, 200, 200, 404, 401];
const STAFF_MEDIA: Answers = [200, 200, 200, 404, 404, 401];
const MEDIA_NOT_THERE: Answers = [404, 404, 404, 404, 404, 401];

/** Every route of app/access.ts with its addresses on the scene: the owner's things, and nobody's. */
export function visits(things: Things): Record<string, Visit[]> {
  const { closed, open, draft, photos, code, tag, paper } = things;
  const visit = (path: string, answers: Answers): Visit => ({ path, answers });
  const media = (id: string, size: string, answers: Answers) =>
    visit(`/api/media/${id}/${size}`, answers);
  return {
    '/': [visit('/', SENT_ON)],
    '/sign-in': [visit('/sign-in', [302, 302, 302, 302, 302, 200])],
    '/sign-in/code': [visit('/sign-in/code', SENT_ON)],
    '/sign-in/staff': [visit('/sign-in/staff', SENT_ON)],
    '/sign-in/callback': [visit('/sign-in/callback', SENT_ON)],
    '/sign-out': [visit('/sign-out', SENT_ON)],
    '/bench': [visit('/bench', BENCH)],
    '/bench/find': [visit('/bench/find?q=mandolin', BENCH)],
    '/bench/take-in': [visit('/bench/take-in', BENCH)],
    '/bench/cases/:number': [
      visit(`/bench/cases/${closed}`, BENCH),
      visit(`/bench/cases/${open}`, BENCH),
      visit(`/bench/cases/${NOBODY.number}`, BENCH_NOT_THERE),
    ],
    '/bench/cases/:number/add': [
      visit(`/bench/cases/${open}/add?entry=${NOBODY.id}`, BENCH),
      visit(`/bench/cases/${NOBODY.number}/add?entry=${NOBODY.id}`, BENCH_NOT_THERE),
    ],
    '/bench/cases/:number/entries/:entry': [
      visit(`/bench/cases/${open}/entries/${draft}`, BENCH),
      visit(`/bench/cases/${closed}/entries/${draft}`, BENCH_NOT_THERE),
      visit(`/bench/cases/${open}/entries/${NOBODY.id}`, BENCH_NOT_THERE),
    ],
    '/bench/cases/:number/close': [
      visit(`/bench/cases/${open}/close`, BENCH),
      visit(`/bench/cases/${NOBODY.number}/close`, BENCH_NOT_THERE),
    ],
    '/bench/cases/:number/warranty': [
      visit(`/bench/cases/${closed}/warranty`, BENCH),
      visit(`/bench/cases/${NOBODY.number}/warranty`, BENCH_NOT_THERE),
    ],
    '/bench/warranties': [visit('/bench/warranties', BENCH)],
    '/portal': [visit('/portal', PORTAL)],
    '/portal/cases/:number': [
      visit(`/portal/cases/${closed}`, OWN),
      visit(`/portal/cases/${open}`, OWN),
      visit(`/portal/cases/${NOBODY.number}`, NOT_THERE),
    ],
    '/portal/cases/:number/timeline': [
      visit(`/portal/cases/${closed}/timeline`, OWN),
      visit(`/portal/cases/${NOBODY.number}/timeline`, NOT_THERE),
    ],
    '/portal/cases/:number/warranty': [
      visit(`/portal/cases/${closed}/warranty`, OWN),
      visit(`/portal/cases/${NOBODY.number}/warranty`, NOT_THERE),
    ],
    '/verify': [visit('/verify', OPEN)],
    '/verify/:code': [visit(`/verify/${code}`, OPEN)],
    '/verify/what-is-checked': [visit('/verify/what-is-checked', OPEN)],
    '/log': [visit('/log', OPEN)],
    '/t/:code': [visit(`/t/${tag}`, SENT_ON)],
    '/api/health': [visit('/api/health', OPEN)],
    '/api/changes': [
      visit(`/api/changes?case=${closed}`, MEDIA),
      visit(`/api/changes?case=${NOBODY.number}`, MEDIA_NOT_THERE),
      visit('/api/changes', [200, 200, 200, 200, 200, 401]),
    ],
    '/api/cases/:number/photos/:photoId': [
      visit(`/api/cases/${open}/photos/${photos.draft}`, [405, 405, 405, 403, 403, 401]),
    ],
    '/api/media/:photoId/:size': [
      media(photos.shared, '960', MEDIA),
      media(photos.shared, 'original', STAFF_MEDIA),
      media(photos.bench, '320', STAFF_MEDIA),
      media(photos.draft, '320', STAFF_MEDIA),
      media(NOBODY.id, '320', MEDIA_NOT_THERE),
    ],
    '/api/papers/:paperId': [
      visit(`/api/papers/${paper}`, MEDIA),
      visit(`/api/papers/${NOBODY.id}`, MEDIA_NOT_THERE),
    ],
    '/api/verify/:code': [
      visit(`/api/verify/${code}`, OPEN),
      visit('/api/verify/AAA-AAA-AAA', OPEN_NOT_THERE),
    ],
    '/api/log/checkpoint': [visit('/api/log/checkpoint', OPEN)],
    '/api/log/entries': [visit('/api/log/entries', OPEN)],
    '/api/log/keys': [visit('/api/log/keys', OPEN)],
  };
}
