import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { Icon } from '../../core/icon/icon';
import { Term } from '../../core/term/term';
import type { StatedFault } from '../../drawing/stated-faults';
import { RoomFigures } from '../ledger/room-figures';
import { meanings } from '../meanings';
import { SceneStore } from '../scene-store';
import { Viewer } from '../walk/viewer';
import { plainMm } from '../../figures/words';

/** So many faults are shown unasked. */
const FIRST_FAULTS = { brief: 1, whole: 2 };

/** The corner of the sheet: what it shows, for which glass and eye, who saved it, and whether it is clear. */
@Component({
  selector: 'oriel-title-block',
  imports: [Icon, Term],
  templateUrl: './title-block.html',
  styleUrl: './title-block.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TitleBlock {
  readonly revision = input('');
  /** Whether only the name, the glass, the home eye and the verdict are shown. */
  readonly brief = input(false);
  protected readonly store = inject(SceneStore);
  protected readonly room = inject(RoomFigures);
  private readonly viewer = inject(Viewer);
  protected readonly meanings = meanings;
  protected readonly firstFaults = computed(() => (this.brief() ? FIRST_FAULTS.brief : FIRST_FAULTS.whole));
  /** Whether every fault is shown, or the first few. */
  protected readonly all = signal(false);
  protected readonly figures = computed(() => {
    const { glass, homeEye, layers } = this.store.document();
    return {
      glass: `${plainMm(glass.widthMm)} × ${plainMm(glass.heightMm)} mm`,
      homeEye: `${[homeEye.x, homeEye.y, homeEye.z].map((mm) => plainMm(mm)).join(', ')} mm`,
      layers: String(layers.length),
    };
  });

  protected show(fault: StatedFault): void {
    if (fault.layerId) this.store.select(fault.layerId);
    if (fault.eye) this.viewer.standAt(fault.eye);
  }
}
