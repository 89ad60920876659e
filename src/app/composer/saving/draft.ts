import * as z from 'zod';
import { SceneDocument } from '@oriel/shared/contracts/scenes';

/** Work not yet saved, and the revision it was drawn on. */
export const Draft = z.object({ revision: z.number().int(), document: SceneDocument });
export type Draft = z.infer<typeof Draft>;

/** Whether two scenes are the same in every figure; the schema settles the order of their keys. */
export function sameDocument(a: SceneDocument, b: SceneDocument): boolean {
  return a === b || JSON.stringify(SceneDocument.parse(a)) === JSON.stringify(SceneDocument.parse(b));
}
