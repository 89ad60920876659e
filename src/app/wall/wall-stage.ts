import { Playing, type PlayingSurroundings } from '../player/playing';
import type { SceneDocument } from '@oriel/shared/contracts/scenes';

const reloadMs = 30_000;

/**
 * Changes what is played without a dark moment: the scene before goes on until the new one has its pictures. Pictures that did not come
 * are tried again every half minute.
 */
export class WallStage {
  private shown: Playing | null = null;
  private shownHost: HTMLElement | null = null;
  private coming: Playing | null = null;
  private retry: ReturnType<typeof setTimeout> | undefined;

  constructor(private readonly host: HTMLElement) {}

  /** What is seen now. */
  get playing(): Playing | null {
    return this.shown;
  }

  /** Plays this scene from now on. `loaded` is told the names of layers that have no picture. @throws GeometryError for impossible figures. */
  async play(scene: SceneDocument, surroundings: Omit<PlayingSurroundings, 'host' | 'loaded' | 'handChanged'>, loaded: (missing: readonly string[]) => void): Promise<void> {
    this.coming?.dispose();
    clearTimeout(this.retry);
    const host = this.host.ownerDocument.createElement('div');
    host.style.cssText = 'position:absolute;inset:0';
    this.host.prepend(host);
    const playing: Playing = new Playing(scene, {
      ...surroundings,
      host,
      handChanged: () => undefined,
      loaded: (missing) => {
        this.takeOver(playing, host);
        loaded(missing);
        clearTimeout(this.retry);
        if (missing.length > 0) this.retry = setTimeout(() => void playing.reload(), reloadMs);
      },
    });
    this.coming = playing;
    playing.faceExpected = true;
    await playing.start();
  }

  resize(): void {
    this.shown?.resize();
    this.coming?.resize();
  }

  clear(): void {
    clearTimeout(this.retry);
    this.coming?.dispose();
    this.shown?.dispose();
    this.host.replaceChildren();
    this.coming = this.shown = this.shownHost = null;
  }

  private takeOver(playing: Playing, host: HTMLElement): void {
    if (playing === this.shown) return;
    this.shown?.dispose();
    this.shownHost?.remove();
    this.shown = playing;
    this.shownHost = host;
    this.coming = null;
  }
}
