import { homeWordAt } from './home-word';

const home = { x: 380, y: 700 };

describe('the word beside the home eye', () => {
  it('stands right above its cross', () => {
    expect(homeWordAt(home, [])).toEqual({ x: 9, y: -6 });
  });

  it('gives way to the words of an eye that walks past', () => {
    expect(homeWordAt(home, [{ left: 264, top: 686, width: 160, height: 13 }])).toEqual({ x: 9, y: 16 });
    expect(homeWordAt(home, [{ left: 385, top: 680, width: 160, height: 40 }])).toEqual({ x: -41, y: -6 });
  });

  it('is left out where all is taken', () => {
    expect(homeWordAt(home, [{ left: 300, top: 600, width: 200, height: 200 }])).toBeNull();
  });
});
