import { demoStaff } from './demo-staff.ts';

/** What `npm start` shows when all is up: where to go, who can sign in and how, where the mails are. */
export function startScreen(facts: {
  url: string;
  mailPage: string;
  owners: readonly { name: string; email: string; has: string }[];
  dataFolder: string;
}): string {
  const width = Math.max(...facts.owners.map(({ email }) => email.length), 0);
  return `
Witnessmark is running with the demo shop, Wrenfield Instrument Repair.

  Open      ${facts.url}
  Staff     "Sign in with the shop's account", then choose a person:
${demoStaff.map(({ name, does }) => `              ${name}, ${does}`).join('\n')}
  Owners    give one of these addresses; the code comes by mail:
${facts.owners.map(({ name, email, has }) => `              ${email.padEnd(width)}  ${name}, ${has}`).join('\n')}
  Mail      ${facts.mailPage}  shows every mail the shop sends; none leaves this computer

Demo keys and demo sign-in: for this computer only. Data is kept in ${facts.dataFolder}.
Ctrl-C stops everything.
`;
}
