import { SceneDocument } from '@oriel/shared/contracts/scenes';
import { someScene } from '@oriel/shared/contracts/testing/some-scene';
import { DraftShelf } from './draft-shelf';

/** The browser's locks as far as a shelf uses them: requested ones are held until released. */
function someLocks() {
  const held = new Map<string, Promise<unknown>>();
  return {
    request: (name: string, hold: () => Promise<unknown>) => {
      const holding = hold().then(() => held.delete(name));
      held.set(name, holding);
      return holding;
    },
    query: async () => ({ held: [...held.keys()].map((name) => ({ name })) }),
  } as unknown as LockManager;
}

describe('the shelf of drafts', () => {
  const draft = { revision: 7, document: someScene };
  const shelf = (locks: LockManager, account = 'ilse') => new DraftShelf(SceneDocument, account, 'scene', localStorage, locks);
  beforeEach(() => localStorage.clear());

  it('gives what a closed page left behind to the next, once', async () => {
    const locks = someLocks();
    const closed = shelf(locks);
    closed.keep(draft);
    closed.close();
    await Promise.resolve();
    const next = shelf(locks);
    expect(await next.takeLeftBehind()).toEqual(draft);
    expect(await shelf(locks).takeLeftBehind()).toBeNull();
    next.drop();
    expect(localStorage).toHaveLength(0);
  });

  it('leaves an open page’s draft alone', async () => {
    const locks = someLocks();
    shelf(locks).keep(draft);
    expect(await shelf(locks).takeLeftBehind()).toBeNull();
  });

  it('gives nobody another account’s draft, and nothing that is not a draft', async () => {
    const locks = someLocks();
    const hers = shelf(locks, 'maud');
    hers.keep(draft);
    hers.close();
    localStorage.setItem('oriel.draft.ilse.scene.old', '{"revision":');
    expect(await shelf(locks).takeLeftBehind()).toBeNull();
  });
});
