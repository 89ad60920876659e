import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import * as z from 'zod';
import { Email, Name, Password } from '@oriel/shared/contracts/fields';
import { Role } from '@oriel/shared/contracts/role';
import { EyeSchema, GlassSchema, Layer, PlacedSchema, SceneDocument, ZoneSchema } from '@oriel/shared/contracts/scenes';

const DemoAccount = z.object({ name: Name, email: Email, password: Password, role: Role });
export type DemoAccount = z.infer<typeof DemoAccount>;

/** A layer's file stands where `placed` says, whole; what is transparent around it is trimmed when it is taken in. */
const DemoLayer = z.object({
  name: Name,
  file: z.string(),
  depthMm: Layer.shape.depthMm,
  placed: PlacedSchema,
  opacity: Layer.shape.opacity,
  shown: Layer.shape.shown,
});
const DemoScene = z.object({
  name: Name,
  credit: SceneDocument.shape.credit,
  glass: GlassSchema,
  homeEye: EyeSchema,
  zone: ZoneSchema,
  layers: z.array(DemoLayer),
});
export type DemoScene = z.infer<typeof DemoScene>;

export interface DemoFiles {
  readonly accounts: readonly DemoAccount[];
  readonly scenes: readonly DemoScene[];
  /** Paths. */
  readonly photos: readonly string[];
}

/** Reads what the demo is made of. @throws when a file is missing or not as it should be. */
export async function readDemoFiles(folder: string): Promise<DemoFiles> {
  const json = async (name: string): Promise<unknown> => JSON.parse(await readFile(join(folder, name), 'utf8'));
  const photos = (await readdir(join(folder, 'photos'))).filter((name) => !name.startsWith('.')).sort();
  return {
    accounts: z
      .array(DemoAccount)
      .nonempty()
      .parse(await json('accounts.json')),
    scenes: z.array(DemoScene).parse(await json('scenes.json')),
    photos: photos.map((name) => join(folder, 'photos', name)),
  };
}
