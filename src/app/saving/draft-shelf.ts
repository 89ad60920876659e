import * as z from 'zod';
import type { Draft } from './draft';

const prefix = 'oriel.draft';

/**
 * Drafts in this browser, one for each page that draws, so that two pages never overwrite each other's. A page holds a
 * lock while it is open: a draft without its lock was left behind.
 */
export class DraftShelf<T> {
  private readonly kept: z.ZodType<{ revision: number; document: T; keptAt: number }>;
  private readonly page: string;
  private readonly start: string;
  private release: () => void = () => undefined;

  constructor(document: z.ZodType<T>, accountId: string, documentId: string, private readonly storage: Storage, private readonly locks: LockManager | undefined) {
    this.kept = z.object({ revision: z.number().int(), document, keptAt: z.number() });
    this.start = `${prefix}.${accountId}.${documentId}.`;
    this.page = this.start + Math.random().toString(36).slice(2);
    void locks?.request(this.page, () => new Promise<void>((resolve) => (this.release = resolve)));
  }

  /** Returns whether the draft is safe; a full or forbidden storage cannot hold it. */
  keep(draft: Draft<T>): boolean {
    try {
      this.storage.setItem(this.page, JSON.stringify({ ...draft, keptAt: Date.now() }));
      return true;
    } catch {
      return false;
    }
  }

  drop(): void {
    this.storage.removeItem(this.page);
  }

  /** The newest draft that a closed page left behind; null where there is none. It becomes this page's own. */
  async takeLeftBehind(): Promise<Draft<T> | null> {
    const open = new Set((await this.locks?.query())?.held?.map((lock) => lock.name) ?? []);
    const [newest] = Object.keys(this.storage)
      .filter((key) => key.startsWith(this.start) && key !== this.page && !open.has(key))
      .flatMap((key) => {
        const left = this.kept.safeParse(parsed(this.storage.getItem(key)));
        return left.success ? [{ key, ...left.data }] : [];
      })
      .sort((a, b) => b.keptAt - a.keptAt);
    if (!newest) return null;
    const draft = { revision: newest.revision, document: newest.document };
    if (this.keep(draft)) this.storage.removeItem(newest.key);
    return draft;
  }

  close(): void {
    this.release();
  }
}

function parsed(text: string | null): unknown {
  try {
    return JSON.parse(text ?? 'null');
  } catch {
    return null;
  }
}
