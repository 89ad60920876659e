import fc from 'fast-check';
import { beforeEach, describe, expect, it } from 'vitest';
import { NO_DRIFT } from './drift';
import { createFollower, type Follower } from './follower';
import { CALM_FOLLOWING, type FollowerSettings } from './follower-settings';

const HOME = { x: 0, y: 0, z: 1000 };
const SETTINGS: FollowerSettings = { homeEye: HOME, ...CALM_FOLLOWING, drift: NO_DRIFT };
type Eye = { x: number; y: number; z: number };

/** Sensor noise as measured on still faces at 1 m: about half a millimetre across and 5 mm along. A fixed sequence. */
function noise(): () => number {
  let seed = 7;
  const uniform = () => (seed = (seed * 1103515245 + 12345) & 0x7fffffff) / 0x7fffffff;
  return () => Math.sqrt(-2 * Math.log(uniform() + 1e-9)) * Math.cos(2 * Math.PI * uniform());
}

/** Plays a path through a follower: samples at 30 a second arriving 40 ms late, pictures at 60 a second lit 20 ms ahead. */
function play(
  follower: Follower,
  path: (tMs: number) => Eye,
  untilMs: number,
  across = 0,
  along = 0,
): { tMs: number; eye: Eye }[] {
  const normal = noise();
  const shown: { tMs: number; eye: Eye }[] = [];
  let next = 0;
  for (let frame = 0; frame * (1000 / 60) < untilMs; frame++) {
    const now = (frame * 1000) / 60;
    for (; next + 40 <= now; next += 1000 / 30) {
      const { x, y, z } = path(next);
      follower.sample({ x: x + across * normal(), y: y + across * normal(), z: z + along * normal() }, next);
    }
    const eye = { x: 0, y: 0, z: 0 };
    follower.at(now + 20, eye);
    shown.push({ tMs: now + 20, eye });
  }
  return shown;
}

const rms = (figures: number[]) => Math.sqrt(figures.reduce((sum, f) => sum + f * f, 0) / figures.length);

describe('following', () => {
  let follower: Follower;
  beforeEach(() => (follower = createFollower(SETTINGS)));

  it('shows a still viewer where they stand, exactly, once eased in', () => {
    const last = play(follower, () => ({ x: 120, y: -40, z: 800 }), 3000).at(-1)!.eye;
    expect(last.x).toBeCloseTo(120, 3);
    expect(last.y).toBeCloseTo(-40, 3);
    expect(last.z).toBeCloseTo(800, 3);
  });

  it('holds a still viewer stiller than the camera does: x to 0.2 mm of 0.5, z to 2.5 mm of 5', () => {
    const settled = play(follower, () => ({ x: 100, y: 0, z: 1000 }), 6000, 0.5, 5).filter(({ tMs }) => tMs > 1500);
    expect(rms(settled.map(({ eye }) => eye.x - 100))).toBeLessThan(0.2);
    expect(rms(settled.map(({ eye }) => eye.z - 1000))).toBeLessThan(2.5);
    const steps = settled.slice(1).map(({ eye }, i) => eye.x - settled[i].eye.x);
    expect(rms(steps)).toBeLessThan(0.06);
  });

  it('shows someone walking by at 1 m/s where they are when the picture is lit, within 2 mm rms of the 60 mm walked meanwhile', () => {
    const path = (t: number) => ({ x: -1500 + t, y: 0, z: 1500 });
    const settled = play(follower, path, 3000, 0.5, 5).filter(({ tMs }) => tMs > 1500);
    expect(rms(settled.map(({ eye, tMs }) => eye.x - path(tMs).x))).toBeLessThan(2);
  });

  it('follows a sway of 150 mm every two seconds at least twice as closely as the last sample would', () => {
    const path = (t: number) => ({ x: 150 * Math.sin((Math.PI * t) / 1000), y: 0, z: 1000 });
    const settled = play(follower, path, 5000, 0.5, 5).filter(({ tMs }) => tMs > 1500);
    const late = rms(settled.map(({ tMs }) => path(tMs - 75).x - path(tMs).x));
    expect(rms(settled.map(({ eye, tMs }) => eye.x - path(tMs).x))).toBeLessThan(late / 2);
  });

  it('goes in the direction the viewer goes: left, right, up, down, near and far', () => {
    for (const [axis, way] of [
      ['x', -1],
      ['x', 1],
      ['y', 1],
      ['y', -1],
      ['z', -1],
      ['z', 1],
    ] as const) {
      const one = createFollower(SETTINGS);
      const shown = play(one, (t) => ({ ...HOME, [axis]: HOME[axis] + (way * 100 * t) / 1000 }), 2500);
      expect(way * (shown.at(-1)!.eye[axis] - shown[60].eye[axis])).toBeGreaterThan(100);
    }
  });
});

