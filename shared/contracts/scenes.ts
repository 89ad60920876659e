import * as z from 'zod';
import { Id, Moment, Name } from './fields';
import { DerivativeEdge } from './photos';
import { designers, everyRole } from './role';
import { defineRoute, members } from './route';

const Millimetres = z.number().min(-100_000).max(100_000);
const Length = z.number().positive('Must be more than 0').max(100_000);

export const GlassSchema = z.object({ widthMm: Length, heightMm: Length });
export const EyeSchema = z.object({ x: Millimetres, y: Millimetres, z: Length });
export const ZoneSchema = z
  .object({
    leftMm: Millimetres,
    rightMm: Millimetres,
    lowestMm: Millimetres,
    highestMm: Millimetres,
    nearestMm: Length,
    farthestMm: Length,
  })
  .refine((zone) => zone.leftMm < zone.rightMm, { path: ['rightMm'], message: 'Right must lie to the right of left' })
  .refine((zone) => zone.lowestMm < zone.highestMm, { path: ['highestMm'], message: 'Highest must lie above lowest' })
  .refine((zone) => zone.nearestMm <= zone.farthestMm, { path: ['farthestMm'], message: 'Farthest must not be nearer than nearest' });

/** Centre and size on the glass, as seen from the home eye. */
export const PlacedSchema = z.object({ xMm: Millimetres, yMm: Millimetres, widthMm: Length, heightMm: Length });

/** An image with alpha, trimmed to what is opaque in it. */
export const LayerImage = z.object({
  id: Id,
  width: z.number().int().positive(),
  height: z.number().int().positive(),
  /** Where the trimmed image lay in the image it came from, px, and that image's size. */
  trim: z.object({ left: z.number().int(), top: z.number().int(), ofWidth: z.number().int(), ofHeight: z.number().int() }),
});
export type LayerImage = z.infer<typeof LayerImage>;

export const Layer = z.object({
  id: Id,
  name: Name,
  image: LayerImage,
  depthMm: Millimetres,
  placed: PlacedSchema,
  opacity: z.number().min(0).max(1),
  shown: z.boolean(),
});
export type Layer = z.infer<typeof Layer>;

/** What the designer draws. Layers in ledger order, which also breaks ties of depth: the later stands before the earlier. */
export const SceneDocument = z.object({
  name: Name,
  /** Whose photograph it is and under what licence, where that must be said. */
  credit: z.string().trim().max(200, 'Use at most 200 characters').optional(),
  glass: GlassSchema,
  homeEye: EyeSchema,
  zone: ZoneSchema,
  layers: z.array(Layer).max(64, 'A scene holds at most 64 layers'),
});
export type SceneDocument = z.infer<typeof SceneDocument>;

export const Scene = z.object({
  id: Id,
  householdId: Id,
  document: SceneDocument,
  revision: z.number().int(),
  savedAt: Moment,
  savedBy: z.string(),
  /** The account that saved it; null once that is gone. */
  savedById: Id.nullable(),
});
export type Scene = z.infer<typeof Scene>;

const HouseholdParams = z.object({ householdId: Id });
const SceneParams = z.object({ sceneId: Id });
const SceneReply = z.object({ scene: Scene });

export const listScenes = defineRoute({
  method: 'GET',
  path: '/api/households/:householdId/scenes',
  access: members('household', everyRole),
  params: HouseholdParams,
  query: z.object({ bin: z.stringbool().default(false) }),
  reply: z.object({ scenes: z.array(Scene) }),
});
/** From one photo: it covers the glass as the back layer. From several: each becomes a layer, the first farthest. From none: an empty sheet. */
export const createScene = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/scenes',
  access: members('household', designers),
  params: HouseholdParams,
  body: z.object({ name: Name.optional(), photoIds: z.array(Id).max(64).default([]) }),
  reply: SceneReply,
});
export const readScene = defineRoute({
  method: 'GET',
  path: '/api/scenes/:sceneId',
  access: members('scene', everyRole),
  params: SceneParams,
  reply: SceneReply,
});
/**
 * Saves over `revision`, which must be the newest: otherwise 409 `revision-moved` with `detail` {revision, savedBy, savedById, savedAt},
 * and nothing is written.
 */
export const saveScene = defineRoute({
  method: 'PUT',
  path: '/api/scenes/:sceneId',
  access: members('scene', designers),
  params: SceneParams,
  body: z.object({ revision: z.number().int(), document: SceneDocument }),
  reply: SceneReply,
});
export const duplicateScene = defineRoute({
  method: 'POST',
  path: '/api/scenes/:sceneId/duplicates',
  access: members('scene', designers),
  params: SceneParams,
  /** With a document, the copy holds that instead: how an edit that came too late is kept. */
  body: z.object({ document: SceneDocument.optional() }),
  reply: SceneReply,
});
export const binScene = defineRoute({
  method: 'DELETE',
  path: '/api/scenes/:sceneId',
  access: members('scene', designers),
  params: SceneParams,
});
export const restoreScene = defineRoute({
  method: 'POST',
  path: '/api/scenes/:sceneId/restoration',
  access: members('scene', designers),
  params: SceneParams,
  reply: SceneReply,
});

const ImageReply = z.object({ image: LayerImage, name: z.string() });
/** A file becomes a layer's image; 422 `nothing-opaque` when it is wholly transparent. */
export const uploadLayerImage = defineRoute({
  method: 'POST',
  path: '/api/scenes/:sceneId/images',
  access: members('scene', designers),
  params: SceneParams,
  sends: 'multipart',
  reply: ImageReply,
});
export const layerImageFromPhoto = defineRoute({
  method: 'POST',
  path: '/api/scenes/:sceneId/images/from-photo',
  access: members('scene', designers),
  params: SceneParams,
  body: z.object({ photoId: Id }),
  reply: ImageReply,
});
/** WebP with alpha, the long edge at most `edge` px. */
export const layerImageFile = defineRoute({
  method: 'GET',
  path: '/api/images/:imageId/:edge',
  access: members('image', everyRole),
  params: z.object({ imageId: Id, edge: DerivativeEdge }),
  answers: 'file',
});
