import { depthColour } from './depth-colour';

describe('colours of depth', () => {
  const glass = { widthMm: 1000, heightMm: 500 };
  it('run from the near token to the farthest one', () => {
    expect(depthColour(-300, glass)).toBe('var(--near)');
    expect(depthColour(5000, glass)).toBe('var(--farthest)');
    expect(depthColour(550, glass)).toBe('color-mix(in oklab, var(--far) 50.0%, var(--middle))');
  });
});
