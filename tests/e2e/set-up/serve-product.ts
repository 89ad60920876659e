import { startProduct } from './product';

/** Playwright's global set-up: ORIEL_URL tells the tests where the product is served. With ORIEL_URL set already, they use what runs there. */
export default async function serveProduct(): Promise<(() => Promise<void>) | undefined> {
  if (process.env['ORIEL_URL']) return undefined;
  const product = await startProduct();
  process.env['ORIEL_URL'] = product.url;
  return () => product.stop();
}
