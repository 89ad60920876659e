import { startProduct } from './product';
import { keepSessions } from './sessions';

/** Playwright's global set-up: ORIEL_URL tells the tests where the product is served. With ORIEL_URL set already, they use what runs there. */
export default async function serveProduct(): Promise<() => Promise<void>> {
  const product = process.env['ORIEL_URL'] ? null : await startProduct();
  const url = (process.env['ORIEL_URL'] ??= product!.url);
  const sessions = await keepSessions(url).catch(async (error: unknown) => {
    await product?.stop();
    throw error;
  });
  return async () => {
    await sessions.forget();
    await product?.stop();
  };
}
