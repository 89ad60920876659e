import type { TrackingState } from './tracking-state';

/** What is known of the camera before it is asked for: why there will be none, or null where there may be one. Asks nobody anything. */
export async function cameraOutlook({ mediaDevices, permissions }: Partial<Pick<Navigator, 'mediaDevices' | 'permissions'>>): Promise<TrackingState | null> {
  if (!mediaDevices) return 'unsupported';
  // Not every browser knows this permission by name.
  const permission = await permissions?.query({ name: 'camera' as PermissionName }).catch(() => null);
  if (permission?.state === 'denied') return 'refused';
  const devices = await mediaDevices.enumerateDevices().catch(() => null);
  return devices && !devices.some(({ kind }) => kind === 'videoinput') ? 'no-camera' : null;
}
