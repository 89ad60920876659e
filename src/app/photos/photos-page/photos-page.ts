import { ChangeDetectionStrategy, Component, type OnInit, computed, effect, inject, signal, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatSnackBar } from '@angular/material/snack-bar';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { createScene } from '@oriel/shared/contracts/scenes';
import type { Photo } from '@oriel/shared/contracts/photos';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Icon } from '../../core/icon/icon';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { ContactSheet } from '../contact-sheet/contact-sheet';
import { PhotoLibrary } from '../photo-library';
import type { PhotoWish } from '../photo-viewer/photo-viewer';
import { droppedFiles, picturesOf } from '../uploads/picked-files';
import { UploadList } from '../uploads/upload-list';
import { UploadQueue } from '../uploads/upload-queue';

const searchAfterMs = 250;

/** The household's photographs: look, upload, search, select; and the bin, which is the same sheet with another question. */
@Component({
  selector: 'oriel-photos-page',
  imports: [RouterLink, MatButton, Icon, FailureNotice, ContactSheet, UploadList],
  providers: [PhotoLibrary],
  templateUrl: './photos-page.html',
  styleUrl: './photos-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    '(document:paste)': 'paste($event)',
    '(dragover)': 'dragOver($event)',
    '(dragleave)': 'dropping.set(false)',
    '(drop)': 'drop($event)',
    '(document:keydown.escape)': 'clearSelection()',
  },
})
export class PhotosPage implements OnInit {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly snackBar = inject(MatSnackBar);
  protected readonly session = inject(Session);
  protected readonly library = inject(PhotoLibrary);
  protected readonly queue = inject(UploadQueue);
  protected readonly isBin = inject(ActivatedRoute).snapshot.data['bin'] === true;

  protected readonly search = signal('');
  protected readonly dropping = signal(false);
  protected readonly selected = signal<ReadonlySet<string>>(new Set());
  private readonly lastMarked = signal<string | null>(null);
  protected readonly loading = new Submission();
  protected readonly fetching = new Submission();
  protected readonly acting = new Submission();
  protected readonly isEmpty = computed(() => this.library.loaded() && this.library.photos().length === 0);
  private timer: ReturnType<typeof setTimeout> | undefined;

  constructor() {
    this.queue.kept.pipe(takeUntilDestroyed()).subscribe((photo) => this.library.take(photo));
    effect(() => {
      if (this.session.household()) untracked(() => this.clearSelection());
    });
  }

  ngOnInit(): void {
    void this.load();
  }

  /** Until the list answers what is being searched for by then. */
  protected load(): Promise<void> {
    return this.loading.run(async () => {
      let search: string;
      do {
        search = this.search();
        await this.library.open(search, this.isBin);
      } while (search !== this.search());
      this.fetchRest();
    });
  }

  protected searchFor(text: string): void {
    this.search.set(text);
    clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.load(), searchAfterMs);
  }

  protected fetchRest(): void {
    void this.fetching.run(() => this.library.rest());
  }

  protected mark({ photo, through }: { photo: Photo; through: boolean }): void {
    const photos = this.library.photos();
    const last = photos.findIndex((known) => known.id === this.lastMarked());
    const here = photos.indexOf(photo);
    const chosen = new Set(this.selected());
    if (through && last >= 0) for (const each of photos.slice(Math.min(last, here), Math.max(last, here) + 1)) chosen.add(each.id);
    else if (!chosen.delete(photo.id)) chosen.add(photo.id);
    this.lastMarked.set(photo.id);
    this.selected.set(chosen);
  }

  protected clearSelection(): void {
    this.selected.set(new Set());
  }

  protected choose(input: HTMLInputElement, folder = false): void {
    this.queue.add(folder ? picturesOf(input.files) : [...(input.files ?? [])]);
    input.value = '';
  }

  protected dragOver(event: DragEvent): void {
    if (this.isBin || !this.session.mayDesign() || !event.dataTransfer?.types.includes('Files')) return;
    event.preventDefault();
    this.dropping.set(true);
  }

  protected async drop(event: DragEvent): Promise<void> {
    this.dropping.set(false);
    if (this.isBin || !this.session.mayDesign() || !event.dataTransfer) return;
    event.preventDefault();
    this.queue.add(await droppedFiles(event.dataTransfer));
  }

  protected paste(event: ClipboardEvent): void {
    const files = [...(event.clipboardData?.files ?? [])];
    if (files.length > 0 && !this.isBin && this.session.mayDesign()) this.queue.add(files);
  }

  protected async open(photo: Photo): Promise<void> {
    const { PhotoViewer } = await import('../photo-viewer/photo-viewer');
    const viewer = this.dialog.open<InstanceType<typeof PhotoViewer>, unknown, PhotoWish>(PhotoViewer, {
      data: { photos: this.library.photos(), photo },
      width: '94vw',
      maxWidth: '1500px',
      height: '92vh',
      ariaLabel: photo.name,
    });
    viewer.afterClosed().subscribe((wish) => {
      if (wish?.wish === 'scene') void this.makeScene([wish.photo.id]);
      if (wish?.wish === 'bin') void this.bin([wish.photo.id]);
    });
  }

  protected makeScene(photoIds: readonly string[] = [...this.selected()]): Promise<void> {
    return this.acting.run(async () => {
      const params = { householdId: this.session.householdId() };
      const { scene } = await this.api.call(createScene, { params, body: { photoIds: [...photoIds] } });
      await this.router.navigate(['/compose', scene.id]);
    });
  }

  protected bin(ids: readonly string[] = [...this.selected()]): Promise<void> {
    return this.acting.run(async () => {
      await this.library.bin(ids);
      this.clearSelection();
      this.snackBar
        .open(ids.length === 1 ? 'Moved to the bin for 30 days' : `${ids.length} photos moved to the bin for 30 days`, 'Put back', { duration: 8000 })
        .onAction()
        .subscribe(() => void this.putBack(ids));
    });
  }

  protected restore(): Promise<void> {
    return this.acting.run(async () => {
      await this.library.restore([...this.selected()]);
      this.clearSelection();
    });
  }

  private putBack(ids: readonly string[]): Promise<void> {
    return this.acting.run(async () => {
      await this.library.restore(ids);
      await this.library.open(this.search(), this.isBin);
    });
  }
}
