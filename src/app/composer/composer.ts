import { LiveAnnouncer } from '@angular/cdk/a11y';
import { ChangeDetectionStrategy, Component, DestroyRef, type ElementRef, type TemplateRef, computed, effect, inject, input, signal, untracked, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Title } from '@angular/platform-browser';
import { Router, RouterLink } from '@angular/router';
import { toApiFailure } from '../core/api-failure';
import { FailureNotice } from '../core/failure-notice';
import { Icon } from '../core/icon/icon';
import { newId } from '../core/new-id';
import { Crumb } from '../shell/crumb';
import { PageBar } from '../shell/page-bar';
import { AddLayersDialog, type AddLayersTo } from './adding/add-layers-dialog';
import type { NewLayer } from './adding/layer-source';
import { MOST_LAYERS, addLayer } from './commands/stack-commands';
import { keyCommand } from './key-commands';
import { Ledger } from './ledger/ledger';
import { RoomFigures } from './ledger/room-figures';
import { ConflictDialog, type ConflictChoice } from './saving/conflict-dialog';
import type { MovedOn } from '../saving/autosave';
import { SceneKeeper } from './saving/scene-keeper';
import { saveWords } from '../saving/save-words';
import { SceneStore } from './scene-store';
import { DrawingSheet } from './sheet/drawing-sheet';
import { LayerAlpha } from './sheet/layer-alpha';
import { observedSize } from '../drawing/observed-size';
import { SheetView } from './sheet/sheet-view';
import { TitleBlock } from './sheet/title-block';
import { Viewer } from './walk/viewer';

/** Below these widths the title block leaves the sheet, and then the sheet becomes panes; px. */
const WIDE_PX = 1180;
const PHONE_PX = 760;

/** The page on which a scene is composed. */
@Component({
  selector: 'oriel-composer',
  imports: [MatButton, RouterLink, Crumb, FailureNotice, Icon, DrawingSheet, Ledger, TitleBlock],
  providers: [SceneStore, SceneKeeper, Viewer, SheetView, RoomFigures, LayerAlpha],
  templateUrl: './composer.html',
  styleUrl: './composer.scss',
  host: { '(document:keydown)': 'key($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Composer {
  readonly sceneId = input.required<string>();
  protected readonly store = inject(SceneStore);
  protected readonly keeper = inject(SceneKeeper);
  protected readonly viewer = inject(Viewer);
  private readonly bar = inject(PageBar);
  private readonly dialog = inject(MatDialog);
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly title = inject(Title);
  private readonly place = viewChild.required<TemplateRef<unknown>>('place');
  private readonly tools = viewChild.required<TemplateRef<unknown>>('tools');
  private readonly size = observedSize(() => this.desk());
  private readonly desk = viewChild<ElementRef<HTMLElement>>('desk');

  protected readonly mode = computed(() => {
    const { width } = this.size();
    return width === 0 || width >= WIDE_PX ? 'wide' : width > PHONE_PX ? 'middle' : 'phone';
  });
  protected readonly ledgerOpen = signal(false);
  protected readonly saveState = this.keeper.autosave.state;
  protected readonly saveText = computed(() =>
    this.store.readOnly() ? `Revision ${this.keeper.autosave.saved().revision}, view only` : saveWords(this.saveState(), this.keeper.autosave.saved()),
  );
  protected readonly trouble = computed(() => ['offline', 'failed', 'conflict'].includes(this.saveState().kind));
  protected readonly revision = computed(() => {
    const { revision, savedBy } = this.keeper.autosave.saved();
    return revision ? `${revision}, by ${savedBy}` : '';
  });
  private readonly conflict = computed(() => {
    const state = this.saveState();
    return state.kind === 'conflict' ? state.theirs : null;
  });
  private readonly clear = computed(() => this.store.faults().length === 0);

  constructor() {
    effect(() => {
      const sceneId = this.sceneId();
      untracked(() => void this.keeper.open(sceneId));
    });
    effect(() => {
      this.bar.place.set(this.place());
      this.bar.tools.set(this.tools());
    });
    effect(() => this.title.setTitle(`${this.store.document().name || 'Composer'}, Oriel`));
    effect(() => {
      const theirs = this.conflict();
      if (theirs) untracked(() => this.decide(theirs));
    });
    effect(() => {
      if (this.trouble()) void this.announcer.announce(this.saveText(), 'assertive');
    });
    let wasClear: boolean | null = null;
    effect(() => {
      const clear = this.clear();
      if (this.store.gesturing() || !this.keeper.scene()) return;
      if (wasClear !== null && wasClear !== clear) void this.announcer.announce(clear ? 'The scene is clear' : 'The scene is not clear');
      wasClear = clear;
    });
    inject(DestroyRef).onDestroy(() => this.bar.clear());
  }

  protected tryAgain(): void {
    void this.keeper.autosave.flush();
  }

  protected reopen(): void {
    void this.keeper.open(this.sceneId());
  }

  protected decide(theirs: MovedOn | null = this.conflict()): void {
    if (!theirs || this.dialog.openDialogs.length > 0) return;
    this.dialog
      .open<ConflictDialog, MovedOn, ConflictChoice>(ConflictDialog, { data: theirs, width: '560px' })
      .afterClosed()
      .subscribe((choice) => void this.follow(choice));
  }

  private async follow(choice: ConflictChoice | undefined): Promise<void> {
    try {
      if (choice === 'theirs') await this.keeper.takeTheirs();
      if (choice === 'over') await this.keeper.autosave.saveOver();
      if (choice === 'copy') await this.router.navigate(['/compose', await this.keeper.keepAsCopy()]);
    } catch (error) {
      const { message, remedy } = toApiFailure(error).failure;
      this.snackBar.open(`${message} ${remedy}`, 'Close');
    }
  }

  protected addLayers(): void {
    const scene = this.keeper.scene();
    if (!scene) return;
    const to = { sceneId: scene.id, householdId: scene.householdId, room: MOST_LAYERS - this.store.document().layers.length };
    this.dialog
      .open<AddLayersDialog, AddLayersTo, NewLayer[]>(AddLayersDialog, { data: to, width: '720px', maxWidth: '94vw' })
      .afterClosed()
      .subscribe((layers) => this.takeUp(layers ?? []));
  }

  private takeUp(layers: readonly NewLayer[]): void {
    if (layers.length === 0) return;
    const made = layers.map((layer) => ({ id: newId(), ...layer }));
    this.store.edit((document) => made.reduce((scene, { id, name, image }) => addLayer(id, name, image)(scene), document));
    this.store.select(made[made.length - 1].id);
  }

  protected walk(): void {
    if (this.viewer.walking()) this.viewer.goHome();
    else this.viewer.walk();
  }

  protected key(event: KeyboardEvent): void {
    if (this.dialog.openDialogs.length > 0) return;
    const command = keyCommand(event, this.store);
    if (!command) return;
    event.preventDefault();
    command.act();
    if (command.says) void this.announcer.announce(command.says);
  }
}
