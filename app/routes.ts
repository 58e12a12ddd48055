import { index, route, type RouteConfig } from '@react-router/dev/routes';

/** Every page and resource route. Each pattern has its row in app/access.ts. */
export default [
  index('routes/home.ts'),
  route('sign-in', 'routes/account/sign-in.tsx'),
  route('sign-in/code', 'routes/account/code.tsx'),
  route('sign-in/staff', 'routes/account/staff.tsx'),
  route('sign-in/callback', 'routes/account/callback.tsx'),
  route('sign-out', 'routes/account/sign-out.ts'),
  route('api/health', 'routes/api/health.ts'),
  route('api/changes', 'routes/api/changes.ts'),
  route('api/cases/:number/photos/:photoId', 'routes/api/photos.ts'),
  route('api/media/:photoId/:size', 'routes/api/media.ts'),
] satisfies RouteConfig;
