import type { ReplaySample } from './sample';
import { spreadOf } from './spread';

/**
 * Whether it is known when a sample was captured. Where the browser does not tell, or does not tell yet, the sample is noted as captured
 * when it was received: no frame arrives in no time.
 */
export const captureKnown = ({ capturedMs, receivedMs }: ReplaySample): boolean => receivedMs > capturedMs;

/**
 * A run whose first samples came before the camera's clock was known, on one clock: those are taken to have been under way as long as
 * the median of the others. As it is where all or none are known.
 */
export function onOneClock<T extends ReplaySample>(samples: readonly T[]): readonly T[] {
  const { median } = spreadOf(samples.filter(captureKnown).map(({ capturedMs, receivedMs }) => receivedMs - capturedMs));
  if (Number.isNaN(median)) return samples;
  return samples.map((sample) => (captureKnown(sample) ? sample : { ...sample, capturedMs: sample.receivedMs - median }));
}
