import { IntervalJudge } from './interval-judge';
import { Meter } from './meter';

describe('Meter', () => {
  it('counts the frames of the last second', () => {
    const meter = new Meter();
    for (let tMs = 0; tMs <= 5000; tMs += 20) meter.frame(tMs);
    expect(meter.framesPerSecond(5000)).toBe(50);
    expect(meter.framesPerSecond(9000)).toBe(0);
  });

  it('gives the median time from capture to drawing, each capture counted once', () => {
    const meter = new Meter();
    expect(meter.captureToDrawnMs()).toBeNull();
    [30, 50, 40].forEach((delay, i) => {
      meter.drawn(i * 100, i * 100 + delay);
      meter.drawn(i * 100, i * 100 + delay + 16);
    });
    expect(meter.captureToDrawnMs()).toBe(40);
  });
});

describe('IntervalJudge', () => {
  const judged = (intervalMs: number) => {
    const judge = new IntervalJudge();
    const answers: boolean[] = [];
    for (let tMs = 0; tMs < 3000; tMs += intervalMs) {
      const answer = judge.frame(tMs);
      if (answer !== undefined) answers.push(answer);
    }
    return answers;
  };

  it('says once, after a second, whether frames come too seldom', () => {
    expect(judged(1000 / 60)).toEqual([false]);
    expect(judged(50)).toEqual([true]);
  });

  it('does not mind single long frames', () => {
    const judge = new IntervalJudge();
    let tMs = 0;
    let answer: boolean | undefined;
    for (let i = 0; answer === undefined; i++) answer = judge.frame((tMs += i % 10 === 3 ? 90 : 16));
    expect(answer).toBe(false);
  });
});
