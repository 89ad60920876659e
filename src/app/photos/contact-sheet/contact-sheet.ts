import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  afterNextRender,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import type { Photo } from '@oriel/shared/contracts/photos';
import { Icon } from '../../core/icon/icon';
import { PhotoPicture } from '../photo-picture';
import { headingPx, layContactSheet, rowsBetween } from './contact-sheet-layout';

const overscanPx = 700;
/** Scrolled faster than this, nobody sees pictures pass: their places are held by colours alone; px a millisecond. */
const swiftPxPerMs = 4;
const calmAfterMs = 120;

/** Photos in rows of equal height with the month staying above; only the rows in sight are in the page, so ten thousand scroll like ten. */
@Component({
  selector: 'oriel-contact-sheet',
  imports: [DatePipe, Icon, PhotoPicture],
  templateUrl: './contact-sheet.html',
  styleUrl: './contact-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ContactSheet {
  readonly photos = input.required<readonly Photo[]>();
  /** How many there will be when all are fetched: the sheet is as long from the start, as well as can be told. */
  readonly total = input(0);
  readonly selected = input<ReadonlySet<string>>(new Set());
  /** Whether a press selects; otherwise it opens, and the mark at the corner selects. */
  readonly picking = input(false);
  readonly opened = output<Photo>();
  /** A press on a photo's mark; `through` is true when everything since the last one is meant (Shift). */
  readonly marked = output<{ photo: Photo; through: boolean }>();

  private readonly scroller = viewChild.required<ElementRef<HTMLElement>>('scroller');
  private readonly widthPx = signal(0);
  private readonly viewPx = signal(0);
  private readonly scrollPx = signal(0);
  private readonly rowPx = computed(() => (this.widthPx() < 600 ? 116 : 190));

  protected readonly headingPx = headingPx;
  protected readonly layout = computed(() => layContactSheet(this.photos(), this.widthPx(), this.rowPx()));
  protected readonly heightPx = computed(() => this.layout().heightPx * Math.max(1, this.total() / Math.max(1, this.photos().length)));
  /** Whether the sheet runs past too fast for pictures to be worth fetching. */
  protected readonly swift = signal(false);
  private readonly seen = computed(() => rowsBetween(this.layout().rows, this.scrollPx() - overscanPx, this.scrollPx() + this.viewPx() + overscanPx), {
    equal: (a, b) => a[0] === b[0] && a[1] === b[1],
  });
  protected readonly rows = computed(() => this.layout().rows.slice(...this.seen()));
  protected readonly month = computed(() => {
    const { rows } = this.layout();
    return rows[rowsBetween(rows, this.scrollPx(), this.scrollPx())[0]]?.month ?? '';
  });

  private scrolledMs = 0;
  private calm: ReturnType<typeof setTimeout> | undefined;

  constructor() {
    const destroyed = inject(DestroyRef);
    const element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    afterNextRender(() => {
      const observer = new ResizeObserver(() => {
        this.widthPx.set(element.clientWidth);
        this.viewPx.set(element.clientHeight);
      });
      observer.observe(element);
      destroyed.onDestroy(() => observer.disconnect());
    });
    destroyed.onDestroy(() => clearTimeout(this.calm));
  }

  protected scrolled({ timeStamp }: Event): void {
    const { scrollTop } = this.scroller().nativeElement;
    if (Math.abs(scrollTop - this.scrollPx()) > swiftPxPerMs * (timeStamp - this.scrolledMs)) this.swift.set(true);
    this.scrolledMs = timeStamp;
    this.scrollPx.set(scrollTop);
    clearTimeout(this.calm);
    this.calm = setTimeout(() => this.swift.set(false), calmAfterMs);
  }

  protected press(photo: Photo, event: MouseEvent): void {
    if (this.picking() || event.shiftKey || event.ctrlKey || event.metaKey) this.marked.emit({ photo, through: event.shiftKey });
    else this.opened.emit(photo);
  }
}
