import type { Role } from '#domain/viewer.ts';

/** One of the shop's people, as the record needs to know them. */
export interface Person {
  personId: string;
  name: string;
  role: Role;
  number: number;
}

const WORDS: Record<Role, string> = {
  proprietor: 'shop owner',
  technician: 'technician',
  desk: 'front desk',
};

/**
 * How a person of the shop is named in what may be shown: role and number, "technician 2". The name
 * itself is in a part of its own that can be erased.
 */
export function personInRecord({ role, number }: { role: Role; number: number }): string {
  return `${WORDS[role]} ${number}`;
}

/** The part that says who stands behind role and number, of an event one person did. */
export function staffPart(person: Person): { staff: object } {
  return { staff: { v: 1, names: { [personInRecord(person)]: person.name } } };
}
