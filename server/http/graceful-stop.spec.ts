import { Agent, createServer, request, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { pino } from 'pino';
import { describe, expect, it } from 'vitest';
import { createTestApp } from '../testing/test-app';
import { stopGracefully } from './graceful-stop';

const log = pino({ level: 'silent' });

async function listen(server: Server): Promise<number> {
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return (server.address() as AddressInfo).port;
}

const get = (port: number, path = '/', agent?: Agent) =>
  new Promise<{ status: number; body: string; connection?: string }>((resolve, reject) => {
    request({ host: '127.0.0.1', port, path, agent }, (response) => {
      let body = '';
      response
        .setEncoding('utf8')
        .on('data', (chunk: string) => (body += chunk))
        .on('end', () => resolve({ status: response.statusCode!, body, connection: response.headers.connection }))
        .on('error', reject);
    })
      .on('error', reject)
      .end();
  });

describe('stopping', () => {
  it('finishes the request in flight, takes no other, then closes everything in order', async () => {
    const events: string[] = [];
    let finish: () => void = () => undefined;
    const server = createServer((_request, response) => {
      finish = () => void response.end('whole');
    });
    const port = await listen(server);
    const agent = new Agent({ keepAlive: true });
    const slow = get(port, '/', agent);
    await new Promise((resolve) => server.once('request', resolve));

    const step = (name: string) => async () => void events.push(name);
    const stopped = new Promise<number>((resolve) => {
      void stopGracefully({ server, log, steps: [step('jobs'), step('database')], exit: resolve });
    });
    await expect(get(port)).rejects.toThrow(/ECONNREFUSED/);
    expect(events).toEqual([]);
    finish();
    expect((await slow).body).toBe('whole');
    agent.destroy();
    expect(await stopped).toBe(0);
    expect(events).toEqual(['jobs', 'database']);
  });

  it('goes on closing when one thing fails to close', async () => {
    const events: string[] = [];
    const server = createServer();
    await listen(server);
    const steps = [() => Promise.reject(new Error('stuck')), async () => void events.push('database')];
    const code = await new Promise<number>((resolve) => void stopGracefully({ server, log, steps, exit: resolve }));
    expect(code).toBe(0);
    expect(events).toEqual(['database']);
  });

  it('cuts off what does not finish in time', async () => {
    const server = createServer(() => undefined);
    const port = await listen(server);
    const hanging = get(port).catch((error: Error) => error.message);
    await new Promise((resolve) => server.once('request', resolve));
    const code = await new Promise<number>((resolve) => void stopGracefully({ server, log, steps: [], exit: resolve, hardStopAfterMs: 50 }));
    expect(code).toBe(1);
    expect(await hanging).toMatch(/socket hang up|ECONNRESET/);
  });

  it('while it stops, readiness says no and kept-alive connections end', async () => {
    let draining = false;
    const app = await createTestApp({ draining: () => draining });
    const server = createServer(app.express);
    const port = await listen(server);
    const agent = new Agent({ keepAlive: true });
    expect(await get(port, '/ready', agent)).toMatchObject({ status: 200, body: '{"state":"ready"}' });
    draining = true;
    const last = await get(port, '/ready', agent);
    expect(last).toMatchObject({ status: 503, connection: 'close' });
    expect(JSON.parse(last.body)).toMatchObject({ code: 'not-ready' });
    expect((await get(port, '/health', agent)).status).toBe(200);
    agent.destroy();
    server.close();
    await app.close();
  });
});
