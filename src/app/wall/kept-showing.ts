import { Injectable } from '@angular/core';
import { wallShows } from '@oriel/shared/contracts/wall-screen';
import type * as z from 'zod';

/** What the server says this wall shows. */
export type Showing = z.output<typeof wallShows.reply>;

const storageKey = 'oriel.wall';
/** Where the service worker (src/service-worker/wall-worker.js) keeps the pictures. */
const pictureCache = 'oriel-wall-pictures';

/**
 * What a screen keeps of its wall, so that it starts without a network: the last answer, and the pictures it was drawn with. Nothing of
 * any person's account is kept, and unpairing clears it.
 */
@Injectable({ providedIn: 'root' })
export class KeptShowing {
  /** What was kept last; null where nothing is, or an older version wrote what is not understood. */
  read(): Showing | null {
    try {
      const kept = wallShows.reply.safeParse(JSON.parse(localStorage.getItem(storageKey) ?? 'null'));
      return kept.success ? kept.data : null;
    } catch {
      return null;
    }
  }

  keep(showing: Showing): void {
    const text = JSON.stringify(showing);
    // Every write wears a small computer's memory card.
    if (localStorage.getItem(storageKey) !== text) localStorage.setItem(storageKey, text);
  }

  /** Keeps these pictures, fetching what is not there yet, and no others. What cannot be fetched now is kept when it is next drawn. */
  async keepPictures(addresses: ReadonlySet<string>): Promise<void> {
    if (!('caches' in globalThis)) return;
    const cache = await caches.open(pictureCache);
    const held = new Map((await cache.keys()).map((request) => [new URL(request.url).pathname, request]));
    await Promise.allSettled([...addresses].filter((address) => !held.has(address)).map((address) => cache.add(address)));
    await Promise.all([...held].filter(([path]) => !addresses.has(path)).map(([, request]) => cache.delete(request)));
  }

  async forget(): Promise<void> {
    localStorage.removeItem(storageKey);
    if ('caches' in globalThis) await caches.delete(pictureCache);
  }
}
