import * as z from 'zod';
import { Id, Moment } from './fields';
import { designers, everyRole } from './role';
import { defineRoute, members } from './route';

/** Long edges of the derivatives, px. */
export const derivativeEdges = [320, 800, 1600, 3200] as const;
export type DerivativeEdge = (typeof derivativeEdges)[number];
export const DerivativeEdge = z.coerce
  .number()
  .refine((edge): edge is DerivativeEdge => derivativeEdges.some((known) => known === edge), 'Ask for 320, 800, 1600 or 3200');

export const photoMaxBytes = 100 * 1024 * 1024;
export const photoMaxPixels = 120_000_000;

export const PhotoState = z.enum(['waiting', 'ready', 'failed']);

export const Photo = z.object({
  id: Id,
  name: z.string(),
  /** Upright size, px. */
  width: z.number().int(),
  height: z.number().int(),
  bytes: z.number().int(),
  mime: z.string(),
  hasAlpha: z.boolean(),
  /** What the camera's clock showed, wherever it was, written as if it were UTC: to be shown as it is, in no zone. */
  takenAt: Moment,
  uploadedAt: Moment,
  uploadedBy: z.string(),
  state: PhotoState,
  /** Why the derivatives could not be made, in plain words. */
  problem: z.string().nullable(),
  /** ThumbHash, base64; null until derivatives are made. */
  placeholder: z.string().nullable(),
  binnedAt: Moment.nullable(),
});
export type Photo = z.infer<typeof Photo>;

const HouseholdParams = z.object({ householdId: Id });
const PhotoParams = z.object({ photoId: Id });
const PhotosReply = z.object({ photos: z.array(Photo) });
const PhotoIds = z.object({ photoIds: z.array(Id).min(1).max(1000) });

/** Newest taken first. `after` is the opaque `next` of the page before. */
export const listPhotos = defineRoute({
  method: 'GET',
  path: '/api/households/:householdId/photos',
  access: members('household', everyRole),
  params: HouseholdParams,
  query: z.object({
    after: z.string().max(200).optional(),
    limit: z.coerce.number().int().min(1).max(500).default(200),
    search: z.string().trim().max(200).optional(),
    bin: z.stringbool().default(false),
  }),
  reply: z.object({ photos: z.array(Photo), next: z.string().nullable(), total: z.number().int() }),
});
/** The present state of some photos, for a page that waits for derivatives. */
export const readPhotos = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/photos/reading',
  access: members('household', everyRole),
  params: HouseholdParams,
  body: PhotoIds,
  reply: PhotosReply,
});
export const uploadPhoto = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/photos',
  access: members('household', designers),
  params: HouseholdParams,
  sends: 'multipart',
  reply: z.object({ photo: Photo, duplicate: z.boolean() }),
});
export const binPhotos = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/photos/bin',
  access: members('household', designers),
  params: HouseholdParams,
  body: PhotoIds,
  reply: PhotosReply,
});
export const restorePhotos = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/photos/restoration',
  access: members('household', designers),
  params: HouseholdParams,
  body: PhotoIds,
  reply: PhotosReply,
});
export const readPhoto = defineRoute({
  method: 'GET',
  path: '/api/photos/:photoId',
  access: members('photo', everyRole),
  params: PhotoParams,
  reply: z.object({ photo: Photo }),
});
/** An upright sRGB WebP without metadata. */
export const photoDerivative = defineRoute({
  method: 'GET',
  path: '/api/photos/:photoId/derivatives/:edge',
  access: members('photo', everyRole),
  params: z.object({ photoId: Id, edge: DerivativeEdge }),
  answers: 'file',
});
/** The file as it was uploaded, metadata and all, for those who may upload. */
export const photoOriginal = defineRoute({
  method: 'GET',
  path: '/api/photos/:photoId/original',
  access: members('photo', designers),
  params: PhotoParams,
  answers: 'file',
});
