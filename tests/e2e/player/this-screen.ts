import type { Page } from '@playwright/test';

export interface KeptScreen {
  readonly widthMm: number;
  readonly fieldDegrees: number;
}

/** Has the browser keep a set-up of its screen, as if someone had measured it, before any page opens. */
export async function keepScreen(page: Page, { widthMm, fieldDegrees }: KeptScreen = { widthMm: 600, fieldDegrees: 60 }): Promise<void> {
  await page.addInitScript(
    ([mm, field]) => {
      const { width, height } = window.screen;
      const kept = {
        version: 1,
        glass: { widthMm: mm, heightMm: (mm * height) / width },
        screenPx: { width, height },
        devicePxMm: mm / width / window.devicePixelRatio,
        measured: true,
        camera: { side: 'above', offsetMm: 0, downDegrees: 0, fieldDegrees: field, mirrored: false },
      };
      localStorage.setItem('oriel.screen', JSON.stringify(kept));
    },
    [widthMm, fieldDegrees] as const,
  );
}
