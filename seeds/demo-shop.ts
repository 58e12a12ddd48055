import { v7 } from 'uuid';
import type { Role, StaffViewer } from '#domain/viewer.ts';
import { demoStaff } from '#local/demo-staff.ts';
import { run, transaction } from '#server/db/sql.ts';

/** The three people of the demo shop, as they act in its stories. */
export interface Cast {
  ines: StaffViewer;
  tomasz: StaffViewer;
  priya: StaffViewer;
}

const ROLES: Record<keyof Cast, { name: string; role: Role; number: number }> = {
  ines: { name: 'Ines Lund', role: 'proprietor', number: 1 },
  tomasz: { name: 'Tomasz Rell', role: 'technician', number: 2 },
  priya: { name: 'Priya Damm', role: 'desk', number: 3 },
};

/** Where the demo shop is: invented, with a real zone so that days begin and end somewhere. */
export const DEMO_ZONE = 'Europe/London';

const TERMS = `We look at the instrument within 14 days of its coming in and say in writing what we found. If covered work has failed, we do that work again at our cost, parts and strings included. If it cannot be done again, we give back what was paid for it.
Not covered: knocks, falls and carriage; strings heavier than those named; an instrument kept below 35 % or above 65 % relative humidity, or left in heat above 40 °C; work by others on the same joint.
The warranty goes with the instrument to a later owner within its term.`;

async function keepPerson(who: keyof Cast, at: Date): Promise<StaffViewer> {
  const { name, role, number } = ROLES[who];
  const subject = demoStaff.find((person) => person.name === name)?.sub;
  if (subject === undefined) throw new Error(`${name} is not known to the identity provider.`);
  const personId = v7();
  await run(
    'INSERT INTO people (id, subject, name, role, number, created_at) VALUES (?, ?, ?, ?, ?, ?)',
    [personId, subject, name, role, number, at],
  );
  return { kind: 'staff', personId, role, name, number, freshAt: at };
}

/** Writes the shop's profile and its three people, as of `at`. */
export async function openDemoShop(at: Date): Promise<Cast> {
  await transaction((tx) =>
    run(
      `INSERT INTO shops (id, name, place, address, telephone, email, currency, time_zone,
         length_unit, force_unit, warranty_terms, created_at)
       VALUES (1, ?, ?, ?, ?, ?, 'GBP', ?, 'mm', 'N', ?, ?)`,
      [
        'Wrenfield Instrument Repair',
        'Saltmere',
        '4 Chandler’s Row, Saltmere',
        '0000 000 000',
        'bench@wrenfield.example',
        DEMO_ZONE,
        TERMS,
        at,
      ],
      tx,
    ),
  );
  const ines = await keepPerson('ines', at);
  const tomasz = await keepPerson('tomasz', at);
  const priya = await keepPerson('priya', at);
  return { ines, tomasz, priya };
}
