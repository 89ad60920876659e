import { existsSync } from 'node:fs';

/** Debian's Chromium: nothing is downloaded. */
export const chromiumPath =
  process.env['CHROME_BIN'] ?? ['/usr/bin/chromium', '/usr/bin/chromium-browser'].find(existsSync) ?? 'chromium';

/**
 * How pictures reach the screen in a test. `software` composites without a graphics processor, as a small computer does, and is fast for
 * CSS; `swiftshader` offers WebGL, drawn by the processor, and makes everything slower.
 */
export type Graphics = 'software' | 'swiftshader';

const graphicsArguments: Record<Graphics, readonly string[]> = {
  software: ['--disable-gpu'],
  swiftshader: ['--use-gl=angle', '--use-angle=swiftshader', '--enable-unsafe-swiftshader'],
};

/**
 * Chromium's arguments: a fake camera that plays `video` over and over (Chromium's own test pattern where null), the question for it
 * answered with yes, and no traffic of the browser's own.
 */
export function chromiumArguments(graphics: Graphics, video: string | null): string[] {
  return [
    '--headless=new',
    '--no-sandbox',
    '--disable-quic',
    '--no-first-run',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
    '--use-fake-device-for-media-stream',
    '--use-fake-ui-for-media-stream',
    ...(video === null ? [] : [`--use-file-for-fake-video-capture=${video}`]),
    ...graphicsArguments[graphics],
  ];
}

/** Playwright's own choices that would override ours. */
export const ignoredDefaults = ['--headless', '--hide-scrollbars', '--mute-audio'];
