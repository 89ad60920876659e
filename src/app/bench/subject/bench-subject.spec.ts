import { TestBed } from '@angular/core/testing';
import { newWall } from '@oriel/shared/contracts/new-wall';
import { type Wall, listWalls, readWall, saveWall } from '@oriel/shared/contracts/walls';
import type { Route } from '@oriel/shared/contracts/route';
import { Api } from '../../core/api';
import { ApiFailure } from '../../core/api-failure';
import { Session } from '../../core/session';
import { ThisScreen } from '../../screen/this-screen';
import { usualSetUp } from '../../screen/screen-set-up';
import { BenchSubject } from './bench-subject';

const wall: Wall = {
  id: 'w',
  householdId: 'h',
  setUp: newWall('Hall'),
  revision: 3,
  savedAt: '',
  savedBy: 'Ilse',
  pairedAt: null,
  heardAt: null,
  report: null,
};

/** A server of one wall. */
class SmallServer {
  wall = wall;
  call(route: Route, parts: { body?: { revision: number; setUp: Wall['setUp'] } }): Promise<unknown> {
    if (route === listWalls) return Promise.resolve({ walls: [this.wall] });
    if (route === readWall) return Promise.resolve({ wall: this.wall });
    if (route !== saveWall || !parts.body) throw new Error('not asked for');
    if (parts.body.revision !== this.wall.revision)
      return Promise.reject(new ApiFailure(409, { code: 'revision-moved', message: '', remedy: '', reference: '' }));
    this.wall = { ...this.wall, setUp: parts.body.setUp, revision: this.wall.revision + 1 };
    return Promise.resolve({ wall: this.wall });
  }
}

describe('what stands on the bench', () => {
  let server: SmallServer;
  let bench: BenchSubject;
  const later = (ms: number) => bench.apply('w', (tuning) => ({ ...tuning, displayDelayMs: ms }));

  beforeEach(async () => {
    localStorage.clear();
    server = new SmallServer();
    const screen = { setUp: () => usualSetUp({ screen: { width: 1920, height: 1080 }, devicePixelRatio: 1 }) };
    TestBed.configureTestingModule({
      providers: [
        BenchSubject,
        { provide: Api, useValue: server },
        { provide: Session, useValue: { householdId: () => 'h' } },
        { provide: ThisScreen, useValue: screen },
      ],
    });
    bench = TestBed.inject(BenchSubject);
    await bench.load();
  });

  it('is this screen until a wall is chosen, and then that wall with its own camera', () => {
    expect(bench.subject().name).toBe('This screen');
    bench.choose('w');
    expect(bench.subject().name).toBe('Hall');
    expect(bench.subject().tracking.camera.position.y).toBe(wall.setUp.camera.position.y);
    expect(bench.subject().tracking.viewer.eyeDistanceMm).toBe(63);
    bench.choose(null);
    expect(bench.subject().wallId).toBeNull();
  });

  it('changes the tuning and nothing else, but for keeping with the wall how it followed before', async () => {
    const { tuning } = wall.setUp;
    const { filter, displayDelayMs, longestHorizonMs } = tuning;
    expect(await later(80)).toEqual({ kind: 'saved', before: tuning, after: { ...tuning, displayDelayMs: 80 } });
    const followingBefore = { filter, displayDelayMs, longestHorizonMs };
    expect(server.wall.setUp).toEqual({ ...wall.setUp, tuning: { ...tuning, displayDelayMs: 80 }, followingBefore });
  });

  it('goes back on a later visit too', async () => {
    await later(80);
    await bench.load();
    await bench.goBack('w');
    expect(server.wall.setUp).toEqual(wall.setUp);
  });

  it('writes nothing over another’s save, tells whose it is, and the next press changes the newest', async () => {
    server.wall = { ...server.wall, revision: 4, savedBy: 'Maud', setUp: { ...wall.setUp, name: 'Her hall' } };
    expect(await later(80)).toEqual({ kind: 'moved', by: 'Maud' });
    expect(server.wall.setUp.tuning.displayDelayMs).toBe(0);
    expect(await later(80)).toMatchObject({ kind: 'saved' });
    expect(server.wall.setUp.name).toBe('Her hall');
    expect(server.wall.setUp.tuning.displayDelayMs).toBe(80);
  });
});
