import { placeTags, type Area } from './place-tags';

const area: Area = { left: 0, right: 400, top: 0, bottom: 200 };
const tag = (x: number, y: number) => ({ x, y, width: 60, height: 12 });
const touch = (a: Area, b: Area) => a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

describe('words beside points', () => {
  it('go to the right where there is room, else to the left', () => {
    expect(placeTags([tag(100, 100)], area)[0].left).toBeGreaterThan(100);
    expect(placeTags([tag(390, 100)], area)[0].right).toBeLessThan(390);
  });
  it('touch neither each other nor another point, be the points ever so close', () => {
    const tags = [tag(100, 100), tag(104, 103), tag(110, 98), tag(101, 108)];
    const placed = placeTags(tags, area);
    placed.forEach((one, i) => {
      for (const other of placed.slice(i + 1)) expect(touch(one, other)).toBe(false);
      for (const { x, y } of tags) expect(touch(one, { left: x, right: x, top: y, bottom: y })).toBe(false);
    });
  });
});
