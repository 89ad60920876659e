import { DOCUMENT, Injectable, inject } from '@angular/core';
import { SwUpdate } from '@angular/service-worker';
import { untilNight, waitToReload } from './reloading';

const reloadedKey = 'oriel.wall.reloaded';
const lookForUpdateMs = 3_600_000;
const readyMs = 5000;
/** Time for the error to be reported. */
const beforeReloadMs = 3000;
const mostLetters = 500;

/**
 * Keeps a page well that nobody looks after for months: after an error of its own, when a new version is there, and each night, it loads
 * itself anew, provided that it can come back.
 */
@Injectable()
export class SelfCare {
  private readonly window = inject(DOCUMENT).defaultView!;
  private readonly updates = inject(SwUpdate, { optional: true });
  private nightly: ReturnType<typeof setTimeout> | undefined;
  private pending: ReturnType<typeof setTimeout> | undefined;
  private error: string | null = null;

  /** The last error of the page, in its own words. */
  get lastError(): string | null {
    return this.error;
  }

  /** Watches over the page until the returned function is called. */
  watch(): () => void {
    const over = new AbortController();
    const { signal } = over;
    this.window.addEventListener('error', ({ message }) => this.failed(message), { signal });
    this.window.addEventListener('unhandledrejection', ({ reason }) => this.failed(String(reason)), { signal });
    this.waitForNight();
    const updates = this.watchUpdates();
    return () => {
      over.abort();
      clearTimeout(this.nightly);
      clearTimeout(this.pending);
      updates();
    };
  }

  private failed(words: string): void {
    this.error = words.slice(0, mostLetters);
    this.reloadIn(beforeReloadMs);
  }

  private watchUpdates(): () => void {
    const { updates } = this;
    if (!updates?.isEnabled) return () => undefined;
    const ready = updates.versionUpdates.subscribe(({ type }) => {
      if (type === 'VERSION_READY') this.reloadIn(0);
    });
    const broken = updates.unrecoverable.subscribe(({ reason }) => this.failed(reason));
    // Without a network there is no newer version to be had.
    const timer = setInterval(() => void updates.checkForUpdate().catch(() => false), lookForUpdateMs);
    return () => {
      ready.unsubscribe();
      broken.unsubscribe();
      clearInterval(timer);
    };
  }

  private waitForNight(): void {
    this.nightly = setTimeout(() => {
      this.waitForNight();
      void this.reachesServer().then((reached) => reached && this.reloadIn(0));
    }, untilNight(new Date(), Math.random()));
  }

  private reloadIn(leastMs: number): void {
    const last = Number(localStorage.getItem(reloadedKey)) || null;
    clearTimeout(this.pending);
    this.pending = setTimeout(() => void this.reload(), Math.max(leastMs, waitToReload(last, Date.now())));
  }

  private async reload(): Promise<void> {
    if (!(await this.comesBack())) return;
    localStorage.setItem(reloadedKey, String(Date.now()));
    this.window.location.reload();
  }

  /** With the service worker at hand the page comes back even without a network. */
  private async comesBack(): Promise<boolean> {
    return Boolean(this.window.navigator.serviceWorker?.controller) || this.reachesServer();
  }

  private async reachesServer(): Promise<boolean> {
    return fetch('/ready', { signal: AbortSignal.timeout(readyMs) }).then(({ ok }) => ok, () => false);
  }
}
