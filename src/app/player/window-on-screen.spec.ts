import { windowOnScreen } from './window-on-screen';

const screen = { width: 1920, height: 1080 };
const full = { innerWidth: 1920, innerHeight: 1080, outerWidth: 1920, outerHeight: 1080, screenX: 0, screenY: 0, devicePixelRatio: 1, screen };

describe('windowOnScreen', () => {
  it('is centred on the screen when it fills it', () => {
    expect(windowOnScreen(full, 0.25)).toEqual({ widthPx: 1920, heightPx: 1080, pxPerMm: 4, deviceRatio: 1, centreMm: { x: 0, y: 0 } });
  });

  it('is centred then even where the browser reports its window as it was before', () => {
    expect(windowOnScreen({ ...full, screenX: 10, screenY: 10 }, 0.25).centreMm).toEqual({ x: 0, y: 0 });
  });

  it('places a window by its corner, its frame and the bars on top', () => {
    // Inner area from (110, 170) to (1110, 770): its middle is 350 px left of the screen's and 70 px above it.
    const area = windowOnScreen({ ...full, screenX: 100, screenY: 80, outerWidth: 1020, outerHeight: 690, innerWidth: 1000, innerHeight: 600 }, 0.25);
    expect(area.centreMm.x).toBeCloseTo(-350 / 4, 9);
    expect(area.centreMm.y).toBeCloseTo((540 - 470) / 4, 9);
  });

  it('believes a browser that says where its inner area lies', () => {
    const area = windowOnScreen({ ...full, innerWidth: 1000, innerHeight: 600, mozInnerScreenX: 460, mozInnerScreenY: 340 }, 0.25);
    expect(area.centreMm.x).toBeCloseTo(0, 9);
    expect(area.centreMm.y).toBeCloseTo(-100 / 4, 9);
  });

  it('keeps lengths when the page is zoomed: px grow, device pixels stay', () => {
    expect(windowOnScreen({ ...full, devicePixelRatio: 2, innerWidth: 960, innerHeight: 540 }, 0.25).pxPerMm).toBe(2);
  });
});
