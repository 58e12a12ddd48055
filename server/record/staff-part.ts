import type { StaffViewer } from '#domain/viewer.ts';
import { personInRecord } from './person-in-record.ts';

/** The part that says who stands behind role and number, of an event one person did. */
export function staffPart(person: StaffViewer): { staff: object } {
  return { staff: { v: 1, names: { [personInRecord(person)]: person.name } } };
}
