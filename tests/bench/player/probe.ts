import type { DrawingChange } from '@oriel/shared/ladder/drawing-rate';
import type { FromTracker } from '../../../src/app/tracking/tracking-messages';

/** What is seen of a page while it runs; times on the page's clock, ms. */
export interface Seen {
  /** Each frame the page drew: when it was begun, and when its own work was done. */
  readonly frames: [beganMs: number, drawnMs: number][];
  /** Each frame the tracker looked at: the camera's time, when its sample reached the page, whether a face was found, how long the look took. */
  readonly looks: [timestampMs: number, receivedMs: number, found: boolean, lookMs: number][];
  /** When some camera frames were captured, as long as the page itself asks to know. */
  readonly captures: number[];
  /** A frame drawn and when it was presented. */
  readonly presented: [drawnMs: number, presentedMs: number][];
  readonly changes: { tMs: number; from: number; to: number; reason: string }[];
  /** Changes of how many frames a second are drawn at most; null for every refresh. */
  readonly rateChanges: { tMs: number; toPerS: number | null; reason: string }[];
}

/** What a page holds that must be freed. */
export interface Held {
  readonly objectUrls: number;
  /** Of every three renderer the page ever made, by its own count. */
  readonly textures: number;
  readonly geometries: number;
}

export interface Probe {
  readonly seen: Seen;
  held(): Held;
  /** Lets go of what was seen so far, which itself takes memory: some 80 bytes a frame drawn. */
  forget(): void;
}

interface ThreeInfo {
  readonly memory: { readonly textures: number; readonly geometries: number };
  readonly render: { readonly frame: number };
}

const probeEveryMs = 400;

/*
 * Runs in the page before the product does, and only listens: it draws nothing but, now and then, a single mark of a few px, by which the
 * browser says when a frame was presented (W3C Element Timing).
 */
const seen: Seen = { frames: [], looks: [], captures: [], presented: [], changes: [], rateChanges: [] };
const marks = new Map<string, number>();
let marksPut = 0;
let lastDrawing = '';
let lastMarkMs = -Infinity;
let mark: HTMLElement | null = null;

function putMark(): string {
  mark?.remove();
  mark = document.createElement('span');
  const name = `oriel-bench-${String(marksPut++)}`;
  mark.setAttribute('elementtiming', name);
  mark.textContent = '.';
  mark.style.cssText = 'position:fixed;left:2px;bottom:2px;font:9px sans-serif;color:#777;z-index:9';
  document.body.append(mark);
  return name;
}

/** Changes with each frame that is drawn, and only then: the pages pass refreshes over where the machine is slow. */
function drawing(): string {
  const layer = document.querySelector<HTMLElement>('.picture img');
  return layer ? layer.style.transform : String(infos.reduce((sum, { render }) => sum + render.frame, 0));
}

const requestFrame = window.requestAnimationFrame.bind(window);
window.requestAnimationFrame = (draw) =>
  requestFrame((tMs) => {
    draw(tMs);
    const drawn = drawing();
    if (drawn === lastDrawing) return;
    lastDrawing = drawn;
    const name = tMs - lastMarkMs > probeEveryMs ? putMark() : null;
    const drawnMs = performance.now();
    if (name) marks.set(name, drawnMs);
    if (name) lastMarkMs = tMs;
    seen.frames.push([tMs, drawnMs]);
  });

new PerformanceObserver((list) => {
  for (const entry of list.getEntries() as (PerformanceEntry & { readonly identifier: string; readonly renderTime: number })[]) {
    const drawnMs = marks.get(entry.identifier);
    if (drawnMs !== undefined && entry.renderTime > 0) seen.presented.push([drawnMs, entry.renderTime]);
  }
}).observe({ type: 'element', buffered: true });

new PerformanceObserver((list) => {
  for (const { name, detail } of list.getEntries() as PerformanceMark[]) {
    if (name === 'oriel ladder') seen.changes.push(detail as Seen['changes'][number]);
    if (name === 'oriel drawing') {
      const { tMs, toPerS, reason } = detail as DrawingChange;
      seen.rateChanges.push({ tMs, toPerS: Number.isFinite(toPerS) ? toPerS : null, reason });
    }
  }
}).observe({ type: 'mark', buffered: true });

const OwnWorker = window.Worker;
window.Worker = class extends OwnWorker {
  constructor(url: string | URL, options?: WorkerOptions) {
    super(url, options);
    this.addEventListener('message', ({ data }: MessageEvent<FromTracker>) => {
      if (data.type === 'sample') seen.looks.push([data.timestampMs, performance.now(), data.face !== null, data.timings.totalMs]);
    });
  }
};

const video = HTMLVideoElement.prototype;
const requestVideoFrame = Object.getOwnPropertyDescriptor(video, 'requestVideoFrameCallback')!.value as HTMLVideoElement['requestVideoFrameCallback'];
video.requestVideoFrameCallback = function (use) {
  return requestVideoFrame.call(this, (now, metadata) => {
    if (metadata.captureTime !== undefined) seen.captures.push(metadata.captureTime);
    use(now, metadata);
  });
};

const objectUrls = new Set<string>();
const [make, revoke] = [URL.createObjectURL.bind(URL), URL.revokeObjectURL.bind(URL)];
URL.createObjectURL = (object) => {
  const url = make(object);
  objectUrls.add(url);
  return url;
};
URL.revokeObjectURL = (url) => {
  objectUrls.delete(url);
  revoke(url);
};

// Each three renderer makes itself known to its own developer tools, where there are any.
const infos: ThreeInfo[] = [];
const threeTools = new EventTarget();
threeTools.addEventListener('observe', (event) => {
  const observed = (event as CustomEvent<{ readonly info?: ThreeInfo }>).detail;
  // The counts alone: whoever keeps the whole of it keeps the context and its canvas.
  if (observed.info) infos.push({ memory: observed.info.memory, render: observed.info.render });
});

const probe: Probe = {
  seen,
  held: () => ({
    objectUrls: objectUrls.size,
    textures: infos.reduce((sum, { memory }) => sum + memory.textures, 0),
    geometries: infos.reduce((sum, { memory }) => sum + memory.geometries, 0),
  }),
  forget: () => {
    for (const record of Object.values(seen) as unknown[][]) record.length = 0;
    marks.clear();
  },
};
Object.assign(window, { __THREE_DEVTOOLS__: threeTools, orielProbe: probe });
