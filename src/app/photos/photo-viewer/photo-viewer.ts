import { DatePipe, DecimalPipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogRef } from '@angular/material/dialog';
import { type Photo, photoOriginal } from '@oriel/shared/contracts/photos';
import { addressOf } from '../../core/api';
import { Icon } from '../../core/icon/icon';
import { Session } from '../../core/session';
import { PhotoPicture } from '../photo-picture';

/** What a person asked of the photo they were looking at. */
export type PhotoWish = { readonly wish: 'scene' | 'bin'; readonly photo: Photo };

/** One photo, large, with its facts; arrows go to its neighbours. */
@Component({
  selector: 'oriel-photo-viewer',
  imports: [DatePipe, DecimalPipe, MatButton, MatIconButton, Icon, PhotoPicture],
  templateUrl: './photo-viewer.html',
  styleUrl: './photo-viewer.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown.arrowleft)': 'step(-1)', '(document:keydown.arrowright)': 'step(1)' },
})
export class PhotoViewer {
  private readonly data = inject<{ photos: readonly Photo[]; photo: Photo }>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<PhotoViewer, PhotoWish>>(MatDialogRef);
  protected readonly session = inject(Session);
  private readonly at = signal(Math.max(0, this.data.photos.indexOf(this.data.photo)));
  protected readonly photo = computed(() => this.data.photos[this.at()]);
  protected readonly hasBefore = computed(() => this.at() > 0);
  protected readonly hasAfter = computed(() => this.at() < this.data.photos.length - 1);
  protected readonly original = computed(() => addressOf(photoOriginal, { photoId: this.photo().id }));

  protected step(by: number): void {
    this.at.update((i) => Math.min(this.data.photos.length - 1, Math.max(0, i + by)));
  }

  protected wish(wish: PhotoWish['wish']): void {
    this.dialog.close({ wish, photo: this.photo() });
  }

  protected close(): void {
    this.dialog.close();
  }
}
