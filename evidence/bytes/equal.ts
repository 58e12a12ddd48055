/** Whether two byte arrays hold the same bytes. All that is compared with it is public. */
export function equal(a: Uint8Array, b: Uint8Array): boolean {
  return a.length === b.length && a.every((byte, at) => byte === b[at]);
}
