import { doubtOf, movedAtSpot } from './spot-doubt';

const at = (...places: number[]) => places.map((x) => ({ x, y: 0, z: 1500 }));

describe('a measurement at the marked spot', () => {
  it('is taken of somebody who sways, and doubted of one who steps: of 0 and 100 mm in turn the spread is 51.3 mm (by hand)', () => {
    const turns = (mm: number) => Array.from({ length: 20 }, (_, i) => (i % 2 ? mm : 0));
    expect(movedAtSpot(at(...turns(20)))).toBe(false);
    expect(movedAtSpot(at(...turns(100)))).toBe(true);
    expect(movedAtSpot(turns(100).map((y) => ({ x: 0, y, z: 1500 })))).toBe(true);
    expect(movedAtSpot(turns(100).map((far) => ({ x: 0, y: 0, z: 1500 + far })))).toBe(false);
  });

  it('is doubted where what stands is surer', () => {
    expect(doubtOf(at(0, 1, 2), 0.26, 0.035, '±2°')).toBe('You moved, or the tape is off: measure again. What stands now is surer, ±2°.');
    expect(doubtOf(at(0, 1, 2), 0.02, 0.035, '±2°')).toBe('');
    expect(doubtOf(at(0, 200, 0), 0.02, 0.035, '±2°')).toBe('You moved, or the tape is off: measure again.');
  });
});
