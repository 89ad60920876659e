import { spreadLabels, type Label } from './labels';

const label = (id: string, x: number, y: number): Label => ({ id, x, y, width: 60, height: 13, least: 0, most: 240 });

describe('labels', () => {
  it('stay where they are asked for when there is room', () => {
    expect(spreadLabels([label('a', 0, 0), label('b', 0, 20)])).toEqual(new Map([['a', 0], ['b', 0]]));
  });

  it('move to the right past those before them, then to the left', () => {
    const spread = spreadLabels([label('a', 100, 0), label('b', 100, 5), { ...label('c', 100, 9), most: 200 }]);
    expect(spread.get('b')).toBe(170);
    expect(spread.get('c')).toBe(30);
  });

  it('are left out where there is none', () => {
    expect([...spreadLabels([label('a', 0, 0), label('b', 0, 5), label('c', 0, 8)].map((one) => ({ ...one, most: 80 }))).keys()]).toEqual(['a', 'b']);
  });
});
