import { describe, expect, it } from 'vitest';
import { safeReturn, signInPath } from './return-path.ts';

describe('safeReturn', () => {
  it.each(['/bench', '/portal/cases/2026-031/timeline', '/bench/find?q=pike%2F1', '/verify/ABC'])(
    'goes back to %s',
    (path) => {
      expect(safeReturn(path)).toBe(path);
    },
  );

  it.each([
    'https://evil.example/',
    '//evil.example/bench',
    '/\\evil.example',
    '\\\\evil.example',
    '/\t/evil.example',
    '/bench\r\nSet-Cookie: a=b',
    'javascript:alert(1)',
    'bench',
    '',
    '/ bench',
    '/sign-in',
    '/sign-in/staff?return=/bench',
    '/sign-out',
    '/api/media/1/320',
    '/x/../sign-out',
    null,
  ])('refuses %j', (path) => {
    expect(safeReturn(path)).toBeNull();
  });

  it('keeps what climbs out of the site on the site', () => {
    expect(safeReturn('/../../bench')).toBe('/bench');
    expect(safeReturn('/bench/..//evil.example')).toBeNull();
  });
});

describe('signInPath', () => {
  it('carries the page along, whole', () => {
    expect(signInPath('/bench/find?q=a&b=c')).toBe(
      '/sign-in?return=%2Fbench%2Ffind%3Fq%3Da%26b%3Dc',
    );
    expect(signInPath('/')).toBe('/sign-in');
    expect(signInPath('//evil.example')).toBe('/sign-in');
  });
});
