import * as routes from '@oriel/shared/contracts/photos';
import type { Feature } from '../http/mount';
import type { Parts } from '../parts';
import { receiveFile, withReceivedFile } from '../pictures/receive-file';
import { derivativeKey, edgeKept, originalKey } from '../storage/keys';
import { sendStored } from '../storage/send-stored';
import { toPhoto } from './photo-queries';
import { photoService } from './photo-service';

export const photoRoutes =
  ({ connection, storage, jobs }: Parts): Feature =>
  (mount) => {
    const photos = photoService(connection.db, storage, jobs);
    mount(
      routes.uploadPhoto,
      ({ request, householdId, accountId }) =>
        withReceivedFile(request, (file) => photos.receive(file, { householdId, accountId })),
      receiveFile(storage.incomingDir),
    );
    mount(routes.listPhotos, ({ householdId, query: { after, limit, search = '', bin } }) =>
      photos.list({ householdId, bin, search }, after, limit),
    );
    mount(routes.readPhotos, async ({ householdId, body }) => ({
      photos: await photos.readSome(householdId, body.photoIds),
    }));
    mount(routes.binPhotos, async ({ householdId, body }) => ({
      photos: await photos.setBinned(householdId, body.photoIds, true),
    }));
    mount(routes.restorePhotos, async ({ householdId, body }) => ({
      photos: await photos.setBinned(householdId, body.photoIds, false),
    }));
    mount(routes.readPhoto, async ({ householdId, params }) => ({
      photo: toPhoto(await photos.read(householdId, params.photoId)),
    }));
    mount(routes.photoDerivative, async ({ householdId, params, request, response }) => {
      const { sha256, width, height } = await photos.read(householdId, params.photoId);
      const edge = edgeKept(width, height, params.edge);
      await sendStored(storage, request, response, {
        key: derivativeKey(sha256, edge),
        mime: 'image/webp',
        tag: `${sha256}-${edge}`,
      });
      return {};
    });
    mount(routes.photoOriginal, async ({ householdId, params, request, response }) => {
      const { sha256, mime, name } = await photos.read(householdId, params.photoId);
      await sendStored(storage, request, response, { key: originalKey(sha256), mime, tag: sha256, saveAs: name });
      return {};
    });
  };
