interface Pixels {
  readonly width: number;
  readonly height: number;
  /** RGBA, 8 bits each, row by row. */
  readonly data: Uint8Array;
}

const headerBytes = 8;
const entryBytes = 12;
const short = 3;
const long = 4;
const undefinedBytes = 7;

/**
 * Wraps decoded pixels as a bare TIFF (revision 6.0, 1992, section 2; ICC profile in tag 34675 by ICC.1:2022, annex B.4), the simplest
 * way to tell an image library in whose colours the pixels are.
 */
export function tiffWithProfile({ width, height, data }: Pixels, profile: Uint8Array): Buffer {
  const channels = 4;
  const pixelsAt = headerBytes;
  const bitsAt = pixelsAt + data.byteLength;
  const profileAt = bitsAt + channels * 2;
  const directoryAt = profileAt + profile.byteLength + (profile.byteLength % 2);
  /** Tag, type, count, value or where it stands. */
  const entries: [number, number, number, number][] = [
    [256, long, 1, width],
    [257, long, 1, height],
    [258, short, channels, bitsAt],
    [259, short, 1, 1], // not compressed
    [262, short, 1, 2], // RGB
    [273, long, 1, pixelsAt],
    [277, short, 1, channels],
    [278, long, 1, height],
    [279, long, 1, data.byteLength],
    [338, short, 1, 2], // the fourth channel is alpha, not premultiplied
    [34675, undefinedBytes, profile.byteLength, profileAt],
  ];

  const file = Buffer.alloc(directoryAt + 2 + entries.length * entryBytes + 4);
  file.write('II', 0, 'latin1');
  file.writeUInt16LE(42, 2);
  file.writeUInt32LE(directoryAt, 4);
  file.set(data, pixelsAt);
  for (let i = 0; i < channels; i++) file.writeUInt16LE(8, bitsAt + i * 2);
  file.set(profile, profileAt);
  file.writeUInt16LE(entries.length, directoryAt);
  entries.forEach(([tag, type, count, value], i) => {
    const at = directoryAt + 2 + i * entryBytes;
    file.writeUInt16LE(tag, at);
    file.writeUInt16LE(type, at + 2);
    file.writeUInt32LE(count, at + 4);
    file.writeUInt32LE(value, at + 8);
  });
  return file;
}
