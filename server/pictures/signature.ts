import { open } from 'node:fs/promises';

export type PictureFormat = 'jpeg' | 'png' | 'webp' | 'tiff' | 'gif' | 'avif' | 'heic';

/** Enough of a file's beginning to tell what it is. */
const signatureBytes = 64;

const startsWith = (bytes: Uint8Array, ...signature: number[]) => signature.every((byte, i) => bytes[i] === byte);
const text = (bytes: Uint8Array, from: number, to: number) => String.fromCharCode(...bytes.subarray(from, to));

const heicBrands = ['heic', 'heix', 'heim', 'heis', 'hevc', 'hevx'];
const avifBrands = ['avif', 'avis'];

/** ISO/IEC 14496-12: a file starts with the box `ftyp`: its size, its brand, a version, and the brands it is compatible with. */
function fromBrands(bytes: Uint8Array): PictureFormat | null {
  const size = new DataView(bytes.buffer, bytes.byteOffset).getUint32(0);
  const brands = [text(bytes, 8, 12)];
  for (let at = 16; at + 4 <= Math.min(size, bytes.length); at += 4) brands.push(text(bytes, at, at + 4));
  if (brands.some((brand) => avifBrands.includes(brand))) return 'avif';
  if (brands.some((brand) => heicBrands.includes(brand))) return 'heic';
  return null;
}

/** What a file is by its first bytes, whatever its name; null when it is none of the pictures taken. */
export function formatOf(bytes: Uint8Array): PictureFormat | null {
  if (bytes.length < 12) return null;
  if (startsWith(bytes, 0xff, 0xd8, 0xff)) return 'jpeg';
  if (startsWith(bytes, 0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a)) return 'png';
  if (text(bytes, 0, 4) === 'RIFF' && text(bytes, 8, 12) === 'WEBP') return 'webp';
  if (startsWith(bytes, 0x49, 0x49, 0x2a, 0x00) || startsWith(bytes, 0x4d, 0x4d, 0x00, 0x2a)) return 'tiff';
  if (text(bytes, 0, 6) === 'GIF87a' || text(bytes, 0, 6) === 'GIF89a') return 'gif';
  if (text(bytes, 4, 8) === 'ftyp') return fromBrands(bytes);
  return null;
}

export async function formatOfFile(path: string): Promise<PictureFormat | null> {
  const file = await open(path, 'r');
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(signatureBytes), 0, signatureBytes, 0);
    return formatOf(buffer.subarray(0, bytesRead));
  } finally {
    await file.close();
  }
}
