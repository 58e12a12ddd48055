/** Metadata for a photo made in a test. Every place and time is invented. */
export interface ExifToWrite {
  orientation?: number;
  /** "2026:03:08 01:59:59" */
  time?: string;
  /** "-05:00" */
  offset?: string;
  /** "250" */
  fraction?: string;
  /** Degrees, minutes, seconds north. */
  latitude?: [number, number, number];
}

type Field = { tag: number; type: number; count: number; bytes: Buffer };

const short = (tag: number, value: number): Field => {
  const bytes = Buffer.alloc(2);
  bytes.writeUInt16BE(value);
  return { tag, type: 3, count: 1, bytes };
};
const long = (tag: number, value: number): Field => {
  const bytes = Buffer.alloc(4);
  bytes.writeUInt32BE(value);
  return { tag, type: 4, count: 1, bytes };
};
const text = (tag: number, value: string): Field => {
  const bytes = Buffer.from(`${value}\0`, 'latin1');
  return { tag, type: 2, count: bytes.length, bytes };
};
const rationals = (tag: number, values: number[]): Field => {
  const bytes = Buffer.alloc(8 * values.length);
  values.forEach((value, index) => {
    bytes.writeUInt32BE(Math.round(value * 100), index * 8);
    bytes.writeUInt32BE(100, index * 8 + 4);
  });
  return { tag, type: 5, count: values.length, bytes };
};

/** One directory of fields with its long values behind it (TIFF 6.0, section 2), beginning at `offset`. */
function directory(fields: Field[], offset: number): Buffer {
  const head = Buffer.alloc(2 + fields.length * 12 + 4);
  head.writeUInt16BE(fields.length);
  const values: Buffer[] = [];
  let next = offset + head.length;
  fields.forEach(({ tag, type, count, bytes }, index) => {
    const at = 2 + index * 12;
    head.writeUInt16BE(tag, at);
    head.writeUInt16BE(type, at + 2);
    head.writeUInt32BE(count, at + 4);
    if (bytes.length <= 4) bytes.copy(head, at + 8);
    else {
      head.writeUInt32BE(next, at + 8);
      values.push(bytes);
      next += bytes.length;
    }
  });
  return Buffer.concat([head, ...values]);
}

/** A TIFF structure with these Exif fields (tags of CIPA DC-008, Exif 2.32), big-endian. */
export function exifTiff(wanted: ExifToWrite): Buffer {
  const exif = [
    ...(wanted.time ? [text(0x9003, wanted.time)] : []),
    ...(wanted.offset ? [text(0x9011, wanted.offset)] : []),
    ...(wanted.fraction ? [text(0x9291, wanted.fraction)] : []),
  ];
  const gps = wanted.latitude ? [text(0x0001, 'N'), rationals(0x0002, wanted.latitude)] : [];
  // The sizes do not depend on the pointers, so a first pass finds where each directory begins.
  const first = (exifAt: number, gpsAt: number) => [
    ...(wanted.orientation ? [short(0x0112, wanted.orientation)] : []),
    long(0x8769, exifAt),
    ...(gps.length > 0 ? [long(0x8825, gpsAt)] : []),
  ];
  const exifAt = 8 + directory(first(0, 0), 8).length;
  const gpsAt = exifAt + directory(exif, exifAt).length;
  return Buffer.concat([
    Buffer.from('MM\0*\0\0\0\x08', 'latin1'),
    directory(first(exifAt, gpsAt), 8),
    directory(exif, exifAt),
    ...(gps.length > 0 ? [directory(gps, gpsAt)] : []),
  ]);
}

function segment(marker: number, body: Buffer): Buffer {
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(body.length + 2, 2);
  return Buffer.concat([head, body]);
}

/** The JPEG with Exif in it. */
export function withExif(jpeg: Buffer, wanted: ExifToWrite): Buffer {
  const app1 = segment(0xe1, Buffer.concat([Buffer.from('Exif\0\0'), exifTiff(wanted)]));
  return Buffer.concat([jpeg.subarray(0, 2), app1, jpeg.subarray(2)]);
}

/** The JPEG with a colour profile in it, in pieces of `size` bytes. */
export function withJpegProfile(jpeg: Buffer, profile: Buffer, size = 60_000): Buffer {
  const count = Math.ceil(profile.length / size);
  const pieces = Array.from({ length: count }, (_, index) =>
    segment(
      0xe2,
      Buffer.concat([
        Buffer.from('ICC_PROFILE\0'),
        Buffer.from([index + 1, count]),
        profile.subarray(index * size, (index + 1) * size),
      ]),
    ),
  );
  return Buffer.concat([jpeg.subarray(0, 2), ...pieces, jpeg.subarray(2)]);
}
