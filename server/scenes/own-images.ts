import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import type { Database } from '../database/database';
import { imagesById } from './image-queries';
import { imagesNotHere, layersAlike } from './refusals';

/**
 * The document with what the server itself knows of each image, whatever the page said of it.
 * @throws image-not-here (422) for images of another household or of none, layers-alike (400) when an id occurs twice.
 */
export async function withOwnImages(
  db: Database,
  householdId: string,
  document: SceneDocument,
): Promise<SceneDocument> {
  const { layers } = document;
  const twice = layers.findIndex(({ id }, index) => layers.findIndex((other) => other.id === id) < index);
  if (twice >= 0) throw layersAlike(twice);

  const images = await imagesById(
    db,
    householdId,
    layers.map(({ image }) => image.id),
  );
  const missing = layers.flatMap(({ image }, index) => (images.has(image.id) ? [] : [index]));
  if (missing.length > 0) throw imagesNotHere(missing);
  return { ...document, layers: layers.map((layer) => ({ ...layer, image: images.get(layer.image.id)! })) };
}
