import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { BLOCK_PX, NUMBER_BITS } from '../bench/tracking/frame-number';

const LIGHT = 235;
const DARK = 20;

/** Draws a frame's number into its lower left edge, so that every result can be matched to its truth: see `readFrameNumber`. */
export function drawFrameNumber(frame: Uint8Array, width: number, height: number, number: number): void {
  let parity = 0;
  for (let block = 0; block <= NUMBER_BITS; block++) {
    const bit = block < NUMBER_BITS ? (number >> block) & 1 : parity;
    parity ^= bit;
    for (let y = height - BLOCK_PX; y < height; y++) {
      const from = (y * width + block * BLOCK_PX) * 3;
      frame.fill(bit ? LIGHT : DARK, from, from + BLOCK_PX * 3);
    }
  }
}

/** Writes frames (red, green, blue, 8 bits) as a raw MJPEG file with ffmpeg, one picture a frame, as Chromium's fake camera reads it. */
export async function writeMjpeg(
  file: string,
  size: { readonly width: number; readonly height: number; readonly fps: number },
  frames: Iterable<Uint8Array>,
): Promise<void> {
  const input = [
    '-f',
    'rawvideo',
    '-pix_fmt',
    'rgb24',
    '-s',
    `${String(size.width)}x${String(size.height)}`,
    '-r',
    String(size.fps),
    '-i',
    '-',
  ];
  const output = ['-c:v', 'mjpeg', '-q:v', '3', '-pix_fmt', 'yuvj420p', '-f', 'mjpeg', file];
  const ffmpeg = spawn('ffmpeg', ['-v', 'error', '-y', ...input, ...output], { stdio: ['pipe', 'inherit', 'inherit'] });
  const closed = once(ffmpeg, 'close') as Promise<[number]>;
  for (const frame of frames) {
    if (!ffmpeg.stdin.write(frame)) await once(ffmpeg.stdin, 'drain');
  }
  ffmpeg.stdin.end();
  const [code] = await closed;
  if (code !== 0) throw new Error(`ffmpeg could not write ${file} (exit ${String(code)})`);
}
