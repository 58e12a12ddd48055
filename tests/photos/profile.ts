/**
 * A colour profile of `length` bytes as far as its header and one tag go (ICC.1:2022 7.2, 7.3): RGB,
 * version 2.4, with its own size, and nothing but a copyright in it; behind that some filling.
 */
export function aProfile(length: number): Buffer {
  const profile = Buffer.from(Array.from({ length }, (_, at) => (at < 160 ? 0 : (at * 31) % 251)));
  profile.writeUInt32BE(length, 0);
  profile.writeUInt32BE(0x02400000, 8);
  profile.write('mntrRGB XYZ ', 12, 'latin1');
  profile.write('acsp', 36, 'latin1');
  profile.writeUInt32BE(1, 128);
  profile.write('cprt', 132, 'latin1');
  profile.writeUInt32BE(144, 136);
  profile.writeUInt32BE(13, 140);
  profile.write('text\0\0\0\0none', 144, 'latin1');
  return profile;
}
