/**
 * A request's body as pieces. Unlike `for await` over the body itself, stopping half-way does not cut
 * the connection: a sender that is cut off never sees why.
 */
export function piecesOf(reader: ReadableStreamDefaultReader<Uint8Array>) {
  const next = async () => {
    const { value } = await reader.read();
    return value === undefined
      ? { done: true as const, value: undefined }
      : { done: false as const, value };
  };
  return { [Symbol.asyncIterator]: () => ({ next }) };
}
