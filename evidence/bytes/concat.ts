/** Joins byte arrays in the order given, with nothing between them. */
export function concat(...arrays: Uint8Array[]): Uint8Array {
  const joined = new Uint8Array(arrays.reduce((length, array) => length + array.length, 0));
  let at = 0;
  for (const array of arrays) {
    joined.set(array, at);
    at += array.length;
  }
  return joined;
}
