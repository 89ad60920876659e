import { ChangeDetectionStrategy, Component, DOCUMENT, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { WallGlass } from '@oriel/shared/contracts/wall-set-up';
import { FigureField } from '../../figures/figure-field';
import { plainMm } from '../../figures/words';
import { CardOutline } from '../../screen/card-outline';
import { diagonalOf, glassFromDiagonal, mmPerInch } from '../../screen/screen-measure';
import { ID1_WIDTH } from '@oriel/shared/viewer/measuring/two-distances';
import { Means } from '../means/means';
import { unmeasured } from '../means/sources';
import { type Side, agreeing, askFor, awaitedAfter, ruledUncertainty, squarePx } from './glass-shape';
import { limitsOf } from './limits';
import { WallKeeper } from './wall-keeper';

type Way = 'rule' | 'diagonal' | 'card';
type Unit = 'in' | 'cm';

const unitMm: Readonly<Record<Unit, number>> = { in: mmPerInch, cm: 10 };
/** No screen is smaller: what is typed below it is a slip, 0 or centimetres (practice). */
const leastSideMm = 10;
/** How well each way measures a width until one says otherwise (practice): a rule's reading, a maker's rounding to half an inch, the edge of a card in px. */
const usual = { ruleMm: 1, diagonalShare: 0.006, cardPx: 0.7 } as const;
const { widthMm, heightMm, widthPx, heightPx } = WallGlass.shape;

/** The first step: how large the glass is, and how sure that is. */
@Component({
  selector: 'oriel-wall-glass-step',
  imports: [MatButton, MatButtonToggle, MatButtonToggleGroup, FigureField, CardOutline, Means],
  templateUrl: './glass-step.html',
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GlassStep {
  protected readonly keeper = inject(WallKeeper);
  private readonly window = inject(DOCUMENT).defaultView!;
  protected readonly way = signal<Way>('rule');
  protected readonly unit = signal<Unit>('in');
  protected readonly mm = { least: leastSideMm, most: limitsOf(widthMm).most };
  protected readonly highMm = { least: leastSideMm, most: limitsOf(heightMm).most };
  protected readonly px = { least: 1, most: limitsOf(widthPx).most };
  protected readonly highPx = { least: 1, most: limitsOf(heightPx).most };

  protected readonly glass = computed(() => this.keeper.setUp()!.glass);
  protected readonly diagonal = computed(() => diagonalOf(this.glass()) / unitMm[this.unit()]);
  protected readonly size = computed(() => `The glass is then ${plainMm(this.glass().widthMm)} × ${plainMm(this.glass().heightMm)} mm.`);
  protected readonly sureMm = computed(() => (this.glass().uncertainty ?? unmeasured.glassScale) * this.glass().widthMm);
  protected readonly pxMm = computed(() => this.glass().widthMm / this.window.screen.width);
  /** Figures whose other was typed, while they are still as they were. */
  private readonly awaited = signal<readonly Side[]>([]);
  /** How well the rule was read that gave the sides, mm; null where none was held to the glass here. */
  private readonly ruledMm = signal<number | null>(null);
  /** What would make sides and px agree; null where they do. */
  private readonly disagreeing = computed(() => (squarePx(this.glass()) ? null : agreeing(this.glass())));
  /** While one figure of a pair is typed the other is not wrong yet: only asked for. */
  protected readonly next = computed(() => (this.disagreeing() ? askFor(this.glass(), this.awaited()) : null));
  protected readonly odd = computed(() => (this.next() ? null : this.disagreeing()));

  protected byRule(side: 'widthMm' | 'heightMm', mm: number): void {
    this.ruledMm.update((known) => known ?? usual.ruleMm);
    this.typed(side);
    this.agree({ [side]: mm });
  }

  protected inPx(side: 'widthPx' | 'heightPx', px: number): void {
    this.typed(side);
    this.agree({ [side]: Math.round(px) });
  }

  private typed(side: Side): void {
    this.awaited.update((before) => awaitedAfter(before, side));
  }

  protected agree(part: Partial<WallGlass>): void {
    const glass = { ...this.glass(), ...part };
    if (squarePx(glass)) this.awaited.set([]);
    this.keeper.glass({ ...part, uncertainty: ruledUncertainty(glass, this.ruledMm()) });
  }

  protected byDiagonal(length: number): void {
    const { widthPx: w, heightPx: h } = this.glass();
    this.ruledMm.set(null);
    this.keeper.glass({ ...glassFromDiagonal(length * unitMm[this.unit()], w, h), uncertainty: usual.diagonalShare });
  }

  /** The page runs on the wall's own screen: a px of the page is one of the glass. */
  protected byCard(pxMm: number): void {
    const { screen, devicePixelRatio } = this.window;
    this.ruledMm.set(null);
    this.keeper.glass({
      widthMm: screen.width * pxMm,
      heightMm: screen.height * pxMm,
      widthPx: Math.round(screen.width * devicePixelRatio),
      heightPx: Math.round(screen.height * devicePixelRatio),
      uncertainty: Math.hypot(ID1_WIDTH.uncertainty, usual.cardPx * pxMm) / ID1_WIDTH.value,
    });
  }

  protected sure(mm: number): void {
    if (this.way() === 'rule') this.ruledMm.set(mm);
    this.keeper.glass({ uncertainty: mm / this.glass().widthMm });
  }

  protected turn(): void {
    const { widthMm: w, heightMm: h, widthPx: pw, heightPx: ph } = this.glass();
    this.keeper.glass({ widthMm: h, heightMm: w, widthPx: ph, heightPx: pw });
  }
}
