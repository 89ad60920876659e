import * as routes from '@oriel/shared/contracts/scenes';
import { notFound } from '../http/failure';
import type { Feature } from '../http/mount';
import type { Parts } from '../parts';
import { receiveFile, withReceivedFile } from '../pictures/receive-file';
import { findImage } from './image-queries';
import { sceneService } from './scene-service';
import { sendLayerImage } from './send-layer-image';

export const sceneRoutes =
  ({ connection: { db }, storage, layerFiles }: Parts): Feature =>
  (mount) => {
    const scenes = sceneService(db, storage, layerFiles);

    mount(routes.listScenes, async ({ householdId, query }) => ({ scenes: await scenes.list(householdId, query.bin) }));
    mount(routes.createScene, async ({ body, householdId, accountId }) => ({
      scene: await scenes.create(body.name, body.photoIds, { householdId, accountId }),
    }));
    mount(routes.readScene, async ({ params }) => ({ scene: await scenes.read(params.sceneId) }));
    mount(routes.saveScene, async ({ params, body, householdId, accountId }) => ({
      scene: await scenes.save(params.sceneId, body.revision, body.document, { householdId, accountId }),
    }));
    mount(routes.duplicateScene, async ({ params, body, householdId, accountId }) => ({
      scene: await scenes.duplicate(params.sceneId, body.document, { householdId, accountId }),
    }));
    mount(routes.binScene, async ({ params }) => {
      await scenes.bin(params.sceneId);
      return {};
    });
    mount(routes.restoreScene, async ({ params }) => ({ scene: await scenes.restore(params.sceneId) }));

    mount(
      routes.uploadLayerImage,
      ({ request, householdId }) => withReceivedFile(request, (file) => scenes.imageFromFile(householdId, file)),
      receiveFile(storage.incomingDir),
    );
    mount(routes.layerImageFromPhoto, ({ body, householdId }) => scenes.imageFromPhoto(householdId, body.photoId));
    mount(routes.layerImageFile, async ({ params, request, response }) => {
      const image = await findImage(db, params.imageId);
      if (!image) throw notFound();
      await sendLayerImage({ storage, layerFiles }, request, response, image, params.edge);
      return {};
    });
  };
