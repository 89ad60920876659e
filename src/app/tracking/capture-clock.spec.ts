import { CaptureClock } from './capture-clock';

describe('CaptureClock', () => {
  it('finds the difference of two clocks from unpaired instants, some missing on either side', () => {
    const clock = new CaptureClock();
    let time = 0;
    for (let frame = 0; frame < 90; frame++) {
      // A camera's intervals are never quite even.
      time += 33.3 + 1.7 * Math.sin(frame * 2.1) + (frame % 7);
      if (frame % 3 !== 0) clock.noteFrame(time);
      if (frame % 5 !== 0) clock.noteCapture(time + 7012.4 + 0.1 * Math.cos(frame));
    }
    expect(clock.offsetMs()).toBeCloseTo(7012.4, 0);
  });

  it('says nothing while too few agree', () => {
    const clock = new CaptureClock();
    for (let frame = 0; frame < 9; frame++) {
      clock.noteFrame(frame * 40 + frame * frame);
      clock.noteCapture(frame * 40 + frame * frame + 5);
    }
    expect(clock.offsetMs()).toBeNull();
  });
});
