import * as z from 'zod';
import { Moment } from './fields';
import { tuners } from './role';
import { anyone, defineRoute, members } from './route';
import { WallParams, WallReply } from './walls';

/** What codes are made of: figures and capitals that are not mistaken for one another (no 0, O, 1, I). */
export const pairingSigns = '23456789ABCDEFGHJKLMNPQRSTUVWXYZ';
/** Six of them, however they are typed. */
export const PairingCode = z
  .string()
  .transform((typed) => typed.replace(/[\s-]/g, '').toUpperCase())
  .pipe(
    z
      .string()
      .regex(new RegExp(`^[${pairingSigns}]{6}$`), 'The code has six letters and figures, as the screen shows them'),
  );
export const pairingMinutes = 10;

/** A screen asks for a code; it keeps `claim`, a secret, to fetch its credential when someone has entered the code. */
export const askPairing = defineRoute({
  method: 'POST',
  path: '/api/pairings',
  access: anyone,
  reply: z.object({ code: z.string(), claim: z.string(), expiresAt: Moment }),
});
/** Asked every two seconds or so. `paired` comes once, with the wall's own cookie; `expired` means ask for another code. */
export const claimPairing = defineRoute({
  method: 'POST',
  path: '/api/pairings/claims',
  access: anyone,
  body: z.object({ claim: z.string().min(40).max(60) }),
  reply: z.object({ state: z.enum(['waiting', 'paired', 'expired']) }),
});
/**
 * 422 `code-unknown` when no screen shows this code. The screen fetches its credential within seconds; `pairedAt` of the wall then says so,
 * and whatever screen the wall had before is no longer let in.
 */
export const pairWall = defineRoute({
  method: 'POST',
  path: '/api/walls/:wallId/pairing',
  access: members('wall', tuners),
  params: WallParams,
  body: z.object({ code: PairingCode }),
  reply: WallReply,
});
/** Revokes the screen's credential at once. */
export const unpairWall = defineRoute({
  method: 'DELETE',
  path: '/api/walls/:wallId/pairing',
  access: members('wall', tuners),
  params: WallParams,
  reply: WallReply,
});

/** Whether whoever asks is some wall's own screen. Answered to anyone without an error, so that a new screen may ask before it shows a code. */
export const screenPairing = defineRoute({
  method: 'GET',
  path: '/api/wall/pairing',
  access: anyone,
  reply: z.object({ paired: z.boolean() }),
});
