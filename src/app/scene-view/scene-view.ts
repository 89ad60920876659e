import { ChangeDetectionStrategy, Component, DestroyRef, type ElementRef, afterNextRender, computed, inject, input, signal, viewChild } from '@angular/core';
import type { DerivativeEdge } from '@oriel/shared/contracts/photos';
import { layerImageFile } from '@oriel/shared/contracts/scenes';
import type { Layer, SceneDocument } from '@oriel/shared/contracts/scenes';
import type { Point3 } from '@oriel/shared/projection/types';
import { addressOf } from '../core/api';
import { layerMotion } from './layer-motion';

const settleMs = 180;
/** Pictures are fetched when the window is as near to what is seen of the page, px. */
const nearPx = 800;

/**
 * A scene as seen through a small window, moving as the pointer passes over it like a viewer walking by. It appears whole: when
 * the pictures of all its layers are decoded. Still under reduced motion. `edge` is the long edge of the pictures to load, px.
 */
@Component({
  selector: 'oriel-scene-view',
  templateUrl: './scene-view.html',
  styleUrl: './scene-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(pointermove)': 'look($event)', '(pointerleave)': 'goHome()' },
})
export class SceneView {
  readonly document = input.required<SceneDocument>();
  readonly label = input.required<string>();
  readonly edge = input<DerivativeEdge>(800);
  /** Where a layer's picture is, for scenes that do not come from the server's household. */
  readonly pictureOf = input<(layer: Layer, edge: number) => string>((layer, edge) =>
    addressOf(layerImageFile, { imageId: layer.image.id, edge }),
  );

  private readonly glassElement = viewChild.required<ElementRef<HTMLElement>>('glass');
  /** Whether this window is, or was, near enough to what is seen of the page to be worth its pictures. */
  protected readonly near = signal(false);
  /** The addresses of pictures that are decoded, or will not come. */
  private readonly settled = signal<ReadonlySet<string>>(new Set());
  private readonly still = matchMedia('(prefers-reduced-motion: reduce)');
  private readonly eye = signal<Point3 | null>(null);
  private aim: Point3 | null = null;
  private frame = 0;
  private lastMs = 0;

  protected readonly layers = computed(() =>
    this.document()
      .layers.map((layer, index) => ({ layer, index }))
      .filter(({ layer }) => layer.shown)
      .sort((a, b) => b.layer.depthMm - a.layer.depthMm || a.index - b.index)
      .map(({ layer }) => ({ layer, picture: this.pictureOf()(layer, this.edge()), box: this.boxOf(layer) })),
  );
  protected readonly whole = computed(() => this.layers().every(({ picture }) => this.settled().has(picture)));
  protected readonly motions = computed(() => {
    const { homeEye, glass } = this.document();
    const eye = this.eye() ?? homeEye;
    return this.layers().map(({ layer }) => {
      const { scale, x, y } = layerMotion(homeEye, eye, layer.depthMm);
      return `translate(${(100 * x) / glass.widthMm}%, ${(-100 * y) / glass.heightMm}%) scale(${scale})`;
    });
  });

  constructor() {
    const destroyed = inject(DestroyRef);
    destroyed.onDestroy(() => cancelAnimationFrame(this.frame));
    afterNextRender(() => {
      const observer = new IntersectionObserver(
        ([{ isIntersecting }]) => {
          if (!isIntersecting) return;
          this.near.set(true);
          observer.disconnect();
        },
        { rootMargin: `${nearPx}px` },
      );
      observer.observe(this.glassElement().nativeElement);
      destroyed.onDestroy(() => observer.disconnect());
    });
  }

  /** Takes the pointer's place over the window as a viewer's place in the viewing zone. */
  look(event: PointerEvent): void {
    if (this.still.matches) return;
    const box = this.glassElement().nativeElement.getBoundingClientRect();
    this.lookFrom((event.clientX - box.left) / box.width, (event.clientY - box.top) / box.height);
  }

  /** `across` and `down` in 0..1 of the viewing zone, from its left and from its top. */
  lookFrom(across: number, down: number): void {
    if (this.still.matches) return;
    const { zone, homeEye } = this.document();
    const within = (share: number) => Math.min(1, Math.max(0, share));
    this.moveTo({
      x: zone.leftMm + within(across) * (zone.rightMm - zone.leftMm),
      y: zone.highestMm - within(down) * (zone.highestMm - zone.lowestMm),
      z: homeEye.z,
    });
  }

  /** A picture has come: decoded before it counts, so that no layer appears after the others. */
  protected async came(picture: HTMLImageElement, address: string): Promise<void> {
    await picture.decode().catch(() => undefined);
    this.settle(address);
  }

  protected settle(address: string): void {
    this.settled.update((before) => new Set(before).add(address));
  }

  protected goHome(): void {
    this.moveTo(this.document().homeEye);
  }

  private boxOf({ placed }: Layer) {
    const { glass } = this.document();
    return {
      left: 50 + (100 * (placed.xMm - placed.widthMm / 2)) / glass.widthMm,
      top: 50 - (100 * (placed.yMm + placed.heightMm / 2)) / glass.heightMm,
      width: (100 * placed.widthMm) / glass.widthMm,
      height: (100 * placed.heightMm) / glass.heightMm,
    };
  }

  private moveTo(aim: Point3): void {
    this.aim = aim;
    if (this.frame) return;
    this.lastMs = performance.now();
    this.frame = requestAnimationFrame((now) => this.step(now));
  }

  private step(nowMs: number): void {
    const aim = this.aim ?? this.document().homeEye;
    const from = this.eye() ?? this.document().homeEye;
    const share = 1 - Math.exp(-Math.max(0, nowMs - this.lastMs) / settleMs);
    this.lastMs = nowMs;
    const eye = { x: from.x + (aim.x - from.x) * share, y: from.y + (aim.y - from.y) * share, z: from.z + (aim.z - from.z) * share };
    const arrived = Math.hypot(aim.x - eye.x, aim.y - eye.y, aim.z - eye.z) < 0.5;
    this.eye.set(arrived ? aim : eye);
    this.frame = arrived ? 0 : requestAnimationFrame((now) => this.step(now));
  }
}
