import { DOCUMENT, DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import type { Point3 } from '@oriel/shared/projection/types';
import { eyeLimits, clamp } from '../commands/limits';
import { SceneStore } from '../scene-store';
import { TURN_MS, walkPath } from './walk-path';

/** The simulated viewer of the sheet: at the home eye, somewhere they were put, or walking past. */
@Injectable()
export class Viewer {
  private readonly store = inject(SceneStore);
  private readonly window = inject(DOCUMENT).defaultView;
  private readonly put = signal<Point3 | null>(null);
  private frame = 0;

  readonly walking = signal(false);
  readonly playing = signal(false);
  /** Where on the path, in turns from 0 to 1. */
  readonly turn = signal(0);
  readonly stillness = this.window?.matchMedia?.('(prefers-reduced-motion: reduce)').matches ?? false;

  readonly atHome = computed(() => !this.walking() && this.put() === null);
  readonly eye = computed<Point3>(() => {
    const { zone, homeEye } = this.store.document();
    const eye = this.walking() ? walkPath(zone, homeEye, this.turn()) : (this.put() ?? homeEye);
    return { ...eye, z: clamp(eye.z, eyeLimits(this.store.document())) };
  });

  constructor() {
    inject(DestroyRef).onDestroy(() => this.pause());
  }

  /** Starts the walk where it left off; under reduced motion it waits to be moved by hand. */
  walk(): void {
    this.put.set(null);
    this.walking.set(true);
    if (!this.stillness) this.play();
  }

  play(): void {
    if (this.playing() || !this.window) return;
    this.playing.set(true);
    let before: number | null = null;
    const step = (now: number) => {
      this.turn.update((turn) => (turn + (before === null ? 0 : now - before) / TURN_MS) % 1);
      before = now;
      this.frame = this.window?.requestAnimationFrame(step) ?? 0;
    };
    this.frame = this.window.requestAnimationFrame(step);
  }

  pause(): void {
    this.playing.set(false);
    this.window?.cancelAnimationFrame(this.frame);
  }

  moveTo(turn: number): void {
    this.pause();
    this.walking.set(true);
    this.turn.set(Math.min(Math.max(turn, 0), 1));
  }

  standAt(eye: Point3): void {
    this.pause();
    this.walking.set(false);
    this.put.set(eye);
  }

  goHome(): void {
    this.pause();
    this.walking.set(false);
    this.put.set(null);
  }
}
