import { randomInt } from 'node:crypto';
import { sql } from 'kysely';
import { pairingMinutes, pairingSigns } from '@oriel/shared/contracts/wall-pairing';
import type { Database } from '../database/database';
import { hashOfToken, makeToken } from '../http/secret-token';
import { codeUnknown } from './refusals';
import { announceWall } from './wall-changes';

/** What is left to the screen to claim, once its code was entered at the last moment, minutes. */
const claimMinutes = 2;
const codeLength = 6;
/** Two open codes alike are one chance in a thousand million. */
const tries = 5;

const inMinutes = (minutes: number) => new Date(Date.now() + minutes * 60_000);
const makeCode = () => Array.from({ length: codeLength }, () => pairingSigns[randomInt(pairingSigns.length)]).join('');

export type Claimed =
  { readonly state: 'waiting' | 'expired' } | { readonly state: 'paired'; readonly credential: string };

export const forgetExpiredPairings = async (db: Database): Promise<void> => {
  await db.deleteFrom('pairing').where('expires_at', '<', new Date()).execute();
};

/**
 * How a screen comes by a credential of its own: it shows a code, somebody who may tune the wall enters it there, and the screen, which
 * alone knows the claim behind the code, fetches the credential. Claim and credential are kept as hashes only.
 */
export function pairings(db: Database) {
  return {
    async ask(): Promise<{ code: string; claim: string; expiresAt: string }> {
      await forgetExpiredPairings(db);
      const { token: claim, hash } = makeToken();
      const expires = inMinutes(pairingMinutes);
      for (let i = 0; i < tries; i++) {
        const row = await db
          .insertInto('pairing')
          .values({ code: makeCode(), claim_hash: hash, expires_at: expires })
          .onConflict((conflict) => conflict.column('code').doNothing())
          .returning('code')
          .executeTakeFirst();
        if (row) return { code: row.code, claim, expiresAt: expires.toISOString() };
      }
      throw new Error('found no free pairing code');
    },

    /** Hands out the credential once; the wall's former screen is no longer let in from then on. */
    async claim(claim: string): Promise<Claimed> {
      return db.transaction().execute(async (transaction): Promise<Claimed> => {
        const open = await transaction
          .selectFrom('pairing')
          .select('wall_id')
          .where('claim_hash', '=', hashOfToken(claim))
          .where('expires_at', '>', new Date())
          .forUpdate()
          .executeTakeFirst();
        if (!open) return { state: 'expired' };
        if (!open.wall_id) return { state: 'waiting' };

        await transaction.deleteFrom('pairing').where('claim_hash', '=', hashOfToken(claim)).execute();
        const { token: credential, hash } = makeToken();
        await transaction
          .updateTable('wall')
          .set({ credential_hash: hash, paired_at: new Date(), heard_at: new Date(), report: null })
          .where('id', '=', open.wall_id)
          .execute();
        await announceWall(transaction, open.wall_id);
        return { state: 'paired', credential };
      });
    },

    /** Of several codes entered for one wall before any was claimed, the last counts. @throws code-unknown (422) */
    async pair(wallId: string, code: string): Promise<void> {
      await db.transaction().execute(async (transaction) => {
        const paired = await transaction
          .updateTable('pairing')
          .set({ wall_id: wallId, expires_at: sql<Date>`greatest(expires_at, ${inMinutes(claimMinutes)})` })
          .where('code', '=', code)
          .where('expires_at', '>', new Date())
          .where((on) => on.or([on('wall_id', 'is', null), on('wall_id', '=', wallId)]))
          .returning('code')
          .executeTakeFirst();
        if (!paired) throw codeUnknown();
        await transaction.deleteFrom('pairing').where('wall_id', '=', wallId).where('code', '!=', code).execute();
      });
    },

    /** Revokes the credential, and what was entered but not claimed yet. */
    async unpair(wallId: string): Promise<void> {
      await db.transaction().execute(async (transaction) => {
        await transaction.deleteFrom('pairing').where('wall_id', '=', wallId).execute();
        await transaction
          .updateTable('wall')
          .set({ credential_hash: null, paired_at: null, heard_at: null, report: null })
          .where('id', '=', wallId)
          .execute();
        await announceWall(transaction, wallId);
      });
    },
  };
}
