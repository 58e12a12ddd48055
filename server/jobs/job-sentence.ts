const WHAT: Record<string, string> = {
  mail: 'A mail has not gone out',
  'derive-photo': 'A photo’s smaller copies have not been made',
  'sign-head': 'The head of the log has not been signed',
  'issue-warranty': 'The warranty has not been issued',
};

const WHY: Record<string, string> = {
  'address-refused':
    'the other side refuses the address. Check it with the owner and send it again',
  'bad-address': 'the address cannot be right. Correct it and send it again',
};

/** What is wrong with a job, then what to do, in one sentence for people of the shop. */
export function jobSentence(kind: string, code: string, givenUp: boolean): string {
  const what = WHAT[kind] ?? 'A task has not been done';
  const why = WHY[code];
  if (why !== undefined) return `${what}: ${why}.`;
  return givenUp
    ? `${what}, although it was tried for a day. Tell whoever looks after the program: ${code}.`
    : `${what} yet: ${code}. It is tried again by itself.`;
}
