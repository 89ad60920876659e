import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { someLayer } from '@oriel/shared/contracts/testing/some-scene';
import { LayerPicture } from './layer-picture';

/** An image of the page whose decoding ends when the test says so. */
class HeldImage {
  static asked: HeldImage[] = [];
  src = '';
  come: () => void = () => undefined;
  fail: () => void = () => undefined;
  decode(): Promise<void> {
    HeldImage.asked.push(this);
    return new Promise((resolve, reject) => Object.assign(this, { come: resolve, fail: reject }));
  }
}

describe('the picture of a layer', () => {
  let fixture: ComponentFixture<LayerPicture>;
  const shown = () => (fixture.nativeElement as HTMLElement).querySelector('img')?.getAttribute('src')?.split('/').at(-1);
  const settle = async () => {
    await vi.advanceTimersByTimeAsync(0);
    fixture.detectChanges();
  };

  beforeEach(() => {
    HeldImage.asked = [];
    vi.stubGlobal('Image', HeldImage);
    vi.useFakeTimers();
    fixture = TestBed.createComponent(LayerPicture);
    fixture.componentRef.setInput('image', someLayer({ id: 'meadow' }).image);
    fixture.componentRef.setInput('edge', 320);
    fixture.detectChanges();
  });
  afterEach(() => {
    vi.useRealTimers();
    vi.unstubAllGlobals();
  });

  it('keeps the sharper one when a coarser one, asked for before, comes after it', async () => {
    fixture.componentRef.setInput('edge', 1600);
    fixture.detectChanges();
    const [first, small] = HeldImage.asked;
    small.come();
    await settle();
    HeldImage.asked[2].come();
    await settle();
    expect(shown()).toBe('1600');
    first.come();
    await settle();
    expect(shown()).toBe('1600');
  });

  it('asks again for one that did not come, and no longer once it has left the page', async () => {
    HeldImage.asked[0].fail();
    await settle();
    expect((fixture.nativeElement as HTMLElement).textContent).toContain('Trying again');
    await vi.advanceTimersByTimeAsync(5000);
    expect(HeldImage.asked).toHaveLength(2);
    fixture.destroy();
    HeldImage.asked[1].fail();
    await vi.advanceTimersByTimeAsync(20_000);
    expect(HeldImage.asked).toHaveLength(2);
  });
});
