import * as contract from '@oriel/shared/contracts/wall-pairing';
import type { Feature } from '../http/mount';
import type { Parts } from '../parts';
import { pairings } from './pairing';
import { wallService } from './wall-service';

/** How a screen comes by its credential, and loses it. */
export const pairingRoutes =
  ({ connection: { db }, limits, wallCookie, xsrf }: Parts): Feature =>
  (mount) => {
    const walls = wallService(db);
    const pairing = pairings(db);

    mount(contract.askPairing, () => pairing.ask(), limits.codesAsked);
    mount(
      contract.claimPairing,
      async ({ body, accountId, response }) => {
        const claimed = await pairing.claim(body.claim);
        if (claimed.state === 'paired') {
          wallCookie.give(response, claimed.credential);
          if (!accountId) xsrf.renew(response, claimed.credential);
        }
        return { state: claimed.state };
      },
      limits.claims,
    );
    mount(
      contract.pairWall,
      async ({ params, body }) => {
        await pairing.pair(params.wallId, body.code);
        return { wall: await walls.read(params.wallId) };
      },
      limits.codesTried,
    );
    mount(contract.unpairWall, async ({ params }) => {
      await pairing.unpair(params.wallId);
      return { wall: await walls.read(params.wallId) };
    });
  };
