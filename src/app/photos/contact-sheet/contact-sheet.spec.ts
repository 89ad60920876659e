import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { somePhoto } from '../testing';
import { ContactSheet } from './contact-sheet';

const viewPx = { clientWidth: 900, clientHeight: 600 };

class StillObserver {
  constructor(private readonly tell: () => void) {}
  observe(element: Element): void {
    for (const [name, value] of Object.entries(viewPx)) Object.defineProperty(element, name, { value });
    this.tell();
  }
  disconnect = (): void => undefined;
}

describe('the contact sheet on the page', () => {
  let fixture: ComponentFixture<ContactSheet>;
  const element = () => fixture.nativeElement as HTMLElement;
  const pictures = () => element().querySelectorAll('img').length;
  const scroll = (topPx: number, timeStamp: number) => {
    const scroller = element().querySelector('.scroller')!;
    scroller.scrollTop = topPx;
    scroller.dispatchEvent(Object.defineProperty(new Event('scroll'), 'timeStamp', { value: timeStamp }));
    fixture.detectChanges();
  };

  beforeEach(() => {
    vi.useFakeTimers();
    vi.stubGlobal('ResizeObserver', StillObserver);
    fixture = TestBed.createComponent(ContactSheet);
    fixture.componentRef.setInput('photos', Array.from({ length: 600 }, (_, i) => somePhoto(`${i}`, '2024-05-01')));
    fixture.componentRef.setInput('total', 6000);
    fixture.detectChanges();
    fixture.detectChanges();
  });
  afterEach(() => {
    vi.useRealTimers();
    vi.unstubAllGlobals();
  });

  it('is from the start about as long as it will be, and holds only what is near to be seen', () => {
    // Four photos of 3:2 fill a row of 900 px some 149 px high, so 600 make 150 rows; there will be ten times as many.
    const heightPx = parseFloat(element().querySelector<HTMLElement>('.rows')!.style.height);
    expect(heightPx).toBeGreaterThan(10 * 150 * 145);
    expect(heightPx).toBeLessThan(10 * 150 * 157);
    expect(element().querySelectorAll('.tile').length).toBeLessThan(40);
  });

  it('fetches no pictures that run past, and those in sight as soon as it is calm', async () => {
    expect(pictures()).toBeGreaterThan(0);
    scroll(20_000, 16);
    expect(element().querySelectorAll('.tile').length).toBeGreaterThan(0);
    expect(pictures()).toBe(0);
    await vi.advanceTimersByTimeAsync(150);
    fixture.detectChanges();
    expect(pictures()).toBe(element().querySelectorAll('.tile').length);
    scroll(20_100, 200);
    expect(pictures()).toBe(element().querySelectorAll('.tile').length);
  });
});
