import { ChangeDetectionStrategy, Component, type ElementRef, computed, inject, signal, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogRef, MatDialogTitle } from '@angular/material/dialog';
import { MatProgressBar } from '@angular/material/progress-bar';
import { FailureNotice } from '../../core/failure-notice';
import { Icon } from '../../core/icon/icon';
import { LayerSource, type NewLayer, type Waiting } from './layer-source';
import { PhotoPicker } from './photo-picker';

export interface AddLayersTo {
  readonly sceneId: string;
  readonly householdId: string;
  readonly room: number;
}

/** Brings layers to the sheet, from the household's photos or from files of this computer. */
@Component({
  selector: 'oriel-add-layers-dialog',
  imports: [MatButton, MatDialogTitle, MatDialogContent, MatDialogActions, MatDialogClose, MatProgressBar, FailureNotice, Icon, PhotoPicker],
  providers: [LayerSource],
  templateUrl: './add-layers-dialog.html',
  styleUrl: './add-layers-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AddLayersDialog {
  protected readonly to = inject<AddLayersTo>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<AddLayersDialog, NewLayer[]>>(MatDialogRef);
  private readonly source = inject(LayerSource);
  private readonly files = viewChild.required<ElementRef<HTMLInputElement>>('files');
  protected readonly chosen = signal<readonly string[]>([]);
  protected readonly over = signal(false);
  protected readonly waiting = this.source.waiting;
  protected readonly busy = computed(() => this.waiting().some(({ state }) => state === 'going'));
  protected readonly failed = computed(() => this.waiting().filter(({ state }) => state === 'failed'));

  protected async addPhotos(): Promise<void> {
    await this.bring(this.source.photos(this.to.sceneId, this.chosen()));
  }

  protected async addFiles(list: FileList | null): Promise<void> {
    const files = Array.from(list ?? []).slice(0, this.to.room);
    if (files.length > 0) await this.bring(this.source.files(this.to.sceneId, files));
  }

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.over.set(false);
    void this.addFiles(event.dataTransfer?.files ?? null);
  }

  protected chooseFiles(): void {
    this.files().nativeElement.click();
  }

  protected async again(one: Waiting): Promise<void> {
    await this.bring(this.source.again(this.to.sceneId, one));
  }

  /** Closes with what came; where some did not, stays open and says which, keeping the rest. */
  private async bring(coming: Promise<void>): Promise<void> {
    await coming;
    if (this.failed().length === 0) this.finish();
  }

  protected finish(): void {
    this.dialog.close(this.waiting().flatMap(({ layer }) => (layer ? [layer] : [])));
  }
}
