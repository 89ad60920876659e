import { ChangeDetectionStrategy, Component, ElementRef, computed, effect, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import type { Glass, Point3, ViewingZone } from '@oriel/shared/projection/types';
import { Icon } from '../../core/icon/icon';
import { OpenedHeading } from '../../core/opened-heading';
import { Term } from '../../core/term/term';
import { eyeLimits } from '../commands/limits';
import { creditScene, renameScene, scaleToGlass, setGlass, setHomeEye, setZone } from '../commands/setting-commands';
import { meanings } from '../meanings';
import { SceneStore } from '../scene-store';
import { FigureField } from '../../figures/figure-field';
import { zoneSideWords } from '../../figures/words';
import { Viewer } from '../walk/viewer';
import { GlassDialog } from './glass-dialog';
import { RoomFigures } from './room-figures';

const zoneSides = ['leftMm', 'rightMm', 'lowestMm', 'highestMm', 'nearestMm', 'farthestMm'] as const;

/** The figures of the room a scene is drawn for: its name, glass, home eye and viewing zone. */
@Component({
  selector: 'oriel-room-form',
  imports: [FigureField, MatButton, Icon, OpenedHeading, Term],
  templateUrl: './room-form.html',
  styleUrl: './room-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RoomForm {
  protected readonly store = inject(SceneStore);
  protected readonly room = inject(RoomFigures);
  protected readonly viewer = inject(Viewer);
  private readonly dialog = inject(MatDialog);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  protected readonly meanings = meanings;
  protected readonly zoneSides = zoneSides;
  protected readonly sideWords = zoneSideWords;
  protected readonly eyeLimits = computed(() => eyeLimits(this.store.document()));

  constructor() {
    effect(() => {
      const part = this.room.asked();
      if (!part || !this.room.shown()) return;
      setTimeout(() => this.host.querySelector<HTMLInputElement>(`[data-part="${part}"] input`)?.focus());
      this.room.asked.set(null);
    });
  }

  /** Looks from another place; the scene itself stays as it is. */
  protected look(eye: Partial<Point3>): void {
    this.viewer.standAt({ ...this.viewer.eye(), ...eye });
  }

  protected rename(name: string): void {
    this.store.edit(renameScene(name));
  }

  protected giveCredit(credit: string): void {
    this.store.edit(creditScene(credit));
  }

  protected glass(sides: Partial<Glass>): void {
    this.store.edit(setGlass({ ...this.store.document().glass, ...sides }), 'glass');
  }

  protected home(eye: Partial<Point3>): void {
    this.store.edit(setHomeEye({ ...this.store.document().homeEye, ...eye }), 'home eye');
  }

  protected zone(side: keyof ViewingZone, mm: number): void {
    this.store.edit(setZone({ [side]: mm }), `zone ${side}`);
  }

  protected async scaleToAnotherGlass(): Promise<void> {
    const dialog = this.dialog.open<GlassDialog, Glass, Glass>(GlassDialog, { data: this.store.document().glass });
    dialog.afterClosed().subscribe((glass) => glass && this.store.edit(scaleToGlass(glass)));
  }
}
