import type { WritableSignal } from '@angular/core';
import type { Photo } from '@oriel/shared/contracts/photos';
import type { ApiFailure } from '../../core/api-failure';

/** `interrupted`: the network went; it goes on by itself. `refused`: the server said no; only the person can help. */
export type UploadState = 'waiting' | 'sending' | 'kept' | 'duplicate' | 'interrupted' | 'refused' | 'cancelled';

export interface Upload {
  readonly id: number;
  readonly householdId: string;
  readonly file: File;
  readonly state: WritableSignal<UploadState>;
  /** 0 to 1 of the file's bytes. */
  readonly sent: WritableSignal<number>;
  readonly failure: WritableSignal<ApiFailure | null>;
  readonly photo: WritableSignal<Photo | null>;
}

export const isOver = (state: UploadState) => state === 'kept' || state === 'duplicate' || state === 'refused' || state === 'cancelled';
