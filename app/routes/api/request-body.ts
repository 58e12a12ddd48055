/** What is still read of a body that nobody wants any more, in bytes. */
const DRAIN = 80_000_000;

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

/** Reads on to the end of a body after its answer is made, so that the sender gets to see the answer. */
export async function drain(reader: ReadableStreamDefaultReader<Uint8Array>): Promise<void> {
  try {
    for (let left = DRAIN; left > 0;) {
      const { value } = await reader.read();
      if (value === undefined) return;
      left -= value.length;
    }
    await reader.cancel();
  } catch {
    // The sender has gone.
  }
}
