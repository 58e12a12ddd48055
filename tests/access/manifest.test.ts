import { describe, expect, it } from 'vitest';
import { access } from '#app/access.ts';
import { builtRoutes } from './built-routes.ts';

const routes = await builtRoutes();
const patterns = routes.map(({ pattern }) => pattern);

describe('the built routes', () => {
  it('each have a row of the access table, and each row a route', () => {
    expect(new Set(patterns).size).toBe(patterns.length);
    expect([...patterns].sort()).toEqual(Object.keys(access).sort());
  });

  it('of the portal and of the public pages have no action', () => {
    const readOnly = routes.filter(({ pattern }) =>
      /^\/(?:portal|verify|log|t)(?:\/|$)/.test(pattern),
    );
    expect(readOnly.length).toBeGreaterThan(7);
    expect(readOnly.filter(({ hasAction }) => hasAction)).toEqual([]);
  });

  it('have an action exactly where the table lets somebody change something', () => {
    for (const { pattern, hasAction } of routes) {
      expect([pattern, hasAction]).toEqual([pattern, access[pattern]?.write !== undefined]);
    }
  });

  it('reach the server, and so the guard, on every navigation: each page has a loader', () => {
    for (const { pattern, modules, isPage } of routes) {
      const loads = modules.some((module) => 'loader' in module);
      expect([pattern, isPage && !loads]).toEqual([pattern, false]);
    }
    expect(routes.every(({ modules }) => Array.isArray(modules[0]?.middleware))).toBe(true);
  });

  it('keep their guard on the server: no route changes it', () => {
    const others = routes.flatMap(({ modules }) => modules.slice(1));
    expect(others.some((module) => 'middleware' in module)).toBe(false);
  });
});
