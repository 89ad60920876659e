import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';
import { readMessage, type ReadMessage } from './read-message';

const kept = 200;
const largestBytes = 1024 * 1024;

export interface KeptMessage extends ReadMessage {
  readonly id: number;
}

/** A mail server for a machine without one: takes what is sent to it over SMTP, keeps it in memory, passes nothing on. */
export interface LocalSmtp {
  readonly url: string;
  /** The newest first. */
  messages(): readonly KeptMessage[];
  close(): Promise<void>;
}

/** Listens on a free port of the loopback address. */
export async function startLocalSmtp(): Promise<LocalSmtp> {
  let messages: KeptMessage[] = [];
  let taken = 0;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    disableReverseLookup: true,
    size: largestBytes,
    logger: false,
    onData(stream, _session, done) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('error', done);
      stream.on('end', () => {
        if (stream.sizeExceeded) return done(new Error('message too large'));
        messages = [{ id: ++taken, ...readMessage(Buffer.concat(chunks)) }, ...messages].slice(0, kept);
        done();
      });
    },
  });
  const listening = await new Promise<AddressInfo>((resolve, reject) => {
    server.on('error', reject);
    const socket = server.listen(0, '127.0.0.1', () => resolve(socket.address() as AddressInfo));
  });
  return {
    url: `smtp://127.0.0.1:${listening.port}`,
    messages: () => messages,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
