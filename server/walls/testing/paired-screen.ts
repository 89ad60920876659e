import type { Browser } from '../../testing/browser';
import type { TestApp } from '../../testing/test-app';
import { pairings } from '../pairing';

/** A browser that holds the wall's credential, as a screen that was paired does. @param on the server it asks, if another */
export async function pairedScreen(app: TestApp, wallId: string, on: TestApp = app): Promise<Browser> {
  const screen = on.browser();
  const { code, claim } = (await screen.ask('post', '/api/pairings')).body;
  await pairings(app.db).pair(wallId, code);
  const answer = await screen.ask('post', '/api/pairings/claims', { claim });
  if (answer.body.state !== 'paired') throw new Error(`could not pair: ${answer.text}`);
  return screen;
}
