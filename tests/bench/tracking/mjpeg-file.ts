import { spawn } from 'node:child_process';
import { open } from 'node:fs/promises';
import { join } from 'node:path';

/** The video as a raw MJPEG file: itself where it is one, else converted by ffmpeg into the folder at its best quality. */
export async function asMjpeg(video: string, folder: string): Promise<string> {
  const file = await open(video);
  const { buffer } = await file.read(new Uint8Array(3), 0, 3, 0);
  await file.close();
  if (buffer[0] === 0xff && buffer[1] === 0xd8 && buffer[2] === 0xff) return video;
  const converted = join(folder, 'video.mjpeg');
  await runFfmpeg([
    '-i',
    video,
    '-an',
    '-c:v',
    'mjpeg',
    '-q:v',
    '2',
    '-pix_fmt',
    'yuvj420p',
    '-fps_mode',
    'passthrough',
    '-f',
    'mjpeg',
    converted,
  ]);
  return converted;
}

function runFfmpeg(args: readonly string[]): Promise<void> {
  return new Promise((resolve, reject) => {
    const ffmpeg = spawn('ffmpeg', ['-v', 'error', '-y', ...args], { stdio: ['ignore', 'ignore', 'inherit'] });
    ffmpeg.on('error', () => reject(new Error('ffmpeg is needed to read this video: apt-get install ffmpeg')));
    ffmpeg.on('close', (code) =>
      code === 0 ? resolve() : reject(new Error(`ffmpeg could not read the video (exit ${String(code)})`)),
    );
  });
}
