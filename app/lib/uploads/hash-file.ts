const hexOf = (bytes: Uint8Array) =>
  Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');

/**
 * SHA-256 of a file in hex. By the browser's own means where it has them; a page that did not come by
 * https has none, and a library hashes the file piece by piece.
 */
export async function hashFile(file: Blob): Promise<string> {
  // The types do not know that it is missing outside a secure context.
  const subtle = crypto.subtle as SubtleCrypto | undefined;
  if (subtle)
    return hexOf(new Uint8Array(await subtle.digest('SHA-256', await file.arrayBuffer())));
  const { sha256 } = await import('@noble/hashes/sha2.js');
  const hash = sha256.create();
  const reader = file.stream().getReader();
  for (let piece = await reader.read(); piece.value !== undefined; piece = await reader.read()) {
    hash.update(piece.value);
  }
  return hexOf(hash.digest());
}
