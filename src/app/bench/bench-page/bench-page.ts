import { ChangeDetectionStrategy, Component, type OnInit, inject, input } from '@angular/core';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatOption, MatSelect } from '@angular/material/select';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { BenchSubject } from '../subject/bench-subject';

/** The frame of the bench: what stands on it, and its four places. */
@Component({
  selector: 'oriel-bench-page',
  imports: [RouterOutlet, RouterLink, RouterLinkActive, MatFormField, MatLabel, MatSelect, MatOption, FailureNotice],
  templateUrl: './bench-page.html',
  styleUrl: './bench-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchPage implements OnInit {
  /** A wall to put on the bench, from the address. */
  readonly wall = input<string>();

  protected readonly bench = inject(BenchSubject);
  protected readonly loading = new Submission();
  protected readonly places = [
    { path: '/bench', word: 'Live', exact: true },
    { path: '/bench/runs', word: 'Runs and replay', exact: false },
    { path: '/bench/mirror', word: 'Mirror test', exact: false },
  ] as const;

  /** A value of its own: Material shows nothing for null. */
  protected readonly thisScreen = 'this-screen';

  protected choose(value: string): void {
    this.bench.choose(value === this.thisScreen ? null : value);
  }

  ngOnInit(): void {
    const wall = this.wall();
    if (wall) this.bench.choose(wall);
    void this.load();
  }

  protected load(): Promise<void> {
    return this.loading.run(() => this.bench.load());
  }
}
