import { ChangeDetectionStrategy, Component, DOCUMENT, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { BOARD, BOARD_HEIGHT_MM, BOARD_WIDTH_MM, blackOfBoard } from '@oriel/shared/viewer/measuring/board';

/** The board in true millimetres, to be printed. */
@Component({
  selector: 'oriel-board-page',
  imports: [MatButton],
  template: `
    <div class="words">
      <h1>Board for measuring a camera</h1>
      <p>
        Print it on A4, lying, at 100 % (“actual size”), without fitting to the page. Check it with a rule: the line beneath it is 200 mm long. A board printed
        a little small still measures right; one that is bent or stretched does not. Glue it to something flat and stiff.
      </p>
      <button matButton="filled" type="button" (click)="print()">Print it</button>
    </div>
    <svg class="board" [attr.width]="width + 'mm'" [attr.height]="height + 14 + 'mm'" [attr.viewBox]="'0 0 ' + width + ' ' + (height + 14)" role="img" aria-label="The board: seven by five squares with markers">
      <rect class="paper" x="0" y="0" [attr.width]="width" [attr.height]="height + 14" />
      @for (one of black; track $index) {
        <rect [attr.x]="one.x" [attr.y]="one.y" [attr.width]="one.width" [attr.height]="one.height" shape-rendering="crispEdges" />
      }
      <path class="rule" [attr.d]="rule" />
      <text x="204" [attr.y]="height + 9.5">200 mm; squares {{ squareMm }} mm</text>
    </svg>
  `,
  styleUrl: './board-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BoardPage {
  private readonly window = inject(DOCUMENT).defaultView!;
  protected readonly width = BOARD_WIDTH_MM;
  protected readonly height = BOARD_HEIGHT_MM;
  protected readonly squareMm = BOARD.squareMm;
  protected readonly black = blackOfBoard();
  /** 200 mm with a stroke every 10. */
  protected readonly rule = `M0 ${BOARD_HEIGHT_MM + 10}H200` + Array.from({ length: 21 }, (_, i) => `M${i * 10} ${BOARD_HEIGHT_MM + (i % 5 === 0 ? 5 : 7)}V${BOARD_HEIGHT_MM + 10}`).join('');

  protected print(): void {
    this.window.print();
  }
}
