import { TestBed } from '@angular/core/testing';
import { EdgeMarks } from './edge-marks';

/** A canvas as the HTML standard has it: giving it a width or height, even the same one, empties it. */
function watchDrawing() {
  const drawn = new Map<HTMLCanvasElement, boolean>();
  for (const side of ['width', 'height'] as const) {
    const own = Object.getOwnPropertyDescriptor(HTMLCanvasElement.prototype, side)!;
    vi.spyOn(HTMLCanvasElement.prototype, side, 'set').mockImplementation(function (this: HTMLCanvasElement, px) {
      own.set!.call(this, px);
      drawn.set(this, false);
    });
  }
  vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockImplementation(function (this: HTMLCanvasElement) {
    const draw = () => drawn.set(this, true);
    return { drawImage: draw, clearRect: () => undefined, fillRect: () => undefined } as unknown as CanvasRenderingContext2D;
  } as never);
  return drawn;
}

describe('a held picture', () => {
  afterEach(() => vi.restoreAllMocks());

  it('is seen, and so is its enlargement, before any line is moved', () => {
    const drawn = watchDrawing();
    const fixture = TestBed.createComponent(EdgeMarks);
    fixture.componentRef.setInput('picture', { width: 640, height: 480 });
    fixture.componentRef.setInput('places', { left: 224, right: 416 });
    TestBed.tick();
    const canvases = [...(fixture.nativeElement as HTMLElement).querySelectorAll('canvas')];
    expect(canvases.map((canvas) => canvas.width)).toEqual([640, 132]);
    expect(canvases.map((canvas) => drawn.get(canvas))).toEqual([true, true]);
  });
});
