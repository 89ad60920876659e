import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { plainMm } from '../figures/words';
import type { RendererName } from './renderer';

/** What the corner shows of drawing and following. */
export interface Figures {
  readonly framesPerSecond: number;
  readonly facesPerSecond: number;
  readonly captureToDrawnMs: number | null;
  readonly eye: { readonly x: number; readonly y: number; readonly z: number };
  /** Null until there is one. */
  readonly renderer: RendererName | null;
  /** What pictures and drawing take up on the graphics side, bytes; null before anything is drawn. */
  readonly graphicsBytes: number | null;
  /** How finely is looked, in words. */
  readonly looking: string;
}

const drawnBy: Readonly<Record<RendererName, string>> = { css: 'the processor', three: 'the graphics processor' };

/** Figures in the corner of the picture, for those who set up the room. */
@Component({
  selector: 'oriel-read-out',
  template: `
    @let shown = figures();
    <dl>
      <dt>Frames drawn a second</dt>
      <dd>{{ shown.framesPerSecond }}</dd>
      <dt>Faces tracked a second</dt>
      <dd>{{ shown.facesPerSecond }}</dd>
      <dt>Capture to drawing, ms</dt>
      <dd>{{ shown.captureToDrawnMs === null ? '–' : shown.captureToDrawnMs.toFixed(0) }}</dd>
      <dt>Eye, mm</dt>
      <dd>{{ eye() }}</dd>
      <dt>Drawn by</dt>
      <dd>{{ shown.renderer ? drawnBy[shown.renderer] : 'nothing yet' }}</dd>
      <dt>Graphics memory, MB</dt>
      <dd>{{ shown.graphicsBytes === null ? '–' : (shown.graphicsBytes / 1e6).toFixed(0) }}</dd>
      <dt>Looking by</dt>
      <dd>{{ shown.looking }}</dd>
    </dl>
  `,
  styles: `
    dl { display: grid; grid-template-columns: auto auto; gap: 2px 18px; margin: 0; padding: 10px 12px; font-size: 12px; background: var(--sheet); border: 1px solid var(--line); border-radius: var(--corner); }
    dt { color: var(--pencil); }
    dd { margin: 0; text-align: right; font-variant-numeric: tabular-nums; min-width: 11ch; white-space: nowrap; }
    @media (max-width: 600px) { dd { white-space: normal; } }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadOut {
  readonly figures = input.required<Figures>();
  protected readonly drawnBy = drawnBy;
  protected readonly eye = computed(() => {
    const { x, y, z } = this.figures().eye;
    return [x, y, z].map((mm) => plainMm(mm, 0)).join(', ');
  });
}
