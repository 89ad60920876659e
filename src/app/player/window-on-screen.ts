import type { Point2 } from '@oriel/shared/projection/types';

/** The window's inner area on the screen: its size in CSS px, how fine they are, and where its centre lies from the centre of the screen, mm. */
export interface WindowOnScreen {
  readonly widthPx: number;
  readonly heightPx: number;
  readonly pxPerMm: number;
  /** Device pixels in one CSS px. */
  readonly deviceRatio: number;
  readonly centreMm: Point2;
}

/** The few properties of `window` this needs; the last two are known to some browsers only. */
export interface WindowFacts {
  readonly innerWidth: number;
  readonly innerHeight: number;
  readonly outerWidth: number;
  readonly outerHeight: number;
  readonly screenX: number;
  readonly screenY: number;
  readonly devicePixelRatio: number;
  readonly screen: { readonly width: number; readonly height: number };
  readonly mozInnerScreenX?: number;
  readonly mozInnerScreenY?: number;
}

/**
 * Where the window's inner area lies on the screen, as well as can be known: where the browser does not say, its frame is taken to be as
 * wide on the left as on the right and its bars to be on top. Full screen it is exact. `devicePxMm` is the size of one device pixel, so
 * that zooming the page changes nothing.
 */
export function windowOnScreen(facts: WindowFacts, devicePxMm: number): WindowOnScreen {
  const pxPerMm = 1 / (devicePxMm * facts.devicePixelRatio);
  const frame = Math.max(0, facts.outerWidth - facts.innerWidth);
  const bars = Math.max(0, facts.outerHeight - facts.innerHeight);
  const left = facts.mozInnerScreenX ?? facts.screenX + frame / 2;
  const top = facts.mozInnerScreenY ?? facts.screenY + bars;
  const { innerWidth, innerHeight, screen } = facts;
  const fills = innerWidth >= screen.width && innerHeight >= screen.height;
  return {
    widthPx: innerWidth,
    heightPx: innerHeight,
    pxPerMm,
    deviceRatio: facts.devicePixelRatio,
    centreMm: {
      x: fills ? 0 : (left + innerWidth / 2 - screen.width / 2) / pxPerMm,
      y: fills ? 0 : (screen.height / 2 - top - innerHeight / 2) / pxPerMm,
    },
  };
}
