import { createServer, request, type IncomingMessage, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { Express } from 'express';

export interface Listener {
  readonly status: number;
  readonly server: Server;
  /** The events so far, by name. */
  events(): readonly string[];
  /** Whether the server ended the line. */
  hasEnded(): boolean;
  leave(): Promise<void>;
}

/** Opens a line of server-sent events as a browser does, over a socket. */
export async function listenTo(express: Express, path: string, cookie: string): Promise<Listener> {
  const server = createServer(express);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  const asked = request({ host: '127.0.0.1', port, path, headers: { Cookie: cookie, Accept: 'text/event-stream' } });
  const answer = await new Promise<IncomingMessage>((resolve, reject) =>
    asked.on('response', resolve).on('error', reject).end(),
  );
  let text = '';
  let ended = false;
  answer
    .setEncoding('utf8')
    .on('data', (chunk: string) => (text += chunk))
    .on('end', () => (ended = true))
    .on('error', () => undefined);
  return {
    status: answer.statusCode!,
    server,
    events: () => [...text.matchAll(/^event: (.*)\ndata: .*\n\n/gm)].map(([, name]) => name),
    hasEnded: () => ended,
    leave: async () => {
      asked.destroy();
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
    },
  };
}
