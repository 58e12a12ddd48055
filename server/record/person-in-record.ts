import type { Role } from '#domain/viewer.ts';

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
