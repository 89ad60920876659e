import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle } from '@angular/material/dialog';
import type { Glass } from '@oriel/shared/projection/types';
import { FigureField } from '../../figures/figure-field';

/** Asks for the glass a whole scene is to be carried to. */
@Component({
  selector: 'oriel-glass-dialog',
  imports: [MatButton, MatDialogTitle, MatDialogContent, MatDialogActions, MatDialogClose, FigureField],
  template: `
    <h2 mat-dialog-title>Scale the scene to another glass</h2>
    <mat-dialog-content>
      <p>Layers, depths, home eye and viewing zone are scaled together, so that it looks the same from the same angles.</p>
      <oriel-figure-field label="Width of the other glass" [value]="widthMm()" [least]="50" [most]="10000" (figure)="widthMm.set($event)" />
      <oriel-figure-field label="Height of the other glass" [value]="heightMm()" [least]="50" [most]="10000" (figure)="heightMm.set($event)" />
      @if (otherShape()) {
        <p class="marginal">Another shape: the scene fits within it, and some sides will be open until the layers grow.</p>
      }
    </mat-dialog-content>
    <mat-dialog-actions>
      <button matButton mat-dialog-close>Cancel</button>
      <button matButton="filled" [mat-dialog-close]="{ widthMm: widthMm(), heightMm: heightMm() }">Scale the scene</button>
    </mat-dialog-actions>
  `,
  styles: 'oriel-figure-field { margin-bottom: 6px; } p.marginal { margin: 10px 0 0; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GlassDialog {
  private readonly glass = inject<Glass>(MAT_DIALOG_DATA);
  protected readonly widthMm = signal(this.glass.widthMm);
  protected readonly heightMm = signal(this.glass.heightMm);
  protected readonly otherShape = computed(() => {
    const shape = (this.widthMm() / this.heightMm()) * (this.glass.heightMm / this.glass.widthMm);
    return Math.abs(shape - 1) > 0.005;
  });
}
