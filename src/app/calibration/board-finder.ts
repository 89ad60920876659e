import { DOCUMENT, DestroyRef, Injectable, inject } from '@angular/core';
import { BOARD } from '@oriel/shared/viewer/measuring/board';
import type { BoardView, FromBoardWorker, MeasuredLens, ToBoardWorker } from './board-messages';

/** The worker that knows OpenCV.js: fetched and started when first asked, ended with whoever provides this. One question at a time. */
@Injectable()
export class BoardFinder {
  private readonly url = new URL('/calibration/board-worker.js', inject(DOCUMENT).baseURI);
  private worker: Worker | null = null;

  constructor() {
    inject(DestroyRef).onDestroy(() => this.worker?.terminate());
  }

  /** @throws Error with OpenCV's reason. */
  async look(grey: Uint8Array, width: number, height: number): Promise<BoardView> {
    const answer = await this.ask({ type: 'look', board: BOARD, width, height, grey }, [grey.buffer]);
    if (answer.type !== 'seen') throw new Error(reasonOf(answer));
    return { ids: answer.ids, corners: answer.corners };
  }

  /** @throws Error with OpenCV's reason, e.g. of views too much alike. */
  async measure(views: readonly BoardView[], width: number, height: number): Promise<MeasuredLens> {
    const answer = await this.ask({ type: 'calibrate', board: BOARD, width, height, views });
    if (answer.type !== 'lens') throw new Error(reasonOf(answer));
    return answer;
  }

  private ask(message: ToBoardWorker, given: Transferable[] = []): Promise<FromBoardWorker> {
    const worker = (this.worker ??= new Worker(this.url));
    return new Promise((resolve, reject) => {
      worker.onmessage = ({ data }: MessageEvent<FromBoardWorker>) => resolve(data);
      worker.onerror = () => {
        this.worker = null;
        reject(new Error('The measuring could not be started. Reload the page and try again.'));
      };
      worker.postMessage(message, given);
    });
  }
}

const reasonOf = (answer: FromBoardWorker) => (answer.type === 'failed' ? answer.reason : 'The answer was not understood.');
