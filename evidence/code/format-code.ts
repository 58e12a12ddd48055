/** A code as print and screens group it, 4-4-3: `7KQ2-M8FX-4DN`. */
export function formatCode(code: string): string {
  return [code.slice(0, 4), code.slice(4, 8), code.slice(8)].join('-');
}