describe('presence', () => {
  it('comes calmly to a viewer who appears: under way within 600 ms, there within 900, never faster than the limit', () => {
    const follower = createFollower(SETTINGS);
    const eye = { ...HOME };
    follower.at(0, eye);
    expect(follower.presence).toBe('nobody');
    const way: number[] = [];
    for (let t = 16; t <= 1200; t += 16) {
      if (t % 32 === 0) follower.sample({ x: 400, y: 0, z: 1000 }, t - 16);
      follower.at(t, eye);
      way.push(eye.x);
    }
    expect(follower.presence).toBe('following');
    expect(way[Math.floor(100 / 16)]).toBeLessThan(150);
    expect(way[Math.floor(616 / 16)]).toBeGreaterThan(400 * 0.97);
    expect(way[Math.floor(900 / 16)]).toBeGreaterThan(400 * 0.995);
    expect(Math.max(...way)).toBeLessThan(401);
  });

  it('waits where it is after a loss, then goes slowly home and drifts about it', () => {
    const follower = createFollower({ ...SETTINGS, drift: CALM_FOLLOWING.drift });
    const eye = { ...HOME };
    let t = 0;
    for (; t < 3000; t += 16) {
      follower.sample({ x: 300, y: 50, z: 900 }, t);
      follower.at(t + 16, eye);
    }
    follower.lost(t);
    expect(follower.presence).toBe('holding');
    const lostAt = t;
    for (; t < lostAt + 380; t += 16) follower.at(t + 16, eye);
    expect(eye.x).toBeCloseTo(300, 0);
    let last = { ...eye };
    for (; t < lostAt + 15_000; t += 16) {
      follower.lost(t);
      follower.at(t + 16, eye);
      expect(Math.hypot(eye.x - last.x, eye.y - last.y, eye.z - last.z) / 0.016).toBeLessThan(400);
      last = { ...eye };
    }
    expect(follower.presence).toBe('nobody');
    expect(Math.abs(eye.x)).toBeLessThan(61);
    expect(Math.abs(eye.z - 1000)).toBeLessThan(41);
  });

  it('stops someone lost in mid-stride without turning back', () => {
    const follower = createFollower(SETTINGS);
    const shown = play(follower, (t) => ({ x: -1000 + t / 2, y: 0, z: 1000 }), 2000);
    let last = shown.at(-1)!.eye.x;
    follower.lost(2000);
    for (let t = 2040; t < 2360; t += 16) {
      const eye = { ...HOME };
      follower.at(t, eye);
      expect(eye.x).toBeGreaterThanOrEqual(last - 1e-9);
      last = eye.x;
    }
  });

  it('counts silence as a loss', () => {
    const follower = createFollower(SETTINGS);
    const eye = { ...HOME };
    follower.at(0, eye);
    follower.sample({ x: 300, y: 0, z: 1000 }, 0);
    follower.at(SETTINGS.silenceMs - 1, eye);
    expect(follower.presence).toBe('following');
    follower.at(SETTINGS.silenceMs + 1, eye);
    expect(follower.presence).toBe('holding');
    follower.at(SETTINGS.silenceMs + SETTINGS.holdMs + 1, eye);
    expect(follower.presence).toBe('nobody');
    follower.at(30_000, eye);
    expect(eye.x).toBeCloseTo(0, 3);
  });

  it('goes to another viewer as calmly as to one who appears, without shooting past', () => {
    const follower = createFollower(SETTINGS);
    const shown = play(follower, (t) => ({ x: t < 2000 ? -400 : 400, y: 0, z: 1200 }), 4000);
    const xs = shown.map(({ eye }) => eye.x);
    expect(Math.max(...xs)).toBeLessThan(410);
    expect(xs.at(-1)).toBeCloseTo(400, 1);
    const speeds = xs.slice(1).map((x, i) => Math.abs(x - xs[i]) * 60);
    expect(Math.max(...speeds)).toBeLessThanOrEqual(SETTINGS.greatestMmPerS + 1e-6);
  });
});

