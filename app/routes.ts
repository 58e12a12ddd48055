import { index, layout, route, type RouteConfig } from '@react-router/dev/routes';

/** Every page and resource route. Each pattern has its row in app/access.ts. */
export default [
  index('routes/home.ts'),
  route('sign-in', 'routes/account/sign-in.tsx'),
  route('sign-in/code', 'routes/account/code.tsx'),
  route('sign-in/staff', 'routes/account/staff.tsx'),
  route('sign-in/callback', 'routes/account/callback.tsx'),
  route('sign-out', 'routes/account/sign-out.ts'),
  layout('routes/bench/layout.tsx', [
    route('bench', 'routes/bench/rack.tsx'),
    route('bench/find', 'routes/bench/find.tsx'),
    route('bench/take-in', 'routes/bench/take-in.tsx'),
    route('bench/cases/:number', 'routes/bench/case.tsx'),
    route('bench/cases/:number/close', 'routes/bench/close.tsx'),
    route('bench/cases/:number/warranty', 'routes/bench/warranty.tsx'),
    route('bench/warranties', 'routes/bench/warranties.tsx'),
  ]),
  layout('routes/portal/layout.tsx', [
    route('portal', 'routes/portal/home.tsx'),
    route('portal/cases/:number', 'routes/portal/case.tsx'),
    route('portal/cases/:number/timeline', 'routes/portal/timeline.tsx'),
    route('portal/cases/:number/warranty', 'routes/portal/warranty.tsx'),
  ]),
  route('verify', 'routes/verify/start.tsx'),
  route('verify/what-is-checked', 'routes/verify/what-is-checked.tsx'),
  route('verify/:code', 'routes/verify/code.tsx'),
  route('log', 'routes/verify/log.tsx'),
  route('api/health', 'routes/api/health.ts'),
  route('api/changes', 'routes/api/changes.ts'),
  route('api/cases/:number/photos/:photoId', 'routes/api/photos.ts'),
  route('api/media/:photoId/:size', 'routes/api/media.ts'),
  route('api/papers/:paperId', 'routes/api/papers.ts'),
  route('api/verify/:code', 'routes/api/verify.ts'),
  route('api/log/checkpoint', 'routes/api/log-checkpoint.ts'),
  route('api/log/entries', 'routes/api/log-entries.ts'),
  route('api/log/keys', 'routes/api/log-keys.ts'),
] satisfies RouteConfig;
