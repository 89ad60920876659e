import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle } from '@angular/material/dialog';
import { sayMoment } from '../words';
import type { MovedOn } from './autosave';

/** What someone decided about two versions of one scene; nothing is lost while they have not. */
export type ConflictChoice = 'theirs' | 'copy' | 'over';

/** Two people drew on one scene: says who and when, and offers the three ways on. */
@Component({
  selector: 'oriel-conflict-dialog',
  imports: [MatButton, MatDialogTitle, MatDialogContent, MatDialogActions, MatDialogClose],
  template: `
    <h2 mat-dialog-title>{{ theirs.savedBy }} saved this scene meanwhile</h2>
    <mat-dialog-content>
      <p>
        Revision {{ theirs.revision }} was saved by {{ theirs.savedBy }} {{ when }}, after the one you drew on. Your changes are
        still on this sheet and kept in this browser. What should become of them?
      </p>
      <ul>
        <li>
          <button matButton="filled" mat-dialog-close="copy">Keep mine as a copy</button>
          <span>Both stay: theirs here, yours as a scene of its own, which opens now.</span>
        </li>
        <li>
          <button matButton="outlined" mat-dialog-close="theirs">Take theirs</button>
          <span>This sheet shows revision {{ theirs.revision }}. One undo brings yours back.</span>
        </li>
        <li>
          <button matButton="outlined" mat-dialog-close="over">Save mine over theirs</button>
          <span>The scene becomes yours; what {{ theirs.savedBy }} changed in it is replaced.</span>
        </li>
      </ul>
    </mat-dialog-content>
    <mat-dialog-actions>
      <button matButton mat-dialog-close>Decide later</button>
    </mat-dialog-actions>
  `,
  styles: `
    ul { list-style: none; margin: 0; padding: 0; display: grid; gap: 0; }
    li { display: grid; grid-template-columns: 180px 1fr; gap: 16px; align-items: center; padding: 12px 0; border-top: 1px solid var(--hairline); }
    li span { color: var(--pencil); }
    @media (max-width: 560px) { li { grid-template-columns: 1fr; gap: 6px; } }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConflictDialog {
  protected readonly theirs = inject<MovedOn>(MAT_DIALOG_DATA);
  protected readonly when = sayMoment(new Date(this.theirs.savedAt));
}