/** A run as the bench records it: what came, and when pictures were drawn. */
const anyRun = fc.array(
  fc.record({
    gap: fc.integer({ min: 5, max: 120 }),
    eye: fc.option(
      fc.record({
        x: fc.integer({ min: -800, max: 800 }),
        y: fc.integer({ min: -300, max: 300 }),
        z: fc.integer({ min: 200, max: 3000 }),
      }),
      { freq: 4 },
    ),
  }),
  { minLength: 5, maxLength: 60 },
);
type Run = { gap: number; eye: Eye | null }[];

function replay(run: Run, settings: FollowerSettings, frameMs: number): { tMs: number; eye: Eye }[] {
  const follower = createFollower(settings);
  const shown: { tMs: number; eye: Eye }[] = [];
  let tMs = 0;
  let frame = 0;
  for (const { gap, eye } of run) {
    // Events fall on multiples of 20 ms, so that every frame rate tried draws at their moments.
    const until = tMs + 20 * Math.ceil(gap / 20);
    for (; frame <= until; frame += frameMs) {
      const out = { ...HOME };
      follower.at(frame, out);
      shown.push({ tMs: frame, eye: out });
    }
    tMs = until;
    if (eye) follower.sample(eye, tMs);
    else follower.lost(tMs);
  }
  return shown;
}

describe('a recorded run', () => {
  it('replays to the same eyes', () => {
    fc.assert(
      fc.property(anyRun, (run) => {
        expect(replay(run, SETTINGS, 10)).toEqual(replay(run, SETTINGS, 10));
      }),
    );
  });

  it('does not depend on how often pictures are drawn', () => {
    const free = { ...SETTINGS, greatestMmPerS: 1e9, nearestMm: 1 };
    fc.assert(
      fc.property(anyRun, (run) => {
        const fine = new Map(replay(run, free, 5).map(({ tMs, eye }) => [tMs, eye]));
        for (const { tMs, eye } of replay(run, free, 20)) {
          expect(eye.x).toBeCloseTo(fine.get(tMs)!.x, 5);
          expect(eye.z).toBeCloseTo(fine.get(tMs)!.z, 5);
        }
      }),
    );
  });

  it('never jumps, never exceeds the speed limit and never comes nearer than allowed, whatever comes', () => {
    fc.assert(
      fc.property(anyRun, (run) => {
        const shown = replay(run, SETTINGS, 5);
        for (let i = 1; i < shown.length; i++) {
          const [a, b] = [shown[i - 1].eye, shown[i].eye];
          const speed = Math.hypot(b.x - a.x, b.y - a.y, b.z - a.z) / 0.005;
          expect(speed).toBeLessThanOrEqual(SETTINGS.greatestMmPerS + 1e-6);
          expect(b.z).toBeGreaterThanOrEqual(SETTINGS.nearestMm);
        }
      }),
    );
  });

  it('moves without a jump of speed: halving the frame halves the change of speed', () => {
    const free = { ...SETTINGS, greatestMmPerS: 1e9, nearestMm: 1 };
    const run: Run = [
      { gap: 100, eye: { x: 300, y: 20, z: 1200 } },
      { gap: 100, eye: { x: 320, y: 20, z: 1190 } },
      { gap: 100, eye: null },
      { gap: 1000, eye: { x: -100, y: 0, z: 900 } },
      { gap: 300, eye: { x: -90, y: 0, z: 900 } },
    ];
    const sharpest = (frameMs: number) => {
      const xs = replay(run, free, frameMs).map(({ eye }) => eye.x);
      return Math.max(...xs.slice(2).map((x, i) => Math.abs(x - 2 * xs[i + 1] + xs[i]) / frameMs));
    };
    expect(sharpest(0.25)).toBeLessThan(0.6 * sharpest(0.5));
    expect(sharpest(0.125)).toBeLessThan(0.55 * sharpest(0.25));
  });
});

describe('impossible inputs', () => {
  it('name the value', () => {
    expect(() => createFollower({ ...SETTINGS, homeEye: { x: 0, y: 0, z: 0 } })).toThrowError(
      expect.objectContaining({ value: 'homeEye.z' }),
    );
    expect(() => createFollower(SETTINGS).sample({ x: NaN, y: 0, z: 900 }, 0)).toThrowError(
      expect.objectContaining({ value: 'eye.x' }),
    );
  });
});
