function box(type: string, ...bodies: Buffer[]): Buffer {
  const body = Buffer.concat(bodies);
  const head = Buffer.alloc(8);
  head.writeUInt32BE(body.length + 8);
  head.write(type, 4, 'latin1');
  return Buffer.concat([head, body]);
}

function ispe(width: number, height: number): Buffer {
  const body = Buffer.alloc(12);
  body.writeUInt32BE(width, 4);
  body.writeUInt32BE(height, 8);
  return box('ispe', body);
}

/**
 * The boxes of a HEIC file of tiles (ISO/IEC 14496-12, 23008-12) around data that is no picture: for
 * what looks at the boxes alone.
 */
export function heicShell({
  width = 4032,
  height = 3024,
  profile,
}: { width?: number; height?: number; profile?: Buffer } = {}): Buffer {
  const properties = [ispe(512, 512), ispe(width, height), ispe(320, 240)];
  if (profile) properties.push(box('colr', Buffer.from('prof'), profile));
  return Buffer.concat([
    box('ftyp', Buffer.from('heic\0\0\0\0mif1heic', 'latin1')),
    box('meta', Buffer.alloc(4), box('iprp', box('ipco', ...properties))),
    box('mdat', Buffer.alloc(4000, 7)),
  ]);
}
