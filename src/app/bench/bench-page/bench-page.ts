import { ChangeDetectionStrategy, Component, type OnInit, inject, input } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatOption, MatSelect } from '@angular/material/select';
import { type IsActiveMatchOptions, NavigationEnd, Router, RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { filter, map, startWith } from 'rxjs';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { BenchSubject } from '../subject/bench-subject';

/** A wall named in the address (`?wall=`) does not make it another place. */
const hereAndBelow: IsActiveMatchOptions = { paths: 'subset', queryParams: 'ignored', fragment: 'ignored', matrixParams: 'ignored' };
const hereAlone: IsActiveMatchOptions = { ...hereAndBelow, paths: 'exact' };

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
  private readonly router = inject(Router);
  /** Whether what stands on the bench matters here: runs have their own wall. */
  protected readonly choosing = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      startWith(null),
      map(() => !this.router.isActive('/bench/runs', hereAndBelow)),
    ),
    { requireSync: true },
  );
  protected readonly loading = new Submission();
  protected readonly places = [
    { path: '/bench', word: 'Live', here: hereAlone },
    { path: '/bench/runs', word: 'Runs and replay', here: hereAndBelow },
    { path: '/bench/mirror', word: 'Mirror test', here: hereAndBelow },
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
