import { ChangeDetectionStrategy, Component, type OnInit, computed, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { readHousehold } from '@oriel/shared/contracts/households';
import { type ViewerScale, keepViewerScale, listViewerScales, removeViewerScale } from '@oriel/shared/contracts/viewer-scales';
import { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { FigureField } from '../../figures/figure-field';
import { followingWords } from '../../figures/following-words';
import { plainMm } from '../../figures/words';
import { Means } from '../means/means';
import { ScaleMeasure } from '../measuring/scale-measure';
import { limitsOf } from './limits';
import { WallKeeper } from './wall-keeper';

const shape = TrackerTuning.shape;

/** The fourth step: the viewer's own scale, for all or for one person, kept by name. */
@Component({
  selector: 'oriel-wall-viewer-step',
  imports: [ReactiveFormsModule, MatButton, FailureNotice, TextField, FigureField, Means, ScaleMeasure],
  templateUrl: './viewer-step.html',
  styleUrls: ['./step.scss', './viewer-step.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ViewerStep implements OnInit {
  private readonly api = inject(Api);
  protected readonly keeper = inject(WallKeeper);
  protected readonly loading = new Submission();
  protected readonly form = inject(NonNullableFormBuilder).group({ name: ['', accordingTo(keepViewerScale.body.shape.name)] });
  protected readonly keeping = new Submission(this.form);
  protected readonly scales = signal<readonly ViewerScale[]>([]);
  /** The household's members, to be chosen from; a visitor's name may be typed as well. */
  protected readonly members = signal<readonly string[]>([]);
  protected readonly measuring = signal(false);
  protected readonly ipd = limitsOf(shape.ipdMm.shape.value);
  protected readonly factor = limitsOf(shape.scaleFactor);
  protected readonly tuning = computed(() => this.keeper.setUp()!.tuning);

  protected readonly follows = computed(() => followingWords(this.tuning()));

  protected readonly words = ({ ipdMm }: ViewerScale) => `${plainMm(ipdMm.value)} mm between the eyes, distances sure to ±${plainMm((100 * ipdMm.uncertainty) / ipdMm.value)} %`;
  protected readonly inUse = ({ ipdMm, scaleFactor }: ViewerScale) => ipdMm.value === this.tuning().ipdMm.value && scaleFactor === this.tuning().scaleFactor;

  ngOnInit(): void {
    void this.load();
  }

  protected load(): Promise<void> {
    return this.loading.run(async () => {
      const [{ scales }, { household }] = await Promise.all([this.api.call(listViewerScales, { params: this.here() }), this.api.call(readHousehold, { params: this.here() })]);
      this.scales.set(scales);
      this.members.set(household.members.map(({ name }) => name));
    });
  }

  protected use({ ipdMm, scaleFactor }: ViewerScale): void {
    this.keeper.tuning({ ipdMm, scaleFactor });
  }

  protected keep(): Promise<void> {
    return this.keeping.run(async () => {
      const { ipdMm, scaleFactor } = this.tuning();
      const { scales } = await this.api.call(keepViewerScale, { params: this.here(), body: { name: this.form.getRawValue().name, ipdMm, scaleFactor } });
      this.scales.set(scales);
      this.form.reset();
    });
  }

  protected forget(scaleId: string): Promise<void> {
    return this.loading.run(async () => this.scales.set((await this.api.call(removeViewerScale, { params: { ...this.here(), scaleId } })).scales));
  }

  private here() {
    return { householdId: this.keeper.wall()!.householdId };
  }
}
