import { spawn } from 'node:child_process';
import { join } from 'node:path';

/** What a camera's MJPEG decodes to, and what the bench replays: luma, and colour at half the resolution each way. */
const CAMERA_PIXELS = 'yuvj420p';

/** The video as a raw MJPEG file: itself where it is one, else converted by ffmpeg into the folder at its best quality. */
export async function asMjpeg(video: string, folder: string): Promise<string> {
  const probe = [
    '-v',
    'error',
    '-select_streams',
    'v:0',
    '-show_entries',
    'format=format_name:stream=pix_fmt',
    '-of',
    'json',
    video,
  ];
  const { format, streams } = JSON.parse(await run('ffprobe', probe)) as Probed;
  if (streams.length === 0) throw new Error(`There is no video in ${video}.`);
  if (RAW_MJPEG.includes(format.format_name) && streams[0].pix_fmt === CAMERA_PIXELS) return video;
  const converted = join(folder, 'video.mjpeg');
  const encoding = [
    '-an',
    '-c:v',
    'mjpeg',
    '-q:v',
    '2',
    '-pix_fmt',
    CAMERA_PIXELS,
    '-fps_mode',
    'passthrough',
    '-f',
    'mjpeg',
  ];
  await run('ffmpeg', ['-v', 'error', '-y', '-i', video, ...encoding, converted]);
  return converted;
}

interface Probed {
  readonly format: { readonly format_name: string };
  readonly streams: readonly { readonly pix_fmt: string }[];
}

/** What ffprobe calls a file of JPEG pictures one after another. */
const RAW_MJPEG: readonly string[] = ['mjpeg', 'jpeg_pipe'];

function run(program: 'ffmpeg' | 'ffprobe', args: readonly string[]): Promise<string> {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { stdio: ['ignore', 'pipe', 'inherit'] });
    let printed = '';
    child.stdout.on('data', (data: Buffer) => (printed += data.toString()));
    child.on('error', () => reject(new Error(`${program} is needed to read the video: apt-get install ffmpeg`)));
    child.on('close', (code) =>
      code === 0 ? resolve(printed) : reject(new Error(`${program} could not read the video (exit ${String(code)})`)),
    );
  });
}
