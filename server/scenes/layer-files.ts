import sharp from 'sharp';
import type { LayerImage } from '@oriel/shared/contracts/scenes';
import { derivativeEdges } from '@oriel/shared/contracts/photos';
import type { Database } from '../database/database';
import { openPicture } from '../pictures/open-picture';
import { lockContent } from '../storage/content';
import { edgesFor, layerKey, originalKey, type Edge } from '../storage/keys';
import type { Storage } from '../storage/storage';

/** What the files of a layer are made from. */
export interface LayerSource extends Pick<LayerImage, 'width' | 'height' | 'trim'> {
  readonly sha256: string;
}

const quality = 88;
const largestEdge = Math.max(...derivativeEdges);
const largestAtOnce = 2;

async function makeFiles(path: string, { width, height, trim }: LayerSource): Promise<{ edge: Edge; bytes: Buffer }[]> {
  const picture = await openPicture(path);
  const { data, info } = await picture
    .extract({ left: trim.left, top: trim.top, width, height })
    .resize(largestEdge, largestEdge, { fit: 'inside', withoutEnlargement: true })
    .raw()
    .toBuffer({ resolveWithObject: true });
  const raw = { width: info.width, height: info.height, channels: info.channels };
  const files = [];
  for (const edge of edgesFor(width, height)) {
    const fitted = sharp(data, { raw }).resize(edge, edge, { fit: 'inside', withoutEnlargement: true });
    files.push({ edge, bytes: await fitted.webp({ quality, alphaQuality: 100 }).toBuffer() });
  }
  return files;
}

/**
 * Makes the files of a layer when they are first asked for, all at once, so that a new layer costs no wait and a killed server
 * leaves nothing to catch up on. Several who ask at once wait for the same making.
 */
export function layerFiles(db: Database, storage: Storage) {
  const underWay = new Map<string, Promise<void>>();
  const waiting: (() => void)[] = [];
  let running = 0;

  async function turn<T>(make: () => Promise<T>): Promise<T> {
    if (running >= largestAtOnce) await new Promise<void>((resolve) => waiting.push(resolve));
    running++;
    try {
      return await make();
    } finally {
      running--;
      waiting.shift()?.();
    }
  }

  async function make(source: LayerSource): Promise<void> {
    const files = await turn(() => storage.withFile(originalKey(source.sha256), (path) => makeFiles(path, source)));
    await db.transaction().execute(async (transaction) => {
      await lockContent(transaction, source.sha256);
      for (const { edge, bytes } of files) await storage.put(layerKey(source.sha256, edge), bytes);
    });
  }

  return {
    async ensure(source: LayerSource, edge: Edge): Promise<void> {
      if (await storage.exists(layerKey(source.sha256, edge))) return;
      const begun = underWay.get(source.sha256);
      if (begun) return begun;
      const making = make(source).finally(() => underWay.delete(source.sha256));
      underWay.set(source.sha256, making);
      await making;
    },
  };
}
