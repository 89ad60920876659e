import type { Photo } from '@oriel/shared/contracts/photos';

/** A photo with its derivatives made, taken on that day. */
export const somePhoto = (name: string, day: string): Photo => ({
  id: name,
  name,
  width: 3000,
  height: 2000,
  bytes: 1_000_000,
  mime: 'image/jpeg',
  hasAlpha: false,
  takenAt: `${day}T12:00:00.000Z`,
  uploadedAt: '2026-01-01T12:00:00.000Z',
  uploadedBy: 'Ada',
  state: 'ready',
  problem: null,
  placeholder: null,
  binnedAt: null,
});
