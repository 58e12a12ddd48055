/** A colour profile of `length` bytes as far as its header goes (ICC.1:2022 7.2): RGB, with its own size. */
export function aProfile(length: number): Buffer {
  const profile = Buffer.from(Array.from({ length }, (_, at) => (at * 31) % 251));
  profile.writeUInt32BE(length, 0);
  profile.write('mntrRGB XYZ ', 12, 'latin1');
  profile.write('acsp', 36, 'latin1');
  return profile;
}
