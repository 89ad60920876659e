import { open } from 'node:fs/promises';

const headerBytes = 16;

/**
 * Whether the boxes of an ISO base media file (ISO/IEC 14496-12, 4.2: HEIC, AVIF) end within it. Each states its size in 32 bits;
 * 1 means that 64 bits follow the type, 0 that it reaches to the end.
 */
export async function boxesAreWhole(path: string): Promise<boolean> {
  const file = await open(path, 'r');
  try {
    const { size } = await file.stat();
    return await boxesEndAt(size, (header, at) => file.read(header, 0, headerBytes, at));
  } finally {
    await file.close();
  }
}

type Read = (into: Buffer, at: number) => Promise<{ bytesRead: number }>;

async function boxesEndAt(fileBytes: number, read: Read): Promise<boolean> {
  const header = Buffer.alloc(headerBytes);
  let at = 0;
  while (at < fileBytes) {
    const { bytesRead } = await read(header, at);
    if (bytesRead < 8) return false;
    const stated = header.readUInt32BE(0);
    if (stated === 0) return true;
    if (stated === 1 && bytesRead < headerBytes) return false;
    const size = stated === 1 ? Number(header.readBigUInt64BE(8)) : stated;
    if (size < 8) return false;
    at += size;
  }
  return at === fileBytes;
}
