/** The log's own chain: a case id of sixteen zero bytes, which no case has. */
export const OWN_CHAIN = Buffer.alloc(16);
