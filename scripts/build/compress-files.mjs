import { readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { extname, join } from 'node:path';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';

const worthIt = new Set(['.js', '.css', '.json', '.svg', '.wasm', '.bin']);
/** One packet holds as much. */
const leastBytes = 1400;
/** The highest takes ten times as long and saves a twentieth. */
const quality = 9;

/**
 * Puts beside each file of the built page the same compressed, as `.br` and `.gz`, wherever that saves a tenth: what is sent a thousand times is
 * compressed once. The server (server/http/serve-page.ts) sends it to whoever takes it.
 * @param {string} webDir
 */
export async function compressFiles(webDir) {
  for (const name of readdirSync(webDir, { recursive: true, encoding: 'utf8' })) {
    const path = join(webDir, name);
    if (!worthIt.has(extname(path)) || !statSync(path).isFile()) continue;
    const bytes = readFileSync(path);
    if (bytes.length < leastBytes) continue;
    const params = { [constants.BROTLI_PARAM_QUALITY]: quality, [constants.BROTLI_PARAM_SIZE_HINT]: bytes.length };
    const [br, gz] = await Promise.all([promisify(brotliCompress)(bytes, { params }), promisify(gzip)(bytes, { level: quality })]);
    if (br.length < 0.9 * bytes.length) writeFileSync(`${path}.br`, br);
    if (gz.length < 0.9 * bytes.length) writeFileSync(`${path}.gz`, gz);
  }
}
