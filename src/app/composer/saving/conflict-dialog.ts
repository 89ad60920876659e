import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle } from '@angular/material/dialog';
import { sayMoment } from '../../core/moments';
import { Session } from '../../core/session';
import type { MovedOn } from '../../saving/autosave';

/** What someone decided about two versions of one scene; nothing is lost while they have not. */
export type ConflictChoice = 'theirs' | 'copy' | 'over';

/** Two people drew on one scene: says who and when, and offers the three ways on. */
@Component({
  selector: 'oriel-conflict-dialog',
  imports: [MatButton, MatDialogTitle, MatDialogContent, MatDialogActions, MatDialogClose],
  template: `
    <h2 mat-dialog-title>{{ mine ? 'You saved this scene meanwhile, on another page' : theirs.savedBy + ' saved this scene meanwhile' }}</h2>
    <mat-dialog-content>
      <p>
        Revision {{ theirs.revision }} was saved by {{ mine ? 'you' : theirs.savedBy }} {{ when }}, after the one you drew on. Your changes are
        still on this sheet and kept in this browser. What should become of them?
      </p>
      <ul>
        <li>
          <button matButton="filled" mat-dialog-close="copy">{{ mine ? 'Keep this as a copy' : 'Keep mine as a copy' }}</button>
          <span>Both stay: {{ mine ? 'that one' : 'theirs' }} here, {{ mine ? 'this' : 'yours' }} as a scene of its own, which opens now.</span>
        </li>
        <li>
          <button matButton="outlined" mat-dialog-close="theirs">{{ mine ? 'Take the saved one' : 'Take theirs' }}</button>
          <span>This sheet shows revision {{ theirs.revision }}. One undo brings this one back.</span>
        </li>
        <li>
          <button matButton="outlined" mat-dialog-close="over">{{ mine ? 'Save this over it' : 'Save mine over theirs' }}</button>
          <span>The scene becomes this one; what {{ mine ? 'you' : theirs.savedBy }} changed in revision {{ theirs.revision }} is replaced.</span>
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
  /** Whether it was this person too, on another page or another computer. */
  protected readonly mine = inject(Session).account()?.id === this.theirs.savedById;
  protected readonly when = sayMoment(new Date(this.theirs.savedAt));
}
