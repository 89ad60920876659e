import { type Scene, SceneDocument } from '@oriel/shared/contracts/scenes';
import { layerIds, someScene, withLayer } from '@oriel/shared/contracts/testing/some-scene';
import { ApiFailure } from '../core/api-failure';
import { Autosave, type Keeping } from './autosave';
import { type Draft, sameBy } from './draft';

const failure = (status: number, code: string, detail?: Record<string, unknown>) =>
  new ApiFailure(status, { code, message: code, remedy: '', reference: '', detail });

/** A server of one scene that can be cut off, before or after it hears a request; it keeps what it was sent. */
class SmallServer implements Keeping<SceneDocument> {
  readonly same = sameBy(SceneDocument);
  scene: Scene = { id: layerIds[0], householdId: layerIds[1], document: someScene, revision: 7, savedAt: '2026-01-05T10:00:00Z', savedBy: 'Ilse', savedById: null };
  network: 'up' | 'down' | 'answers-lost' = 'up';
  broken = false;
  draft: Draft<SceneDocument> | null = null;
  saves: number[] = [];

  async save(revision: number, document: SceneDocument): Promise<Scene> {
    if (this.network === 'down') throw failure(0, 'unreachable');
    if (this.broken) throw failure(503, 'not-ready');
    this.saves.push(revision);
    if (revision !== this.scene.revision) {
      const { revision: newest, savedBy, savedAt } = this.scene;
      throw failure(409, 'revision-moved', { revision: newest, savedBy, savedAt });
    }
    this.scene = { ...this.scene, document: structuredClone(document), revision: revision + 1 };
    if (this.network === 'answers-lost') throw failure(0, 'unreachable');
    return this.scene;
  }

  async read(): Promise<Scene> {
    if (this.network === 'down') throw failure(0, 'unreachable');
    return this.scene;
  }

  keepDraft(draft: Draft<SceneDocument>): void {
    this.draft = draft;
  }

  dropDraft(): void {
    this.draft = null;
  }

  saveByAnother(): void {
    this.scene = { ...this.scene, revision: this.scene.revision + 1, savedBy: 'Maud', document: { ...this.scene.document, name: 'Hers' } };
  }
}

const at = (depthMm: number) => withLayer(someScene, layerIds[0], { depthMm });

describe('autosave', () => {
  let server: SmallServer;
  let autosave: Autosave<SceneDocument>;

  beforeEach(() => {
    vi.useFakeTimers();
    server = new SmallServer();
    autosave = new Autosave(server);
    autosave.begin(server.scene);
  });
  afterEach(() => {
    autosave.stop();
    vi.useRealTimers();
  });

  it('waits for a pause, then saves once, over the revision it was drawn on', async () => {
    for (const depth of [10, 20, 30]) {
      autosave.changed(at(depth));
      await vi.advanceTimersByTimeAsync(300);
    }
    expect(server.saves).toEqual([]);
    expect(server.draft?.document).toEqual(at(30));
    await vi.advanceTimersByTimeAsync(800);
    expect(server.saves).toEqual([7]);
    expect(server.scene.document).toEqual(at(30));
    expect(autosave.state()).toEqual({ kind: 'saved' });
    expect(autosave.saved().revision).toBe(8);
    expect(server.draft).toBeNull();
  });

  it('saves what was drawn while a save was on its way', async () => {
    const late = { ...server, save: server.save.bind(server) };
    let answer: () => void = () => undefined;
    const slow: Keeping<SceneDocument> = { ...late, read: () => server.read(), keepDraft: (d) => server.keepDraft(d), dropDraft: () => server.dropDraft(), save: async (r, d) => { await new Promise<void>((go) => (answer = go)); return server.save(r, d); } };
    autosave = new Autosave(slow);
    autosave.begin(server.scene);
    autosave.changed(at(10));
    await vi.advanceTimersByTimeAsync(800);
    autosave.changed(at(20));
    answer();
    await vi.advanceTimersByTimeAsync(1);
    expect(autosave.state().kind).toBe('waiting');
    await vi.advanceTimersByTimeAsync(800);
    answer();
    await vi.advanceTimersByTimeAsync(1);
    expect(server.scene.document).toEqual(at(20));
    expect(autosave.state()).toEqual({ kind: 'saved' });
  });

  it('keeps a draft without a network, tries later and later, and saves when it is back', async () => {
    server.network = 'down';
    autosave.changed(at(10));
    await vi.advanceTimersByTimeAsync(800);
    expect(autosave.state()).toEqual({ kind: 'offline' });
    expect(server.draft).toEqual({ revision: 7, document: at(10) });
    await vi.advanceTimersByTimeAsync(2000 + 4000 + 8000);
    autosave.changed(at(11));
    expect(autosave.state()).toEqual({ kind: 'offline' });
    server.network = 'up';
    await autosave.flush();
    expect(server.scene.document).toEqual(at(11));
    expect(autosave.state()).toEqual({ kind: 'saved' });
  });

  it('saves by itself once a failing server answers again', async () => {
    server.broken = true;
    autosave.changed(at(10));
    await vi.advanceTimersByTimeAsync(800);
    expect(autosave.state()).toMatchObject({ kind: 'failed', retrying: true });
    server.broken = false;
    await vi.advanceTimersByTimeAsync(2000);
    expect(autosave.state()).toEqual({ kind: 'saved' });
  });

  it('takes its own save for its own when only the answer was lost', async () => {
    server.network = 'answers-lost';
    autosave.changed(at(10));
    await vi.advanceTimersByTimeAsync(800);
    server.network = 'up';
    await vi.advanceTimersByTimeAsync(2000);
    expect(server.saves).toEqual([7, 7]);
    expect(autosave.state()).toEqual({ kind: 'saved' });
    expect(autosave.saved().revision).toBe(8);
  });

  it('goes on from its own save when more was drawn before the answer was found lost', async () => {
    server.network = 'answers-lost';
    autosave.changed(at(10));
    await vi.advanceTimersByTimeAsync(800);
    autosave.changed(at(20));
    server.network = 'up';
    await vi.advanceTimersByTimeAsync(5000);
    expect(server.scene.document).toEqual(at(20));
    expect(autosave.state()).toEqual({ kind: 'saved' });
  });

  it('never writes over another’s save unasked, and keeps mine meanwhile', async () => {
    server.saveByAnother();
    autosave.changed(at(10));
    await vi.advanceTimersByTimeAsync(800);
    expect(autosave.state()).toMatchObject({ kind: 'conflict', theirs: { revision: 8, savedBy: 'Maud' } });
    autosave.changed(at(20));
    await vi.advanceTimersByTimeAsync(60_000);
    await autosave.flush();
    expect(server.scene.document.name).toBe('Hers');
    expect(server.draft).toEqual({ revision: 7, document: at(20) });
    await autosave.saveOver();
    expect(server.scene.document).toEqual(at(20));
    expect(server.scene.revision).toBe(9);
    expect(autosave.state()).toEqual({ kind: 'saved' });
  });

  it('asks again when a third save comes between the decision and the saving', async () => {
    server.saveByAnother();
    autosave.changed(at(10));
    await vi.advanceTimersByTimeAsync(800);
    server.saveByAnother();
    await autosave.saveOver();
    expect(autosave.state()).toMatchObject({ kind: 'conflict', theirs: { revision: 9 } });
  });

  it('asks about a draft on an older revision and keeps it on that revision', () => {
    server.saveByAnother();
    autosave.begin(server.scene);
    autosave.contest({ revision: 7, document: at(10) }, server.scene);
    expect(autosave.state().kind).toBe('conflict');
    expect(server.draft?.revision).toBe(7);
  });
});
