import { benchOf, middleColours, worstPlace } from './player/renderer-checks';
import { expect, test } from './fixtures';

test.use({ graphics: 'swiftshader' });

for (const name of ['three', 'css'] as const)
  for (const ratio of [1, 2])
    test(`${name} puts every layer within 0.1 px of the formula at ${ratio} device px to a px`, async ({ browser }) => {
      const page = await benchOf(browser, ratio);
      expect(await worstPlace(page, name, ratio)).toBeLessThan(0.1);
      for (const { seen, wanted } of await middleColours(page, ratio))
        seen.forEach((value, channel) => expect(Math.abs(value - wanted[channel])).toBeLessThanOrEqual(2));
      await page.context().close();
    });
