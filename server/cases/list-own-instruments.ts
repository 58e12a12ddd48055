import type { Viewer } from '#domain/viewer.ts';
import { readOwnCases, type OwnCase } from './read-own-cases.ts';

/** A customer's own instruments and the case of each, what is still here first. */
export function listOwnInstruments(viewer: Viewer, { now = new Date() } = {}): Promise<OwnCase[]> {
  return readOwnCases(viewer, null, { now });
}
