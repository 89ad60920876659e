import { screenPairing } from '@oriel/shared/contracts/wall-pairing';
import * as contract from '@oriel/shared/contracts/wall-screen';
import { wallOfScreen } from '../http/access';
import { notFound } from '../http/failure';
import type { Feature } from '../http/mount';
import type { Parts } from '../parts';
import { sendLayerImage } from '../scenes/send-layer-image';
import { keepReports } from './reports';
import { wallEvents } from './wall-events';
import { wallScreen } from './wall-screen';

/** What a screen asks, by its credential; and first of all whether it has one that holds. */
export const screenRoutes =
  (parts: Parts): Feature =>
  (mount) => {
    const { connection, wallCookie } = parts;
    const screen = wallScreen(connection.db);
    const openEvents = wallEvents(parts);

    mount(screenPairing, async ({ request }) => {
      const wall = await wallOfScreen(connection.db, wallCookie.read(request));
      return { paired: wall !== undefined };
    });
    mount(contract.wallShows, async ({ wallId, request, response }) => {
      await screen.heard(wallId);
      wallCookie.give(response, wallCookie.read(request) ?? '');
      return screen.shows(wallId);
    });
    mount(contract.wallEvents, ({ wallId, request, response }) => {
      openEvents(wallId, request, response);
      return {};
    });
    mount(contract.wallImageFile, async ({ wallId, params, request, response }) => {
      const image = await screen.image(wallId, params.imageId);
      if (!image) throw notFound();
      await sendLayerImage(parts, request, response, image, params.edge);
      return {};
    });
    mount(contract.reportFromWall, async ({ wallId, body, request, response }) => {
      await keepReports(connection.db, wallId, body.reports);
      wallCookie.give(response, wallCookie.read(request) ?? '');
      return {};
    });
  };
