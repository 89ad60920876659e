import type { LayerImage } from '@oriel/shared/contracts/scenes';
import type { DerivativeEdge } from '@oriel/shared/contracts/photos';
import type { Database } from '../database/database';
import { openPicture } from '../pictures/open-picture';
import { webpsOf, type Webp } from '../pictures/webps';
import { lockContent } from '../storage/content';
import { edgesFor, layerKey, originalKey } from '../storage/keys';
import type { Storage } from '../storage/storage';

/** What the files of a layer are made from. */
export interface LayerSource extends Pick<LayerImage, 'width' | 'height' | 'trim'> {
  readonly sha256: string;
}

const quality = 88;
const largestAtOnce = 2;

async function makeFiles(path: string, { width, height, trim }: LayerSource): Promise<readonly Webp[]> {
  const picture = await openPicture(path);
  return (await webpsOf(picture.extract({ left: trim.left, top: trim.top, width, height }), quality)).files;
}

/** Makes the files of layers, all of a layer at once. Several who ask at the same moment wait for the same making. */
export interface LayerFiles {
  /** Makes them now unless they are there: a killed server leaves nothing to catch up on. */
  ensure(source: LayerSource, edge: DerivativeEdge): Promise<void>;
  /** Begins to make them, so that whoever asks soon need not wait; what fails then fails again, and is told, when it is asked for. */
  prepare(source: LayerSource): void;
  /** When nothing is under way. */
  settled(): Promise<void>;
}

export function layerFiles(db: Database, storage: Storage): LayerFiles {
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
    const { sha256 } = source;
    const files = await turn(() => storage.withFile(originalKey(sha256), (path) => makeFiles(path, source)));
    await db.transaction().execute(async (transaction) => {
      await lockContent(transaction, sha256);
      const image = await transaction
        .selectFrom('layer_image')
        .select('id')
        .where('sha256', '=', sha256)
        .executeTakeFirst();
      // Purged meanwhile: what would be written now, nothing would ever remove.
      if (!image) return;
      for (const { edge, bytes } of files) await storage.put(layerKey(sha256, edge), bytes);
    });
  }

  async function ensure(source: LayerSource, edge: DerivativeEdge): Promise<void> {
    if (await storage.exists(layerKey(source.sha256, edge))) return;
    const begun = underWay.get(source.sha256);
    if (begun) return begun;
    const making = make(source).finally(() => underWay.delete(source.sha256));
    underWay.set(source.sha256, making);
    await making;
  }

  return {
    ensure,
    prepare(source) {
      const preparing = ensure(source, edgesFor(source.width, source.height)[0]).catch(() => undefined);
      const key = `preparing ${source.sha256}`;
      underWay.set(
        key,
        preparing.finally(() => underWay.delete(key)),
      );
    },
    async settled() {
      while (underWay.size > 0) await Promise.allSettled(underWay.values());
    },
  };
}
