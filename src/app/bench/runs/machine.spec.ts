import { machineName, machineWords } from './machine';

// Browsers' words as their makers document them (MDN, User-Agent; memory).
const linux = 'Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/143.0.0.0 Safari/537.36';

describe('the name of a machine', () => {
  it.each([
    [`4 processors; screen 1920 x 1080; ${linux}`, 'Chromium 143 on Linux, 4 cores'],
    [`1 processors; screen 800 x 480; ${linux.replace('x86_64', 'aarch64').replace('Chrome', 'HeadlessChrome')}`, 'Chromium 143 on Linux on Arm, 1 core'],
    ['8 processors; screen 1 x 1; Mozilla/5.0 (Windows NT 10.0; Win64; x64; rv:144.0) Gecko/20100101 Firefox/144.0', 'Firefox 144 on Windows, 8 cores'],
    [
      '6 processors; screen 1 x 1; Mozilla/5.0 (iPhone; CPU iPhone OS 18_5 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.5 Mobile/15E148 Safari/604.1',
      'Safari 18 on iPad or iPhone, 6 cores',
    ],
    ['8 processors; screen 1 x 1; Mozilla/5.0 (Linux; Android 10; K) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/143.0.0.0 Mobile Safari/537.36', 'Chromium 143 on Android, 8 cores'],
    ['8 processors; screen 1 x 1; Mozilla/5.0 (Macintosh; Intel Mac OS X 10_15_7) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.5 Safari/605.1.15', 'Safari 18 on macOS, 8 cores'],
    ['the computer behind the hall', 'the computer behind the hall'],
  ])('of %s is %s', (words, name) => expect(machineName(words)).toBe(name));

  it('is read from the words recorded, which stay whole', () => {
    const navigator = { userAgent: linux, hardwareConcurrency: 2 } as Navigator;
    const words = machineWords(navigator, { width: 1440, height: 900 } as Screen);
    expect(words.endsWith(linux)).toBe(true);
    expect(machineName(words)).toBe('Chromium 143 on Linux, 2 cores');
  });
});
