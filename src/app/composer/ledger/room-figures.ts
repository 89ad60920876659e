import { Injectable, signal } from '@angular/core';

export type RoomPart = 'glass' | 'homeEye' | 'zone';

/** Which figures of the room the ledger shows: the title block opens them, the ledger answers. */
@Injectable()
export class RoomFigures {
  readonly shown = signal(false);
  /** What is to have the focus once shown. */
  readonly asked = signal<RoomPart | null>(null);

  open(part: RoomPart): void {
    this.shown.set(true);
    this.asked.set(part);
  }
}
