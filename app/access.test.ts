import { describe, expect, it } from 'vitest';
import type { Role, Viewer } from '#domain/viewer.ts';
import { access, decide } from './access.ts';

const staff = (role: Role): Viewer => ({
  kind: 'staff',
  personId: 'p',
  role,
  name: 'P',
  number: 1,
  freshAt: new Date(0),
});
const customer: Viewer = { kind: 'customer', customerId: 'c', name: 'C' };
const everyone: Viewer = { kind: 'public' };
const all = [staff('proprietor'), staff('technician'), staff('desk'), customer, everyone];

describe('decide', () => {
  it('answers nobody on a route without a row', () => {
    for (const pattern of ['/nothing', '/bench/', '/constructor', '__proto__', 'toString']) {
      for (const viewer of all) expect(decide(pattern, 'GET', viewer)).toBe('no such route');
    }
  });

  it('keeps the bench for staff and the portal for customers', () => {
    expect(all.map((viewer) => decide('/bench', 'GET', viewer))).toEqual([
      'go',
      'go',
      'go',
      'forbidden',
      'sign in',
    ]);
    expect(all.map((viewer) => decide('/portal', 'GET', viewer))).toEqual([
      'forbidden',
      'forbidden',
      'forbidden',
      'go',
      'sign in',
    ]);
  });

  it('takes HEAD for GET', () => {
    for (const pattern of Object.keys(access)) {
      for (const viewer of all) {
        expect(decide(pattern, 'HEAD', viewer)).toBe(decide(pattern, 'GET', viewer));
      }
    }
  });

  it('lets nobody change anything in the portal or on the public pages', () => {
    const readOnly = Object.keys(access).filter((pattern) =>
      /^\/(?:portal|verify|log|t|api\/(?:media|papers|verify|log))(?:\/|$)/.test(pattern),
    );
    expect(readOnly.length).toBeGreaterThan(10);
    for (const pattern of readOnly) {
      for (const method of ['POST', 'PUT', 'PATCH', 'DELETE']) {
        for (const viewer of all) expect(decide(pattern, method, viewer)).not.toBe('go');
      }
    }
  });

  it('asks who it is before it says that a method is not there', () => {
    expect(decide('/api/cases/:number/photos/:photoId', 'GET', everyone)).toBe('sign in');
    expect(decide('/api/cases/:number/photos/:photoId', 'GET', staff('desk'))).toBe(
      'no such method',
    );
    expect(decide('/api/cases/:number/photos/:photoId', 'PUT', customer)).toBe('forbidden');
  });
});
