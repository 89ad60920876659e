import type { BOARD } from '@oriel/shared/viewer/measuring/board';

/** The board's inner corners found in one picture: their numbers, and x, y of each in turn, px from the picture's left upper corner. */
export interface BoardView {
  readonly ids: readonly number[];
  readonly corners: readonly number[];
}

interface Picture {
  readonly board: typeof BOARD;
  readonly width: number;
  readonly height: number;
}

/** What the worker is asked. */
export type ToBoardWorker =
  | ({ readonly type: 'look'; readonly grey: Uint8Array } & Picture)
  | ({ readonly type: 'calibrate'; readonly views: readonly BoardView[] } & Picture);

/** A camera measured from several views; spreads are standard deviations. */
export interface MeasuredLens {
  readonly rmsPx: number;
  readonly focalPx: number;
  readonly focalSpreadPx: number;
  readonly centre: { readonly x: number; readonly y: number };
  readonly centreSpread: { readonly x: number; readonly y: number };
  readonly radial: readonly number[];
}

/** What it answers. */
export type FromBoardWorker =
  | ({ readonly type: 'seen' } & BoardView)
  | ({ readonly type: 'lens' } & MeasuredLens)
  | { readonly type: 'failed'; readonly reason: string };
