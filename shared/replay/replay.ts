import { createFollower } from '../smoothing/follower';
import type { FollowerSettings } from '../smoothing/follower-settings';
import { createTrack, type ReplaySample, type Track } from './sample';

/** The usual screen. */
export const DISPLAY_HZ = 60;

/**
 * The eye the picture would have been drawn for: the run's samples through a follower with these settings, each sample taken when it was
 * received, a picture drawn `displayHz` times a second and lit `litAfterMs` after it was drawn. The times of the result are those of the
 * light. Begins with the first sample that shows somebody. The same run and settings give the same track, bit for bit.
 */
export function replay(
  samples: readonly ReplaySample[],
  settings: FollowerSettings,
  litAfterMs: number,
  displayHz = DISPLAY_HZ,
): Track {
  const first = samples.findIndex(({ eye }) => eye !== null);
  if (first < 0) return createTrack(0);
  const stepMs = 1000 / displayHz;
  const startMs = samples[first].receivedMs;
  const endMs = samples[samples.length - 1].receivedMs;
  const track = createTrack(Math.floor((endMs - startMs) / stepMs) + 1);
  const follower = createFollower(settings);
  const eye = { x: 0, y: 0, z: 0 };
  let next = first;
  for (let frame = 0; frame < track.tMs.length; frame++) {
    const nowMs = startMs + frame * stepMs;
    for (; next < samples.length && samples[next].receivedMs <= nowMs; next++) {
      const { eye: seen, capturedMs } = samples[next];
      if (!seen) follower.lost(capturedMs);
      else if (seen[2] > 0) follower.sample({ x: seen[0], y: seen[1], z: seen[2] }, capturedMs);
    }
    follower.at(nowMs + litAfterMs, eye);
    track.tMs[frame] = nowMs + litAfterMs;
    track.x[frame] = eye.x;
    track.y[frame] = eye.y;
    track.z[frame] = eye.z;
  }
  return track;
}
