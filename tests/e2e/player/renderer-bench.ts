import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import type { Point3 } from '@oriel/shared/projection/types';
import { makeRenderer } from '../../../src/app/player/choose-renderer';
import type { LoadOutcome, Renderer, RendererFacts, RendererName } from '../../../src/app/player/renderer';
import { sceneOnScreen } from '../../../src/app/player/scene-on-screen';
import { windowOnScreen } from '../../../src/app/player/window-on-screen';

/** What a test can do with the renderers on the bench page. One CSS px measures 0.25 mm there. */
export interface RendererBench {
  load(name: RendererName, document: SceneDocument): Promise<LoadOutcome>;
  draw(eye: Point3): Promise<void>;
  resize(document: SceneDocument): void;
  facts(): RendererFacts | null;
  loseContext(): void;
  dispose(): RendererFacts | null;
  readonly lost: boolean;
}

export const benchPxMm = 0.25;

let renderer: Renderer | null = null;
let lost = false;

const area = () => windowOnScreen(window, benchPxMm / window.devicePixelRatio);
const twoFrames = () => new Promise<void>((resolve) => requestAnimationFrame(() => requestAnimationFrame(() => resolve())));

const bench: RendererBench = {
  async load(name, document) {
    const host = window.document.getElementById('host')!;
    if (renderer?.facts.name !== name) {
      renderer?.dispose();
      renderer = await makeRenderer(name, host, (imageId, edge) => `/pictures/${imageId}/${edge}`, () => (lost = true));
    }
    return renderer.load(sceneOnScreen(document, area()));
  },
  async draw(eye) {
    renderer?.draw(eye);
    await twoFrames();
  },
  resize: (document) => renderer?.resize(sceneOnScreen(document, area())),
  facts: () => renderer?.facts ?? null,
  loseContext: () => document.querySelector('canvas')?.getContext('webgl2')?.getExtension('WEBGL_lose_context')?.loseContext(),
  dispose() {
    const gone = renderer;
    renderer?.dispose();
    renderer = null;
    return gone?.facts ?? null;
  },
  get lost() {
    return lost;
  },
};

Object.assign(window, { bench });
