import { ChangeDetectionStrategy, Component, inject, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Standing } from './standing';

/** What whoever walks to the marked spot sees from there: themselves, a count, whether a face is found, how far the reading is. */
@Component({
  selector: 'oriel-standing-view',
  imports: [MatButton],
  template: `
    @if (standing.busy()) {
      <button matButton="outlined" type="button" (click)="standing.stop()">Stop</button>
    } @else {
      <button matButton="outlined" type="button" (click)="begin.emit()">Start, and walk to the spot</button>
    }
    @if (standing.picture(); as stream) {
      <div class="picture">
        <video autoplay muted playsinline [srcObject]="stream" aria-label="The camera’s picture"></video>
        @if (standing.seconds(); as seconds) {
          <span class="count figures" aria-hidden="true">{{ seconds }}</span>
        }
        <span class="found" [class.seen]="standing.seen()">{{ standing.seen() ? 'Face found' : 'No face' }}</span>
      </div>
    }
    @if (standing.readings() !== null) {
      <progress max="1" [value]="standing.share()" aria-label="How far the reading is"></progress>
      <p class="figures" aria-hidden="true">{{ standing.readings() }} readings</p>
    }
    <p class="words" role="status">{{ standing.words() }}</p>
  `,
  styleUrl: './standing-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StandingView {
  readonly begin = output();
  protected readonly standing = inject(Standing);
}
