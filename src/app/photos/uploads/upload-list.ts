import { PercentPipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { Icon } from '../../core/icon/icon';
import { type Upload, type UploadState, isOver } from './upload';
import { UploadQueue } from './upload-queue';

const shownAtMost = 200;

/** The uploads at the foot of the contact sheet: a bar for all, and a bar and its words for each. */
@Component({
  selector: 'oriel-upload-list',
  imports: [PercentPipe, MatButton, MatIconButton, MatProgressBar, Icon],
  templateUrl: './upload-list.html',
  styleUrl: './upload-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UploadList {
  protected readonly queue = inject(UploadQueue);
  protected readonly isOver = isOver;
  protected readonly count = computed(() => {
    const states = this.queue.uploads().map((upload) => upload.state());
    const of = (state: string) => states.filter((known) => known === state).length;
    return { all: states.length, kept: of('kept'), duplicates: of('duplicate'), refused: of('refused') };
  });
  /** Those that want attention first, then those under way, then the rest. */
  protected readonly shown = computed(() =>
    [...this.queue.uploads()].sort((a, b) => urgency(a) - urgency(b) || a.id - b.id).slice(0, shownAtMost),
  );

  protected words(upload: Upload): string {
    switch (upload.state()) {
      case 'waiting': return 'waiting';
      case 'sending': return upload.sent() < 1 ? 'sending' : 'being looked at';
      case 'kept': return 'kept';
      case 'duplicate': return 'you have this one already';
      case 'interrupted': return 'interrupted; goes on when the network is back';
      case 'refused': return `${upload.failure()?.failure.message} ${upload.failure()?.failure.remedy}`;
      case 'cancelled': return 'cancelled';
    }
  }
}

const order: readonly UploadState[] = ['refused', 'interrupted', 'sending', 'waiting', 'kept', 'duplicate', 'cancelled'];
const urgency = (upload: Upload) => order.indexOf(upload.state());
