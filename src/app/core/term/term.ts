import { CdkConnectedOverlay, CdkOverlayOrigin, type ConnectedPosition } from '@angular/cdk/overlay';
import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import { ownId } from '../own-id';

const below: ConnectedPosition = { originX: 'start', originY: 'bottom', overlayX: 'start', overlayY: 'top', offsetY: 6 };
const above: ConnectedPosition = { originX: 'start', originY: 'top', overlayX: 'start', overlayY: 'bottom', offsetY: -6 };

/** A word of the trade that says what it means when it is pressed: by pointer, finger or key. Escape, or a press elsewhere, closes it. */
@Component({
  selector: 'oriel-term',
  imports: [CdkConnectedOverlay, CdkOverlayOrigin],
  template: `
    <button
      type="button"
      cdkOverlayOrigin
      #origin="cdkOverlayOrigin"
      title="What this means"
      [attr.aria-expanded]="open()"
      [attr.aria-describedby]="open() ? id : null"
      (click)="open.set(!open())"
    >
      <ng-content />
    </button>
    <ng-template
      cdkConnectedOverlay
      [cdkConnectedOverlayOrigin]="origin"
      [cdkConnectedOverlayOpen]="open()"
      [cdkConnectedOverlayPositions]="positions"
      [cdkConnectedOverlayPush]="true"
      [cdkConnectedOverlayViewportMargin]="8"
      (overlayOutsideClick)="closeUnless(origin, $event)"
      (detach)="open.set(false)"
    >
      <p class="meaning" role="status" [id]="id">{{ meaning() }}</p>
    </ng-template>
  `,
  styleUrl: './term.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Term {
  readonly meaning = input.required<string>();
  protected readonly id = ownId('term');
  protected readonly open = signal(false);
  protected readonly positions = [below, above];

  /** The press on the word itself closes it already. */
  protected closeUnless({ elementRef }: CdkOverlayOrigin, { target }: MouseEvent): void {
    if (!elementRef.nativeElement.contains(target)) this.open.set(false);
  }
}
