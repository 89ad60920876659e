import type { ElementRef } from '@angular/core';
import { ChangeDetectionStrategy, Component, DestroyRef, effect, inject, input, viewChild } from '@angular/core';
import { FaceTracking } from '../../tracking/face-tracking';
import { inksOf } from '../charts/inks';

/** The camera's picture with the landmarks drawn over. It is looked at on this screen only: nothing of it is sent or kept. */
@Component({
  selector: 'oriel-camera-picture',
  template: `
    <video #video autoplay muted playsinline [class.mirrored]="mirror()" aria-label="The camera’s picture"></video>
    <canvas #over [class.mirrored]="mirror()" aria-hidden="true"></canvas>
  `,
  styles: `
    :host {
      display: block;
      position: relative;
      background: #000;
      line-height: 0;
    }
    video {
      width: 100%;
    }
    canvas {
      position: absolute;
      inset: 0;
      width: 100%;
      height: 100%;
    }
    .mirrored {
      transform: scaleX(-1);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CameraPicture {
  /** Shown as a mirror would, so that one moves the right way. */
  readonly mirror = input(false);
  private readonly video = viewChild.required<ElementRef<HTMLVideoElement>>('video');
  private readonly over = viewChild.required<ElementRef<HTMLCanvasElement>>('over');

  constructor() {
    const tracking = inject(FaceTracking);
    tracking.showLandmarks(true);
    const end = tracking.watch(({ landmarks, frameWidth, frameHeight }) =>
      this.draw(landmarks, frameWidth, frameHeight),
    );
    effect(() => {
      this.video().nativeElement.srcObject = tracking.picture();
    });
    inject(DestroyRef).onDestroy(() => {
      end();
      tracking.showLandmarks(false);
    });
  }

  private draw(landmarks: Float32Array | null, width: number, height: number): void {
    const canvas = this.over().nativeElement;
    if (canvas.width !== width || canvas.height !== height) {
      canvas.width = width;
      canvas.height = height;
    }
    const context = canvas.getContext('2d');
    if (!context) return;
    context.clearRect(0, 0, width, height);
    if (!landmarks) return;
    context.fillStyle = inksOf(canvas).far;
    const side = Math.max(2, width / 160);
    for (let at = 0; at < landmarks.length; at += 2)
      context.fillRect(landmarks[at] - side / 2, landmarks[at + 1] - side / 2, side, side);
  }
}
