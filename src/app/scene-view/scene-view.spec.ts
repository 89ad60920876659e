import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { someScene } from '@oriel/shared/contracts/testing/some-scene';
import { SceneView } from './scene-view';

/** An observer of the page that says the window is near as soon as the test wants it. */
class HeldObserver {
  static last: HeldObserver;
  observe = () => undefined;
  disconnect = () => undefined;
  constructor(readonly tell: (entries: { isIntersecting: boolean }[]) => void) {
    HeldObserver.last = this;
  }
}

describe('a scene in a small window', () => {
  let fixture: ComponentFixture<SceneView>;
  const pictures = () => [...(fixture.nativeElement as HTMLElement).querySelectorAll('img')];
  const whole = () => (fixture.nativeElement as HTMLElement).querySelector('.layers.whole') !== null;

  beforeEach(async () => {
    vi.stubGlobal('IntersectionObserver', HeldObserver);
    vi.stubGlobal('matchMedia', () => ({ matches: false }));
    fixture = TestBed.createComponent(SceneView);
    fixture.componentRef.setInput('document', someScene);
    fixture.componentRef.setInput('label', someScene.name);
    await fixture.whenStable();
  });
  afterEach(() => vi.unstubAllGlobals());

  it('asks for no picture while it is far from what is seen of the page', async () => {
    HeldObserver.last.tell([{ isIntersecting: false }]);
    await fixture.whenStable();
    expect(pictures()).toHaveLength(0);
  });

  it('is seen when the last of its layers is decoded, and not before; one that does not come holds up nothing', async () => {
    HeldObserver.last.tell([{ isIntersecting: true }]);
    await fixture.whenStable();
    expect(pictures()).toHaveLength(someScene.layers.length);
    const [first, second, third] = pictures();
    let decoded: () => void = () => undefined;
    Object.assign(first, { decode: () => Promise.resolve() });
    Object.assign(second, { decode: () => new Promise<void>((resolve) => (decoded = resolve)) });
    first.dispatchEvent(new Event('load'));
    second.dispatchEvent(new Event('load'));
    third.dispatchEvent(new Event('error'));
    await fixture.whenStable();
    expect(whole()).toBe(false);
    decoded();
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
    expect(whole()).toBe(true);
  });
});
