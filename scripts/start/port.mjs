import { createServer } from 'node:net';
import { setTimeout as pause } from 'node:timers/promises';
import { freePort } from '../free-port.mjs';

const waitMs = 5000;

/**
 * The port to serve on: 0 becomes a free one. A killed start's server may take a moment to leave the port, so it is tried for 5 s.
 * @param {{ PORT: string, HOST: string }} settings @param {AbortSignal} signal
 * @throws Error that says which setting to change
 */
export async function usablePort({ PORT, HOST }, signal) {
  const port = Number(PORT);
  if (!Number.isInteger(port) || port < 0 || port > 65535)
    throw new Error(`PORT is ${PORT}; it must be a whole number from 0 to 65535.`);
  if (port === 0) return String(await freePort());
  for (const end = Date.now() + waitMs; ; await pause(200, undefined, { signal })) {
    const code = await whyNot(port, HOST);
    if (code === null) return PORT;
    if (code === 'EACCES')
      throw new Error(`This user may not open port ${port}. Choose one above 1023: PORT=4300 npm start`);
    if (code !== 'EADDRINUSE') throw new Error(`HOST is ${HOST}, which is no address of this machine (${code}).`);
    if (Date.now() > end)
      throw new Error(`Port ${port} is taken by another program. Choose another: PORT=${port + 1} npm start`);
  }
}

/** @returns {Promise<string | null>} the error's code */
const whyNot = (port, host) =>
  new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', (error) => resolve(error.code)).listen(port, host, () => probe.close(() => resolve(null)));
  });
