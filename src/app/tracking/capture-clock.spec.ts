import { CaptureClock } from './capture-clock';

describe('CaptureClock', () => {
  it('finds the difference of two clocks from unpaired instants, some missing on either side', () => {
    const clock = new CaptureClock();
    let time = 0;
    for (let frame = 0; frame < 90; frame++) {
      // A camera's intervals are never quite even.
      time += 33.3 + 1.7 * Math.sin(frame * 2.1) + (frame % 7);
      if (frame % 3 !== 0) clock.noteFrame(time, time + 7012.4 + 20 + (frame % 4) * 15);
      if (frame % 5 !== 0) clock.noteCapture(time + 7012.4 + 0.1 * Math.cos(frame));
    }
    expect(clock.offsetMs()).toBeCloseTo(7012.4, 0);
  });

  it('says nothing while too few agree', () => {
    const clock = new CaptureClock();
    for (let frame = 0; frame < 9; frame++) {
      clock.noteFrame(frame * 40 + frame * frame, frame * 40 + frame * frame + 30);
      clock.noteCapture(frame * 40 + frame * frame + 5);
    }
    expect(clock.offsetMs()).toBeNull();
  });

  it('is not misled by an even camera of which few captures are told: no frame is answered before it was captured', () => {
    const clock = new CaptureClock();
    const [evenMs, apartMs, delayMs] = [1000 / 30, 12_345.6, 110];
    for (let frame = 0; frame < 190; frame++) clock.noteFrame(frame * evenMs, frame * evenMs + apartMs + delayMs);
    // Told of the end alone, when more of the frames before could be meant than of those to come.
    for (let frame = 180; frame < 192; frame++) clock.noteCapture(frame * evenMs + apartMs);
    const offMs = clock.offsetMs()! - apartMs;
    expect(offMs).toBeLessThanOrEqual(delayMs);
    expect(offMs).toBeGreaterThan(delayMs - 1000);
  });
});
