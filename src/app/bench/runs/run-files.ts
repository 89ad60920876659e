import { captureKnown } from '@oriel/shared/replay/capture-time';
import type { WholeRun } from './runs-store';

/** A spreadsheet takes a text that begins with one of these for a formula (OWASP, CSV Injection; memory). */
const formulaStart = /^[=+\-@\t\r\n]/;

/** One field of RFC 4180: texts that a spreadsheet would calculate are led by an apostrophe, and quoted where the format asks for it. */
function field(value: string | number | null): string {
  if (value === null) return '';
  if (typeof value === 'number') return String(value);
  const safe = formulaStart.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

const columns = [
  'run',
  'captured_ms',
  'received_ms',
  'eye_x_mm',
  'eye_y_mm',
  'eye_z_mm',
  'crop_ms',
  'detect_ms',
  'landmarks_ms',
  'total_ms',
];

/** A run as comma-separated values (RFC 4180): one line a sample, empty eye fields where nobody was, and no capture where it is not known. */
export function csvOf({ run, samples }: WholeRun): string {
  const rows = samples.map(({ capturedMs, receivedMs, eye, cropMs, detectMs, landmarksMs, totalMs }) => [
    run.name,
    captureKnown({ capturedMs, receivedMs, eye }) ? capturedMs : null,
    receivedMs,
    ...(eye ?? [null, null, null]),
    cropMs,
    detectMs,
    landmarksMs,
    totalMs,
  ]);
  return [columns, ...rows].map((row) => `${row.map(field).join(',')}\r\n`).join('');
}

/** What the names in the file do not say by themselves. */
const units = {
  capturedMs: 'ms since the first sample was received; the same as receivedMs where the browser did not tell when a frame was captured',
  eye: 'mm from the centre of the glass: right of it, above it, out of it toward the viewer; null where nobody was seen',
  totalMs: 'ms from the frame in hand to the eye; crop, detect and landmarks are parts of it',
  'filter.across, filter.along': 'the 1 euro filter: minCutoffHz and derivativeCutoffHz in Hz, beta in Hz for each mm/s',
};

/** The whole run, settings and all, units in its names. */
export const jsonOf = (whole: WholeRun): string =>
  `${JSON.stringify({ format: 'oriel-run', version: 1, units, ...whole }, null, 1)}\n`;

/** A file name that every system takes. */
export function fileNameOf(name: string, ending: 'csv' | 'json'): string {
  const plain = name
    .replace(/[^\p{L}\p{N} .,_-]+/gu, '')
    .replace(/^[. ]+|[. ]+$/g, '')
    .slice(0, 80);
  return `${plain || 'run'}.${ending}`;
}

/** Hands a text to the person as a file. */
export function download(document: Document, name: string, text: string, type: string): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(new Blob([text], { type }));
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(link.href), 1000);
}
