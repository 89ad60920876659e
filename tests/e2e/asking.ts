import type { Page } from '@playwright/test';
import type { Scene } from '@oriel/shared/contracts/scenes';

/** Asks the server as the page itself would, forgery token and all. A string that begins with `data:` travels as a file. */
export async function ask<T>(page: Page, method: string, path: string, body?: unknown): Promise<T> {
  return page.evaluate(
    async ([way, address, content]) => {
      const token = /XSRF-TOKEN=([^;]+)/.exec(document.cookie)?.[1] ?? '';
      const headers: Record<string, string> = { 'x-xsrf-token': decodeURIComponent(token) };
      let text: BodyInit | undefined;
      if (typeof content === 'string') {
        const bytes = Uint8Array.from(atob(content.slice(content.indexOf(',') + 1)), (letter) => letter.charCodeAt(0));
        const form = new FormData();
        form.append('file', new Blob([bytes], { type: 'image/png' }), 'marker.png');
        text = form;
      } else if (content !== undefined) {
        headers['content-type'] = 'application/json';
        text = JSON.stringify(content);
      }
      const reply = await fetch(address, { method: way, headers, body: text });
      if (!reply.ok) throw new Error(`${way} ${address}: ${reply.status} ${await reply.text()}`);
      return (reply.status === 204 ? null : await reply.json()) as never;
    },
    [method, path, body] as const,
  );
}

export async function householdId(page: Page): Promise<string> {
  const { account } = await ask<{ account: { memberships: { householdId: string }[] } }>(page, 'GET', '/api/me');
  return account.memberships[0].householdId;
}

/** The first scene the demo household has. Call on a page that is signed in. */
export async function demoScene(page: Page): Promise<Scene> {
  const { scenes } = await ask<{ scenes: Scene[] }>(page, 'GET', `/api/households/${await householdId(page)}/scenes`);
  const scene = scenes.find(({ document }) => document.name === 'October on the ridge');
  if (!scene) throw new Error('The demo has no scene of the ridge.');
  return scene;
}
