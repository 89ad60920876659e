import type { ElementRef } from '@angular/core';
import { ChangeDetectionStrategy, Component, DestroyRef, effect, inject, input, viewChild } from '@angular/core';
import type { EyeSample } from '../../tracking/eye-sample';
import { FaceTracking } from '../../tracking/face-tracking';
import { inksOf } from '../charts/inks';

/** The camera's picture with the landmarks and who is who drawn over. It is looked at on this screen only: nothing of it is sent or kept. */
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
    const end = tracking.watch((sample) => this.draw(sample));
    effect(() => {
      this.video().nativeElement.srcObject = tracking.picture();
    });
    inject(DestroyRef).onDestroy(() => {
      end();
      tracking.showLandmarks(false);
    });
  }

  private draw({ landmarks, frameWidth, frameHeight, viewer, others }: EyeSample): void {
    const canvas = this.over().nativeElement;
    if (canvas.width !== frameWidth || canvas.height !== frameHeight) {
      canvas.width = frameWidth;
      canvas.height = frameHeight;
    }
    const context = canvas.getContext('2d');
    if (!context) return;
    context.clearRect(0, 0, frameWidth, frameHeight);
    const inks = inksOf(canvas);
    const side = Math.max(2, frameWidth / 160);
    context.fillStyle = inks.far;
    if (landmarks) {
      for (let at = 0; at < landmarks.length; at += 2)
        context.fillRect(landmarks[at] - side / 2, landmarks[at + 1] - side / 2, side, side);
      const box = boxOf(landmarks);
      this.mark(context, (box.left + box.right) / 2, box.top - 3 * side, `person ${viewer}, followed`, 6 * side);
    }
    context.strokeStyle = context.fillStyle = inks.near;
    context.lineWidth = side / 2;
    for (const { id, eyePx } of others) {
      context.beginPath();
      context.arc(eyePx.x, eyePx.y, 6 * side, 0, 2 * Math.PI);
      context.stroke();
      this.mark(context, eyePx.x, eyePx.y - 8 * side, `person ${id}`, 6 * side);
    }
  }

  /** Words over a place, the right way round in a mirrored picture too, on a dark ground. */
  private mark(context: CanvasRenderingContext2D, x: number, y: number, words: string, heightPx: number): void {
    context.save();
    context.translate(x, Math.max(1.3 * heightPx, y));
    if (this.mirror()) context.scale(-1, 1);
    context.font = `${heightPx}px 'Instrument Sans', sans-serif`;
    context.textAlign = 'center';
    const half = context.measureText(words).width / 2 + heightPx / 3;
    context.fillStyle = 'rgb(0 0 0 / 70%)';
    context.fillRect(-half, -heightPx, 2 * half, 1.3 * heightPx);
    context.fillStyle = '#fff';
    context.fillText(words, 0, 0);
    context.restore();
  }
}

/** The box around points, x and y each. */
function boxOf(points: Float32Array): { left: number; right: number; top: number } {
  const box = { left: Infinity, right: -Infinity, top: Infinity };
  for (let at = 0; at < points.length; at += 2) {
    box.left = Math.min(box.left, points[at]);
    box.right = Math.max(box.right, points[at]);
    box.top = Math.min(box.top, points[at + 1]);
  }
  return box;
}
