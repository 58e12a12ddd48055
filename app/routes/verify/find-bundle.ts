const FORMAT = 'witnessmark-bundle/1';

/**
 * Finds the record in a dropped file: the file itself, or the attachment of a paper, which stands in
 * it without a filter so that it can be found by its format alone. Nothing else of the PDF is read.
 * @returns the record's text; null when there is none
 */
export function findBundle(file: Uint8Array): string | null {
  // One sign per byte, so that places in the text are places in the file.
  const signs = new TextDecoder('latin1').decode(file);
  const at = signs.indexOf(FORMAT);
  if (at < 0) return null;
  if (/^\s*\{/.test(signs)) return new TextDecoder().decode(file);
  const open = signs.lastIndexOf('stream', at);
  const end = signs.indexOf('endstream', at);
  const start = signs.indexOf('{', open);
  if (open < 0 || end < 0 || start > at) return null;
  const text = new TextDecoder().decode(file.subarray(start, end));
  return text.slice(0, text.lastIndexOf('}') + 1);
}
