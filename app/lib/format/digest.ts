/** The first eight digits in groups of four: "40ad e8a3". */
export function shortDigest(hex: string): string {
  return `${hex.slice(0, 4)}\u00a0${hex.slice(4, 8)}`;
}

/** All digits in groups of eight. */
export function groupedDigest(hex: string): string {
  return (hex.match(/.{1,8}/g) ?? []).join(' ');
}
