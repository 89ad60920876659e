import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import { requestCamera } from '../../tracking/camera-request';
import { CAMERAS } from '../../tracking/tracking-surroundings';
import type { TrackingState } from '../../tracking/tracking-state';
import { trackingWords } from '../../tracking/tracking-words';

/** The camera's live picture, on this page only. The same size is asked for as for following, so that what is measured holds there too. */
@Injectable()
export class LiveCamera {
  private readonly cameras = inject(CAMERAS);
  private readonly state = signal<TrackingState>('off');
  private destroyed = false;

  readonly stream = signal<MediaStream | null>(null);
  readonly words = computed(() => (this.state() === 'off' || this.stream() ? '' : trackingWords[this.state()]));

  constructor() {
    inject(DestroyRef).onDestroy(() => {
      this.destroyed = true;
      this.stop();
    });
  }

  async start(): Promise<void> {
    this.stop();
    this.state.set('asking');
    const answer = await requestCamera(this.cameras);
    if (!answer.given) return this.state.set(answer.why);
    this.stream.set(answer.stream);
    if (this.destroyed) return this.stop();
    answer.stream.getVideoTracks()[0].addEventListener('ended', () => {
      if (this.stream() === answer.stream) this.state.set('no-camera');
      this.stop();
    });
  }

  stop(): void {
    for (const track of this.stream()?.getTracks() ?? []) track.stop();
    this.stream.set(null);
    if (this.state() === 'asking') this.state.set('off');
  }
}
