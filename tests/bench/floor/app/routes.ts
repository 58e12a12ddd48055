import { index, type RouteConfig } from '@react-router/dev/routes';

export default [index('empty.tsx')] satisfies RouteConfig;
