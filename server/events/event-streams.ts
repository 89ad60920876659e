import type { Response } from 'express';

/** So often something is said, so that no proxy takes the line for dead. */
const keepAliveMs = 20_000;

/** One line of server-sent events (WHATWG HTML, 9.2) to one listener. */
export interface EventStream {
  send(event: string): void;
  /** The listener's browser will ask again. */
  end(): void;
}

export interface EventStreams {
  /** Begins an answer that stays open until either side ends it; `onEnd` is called once, then. */
  open(response: Response, onEnd: () => void): EventStream;
  /** Ends them all, so that a stopping server is not held open; what is opened while it stops ends at once. */
  endAll(): void;
}

export function createEventStreams(draining: () => boolean): EventStreams {
  const open = new Set<EventStream>();
  return {
    open(response, onEnd) {
      response.writeHead(200, {
        'Content-Type': 'text/event-stream; charset=utf-8',
        'Cache-Control': 'no-cache, no-transform',
        'X-Accel-Buffering': 'no',
      });
      const write = (text: string) => void (response.writableEnded || response.write(text));
      const stream: EventStream = {
        send: (event) => write(`event: ${event}\ndata: {}\n\n`),
        end: () => void response.end(),
      };
      const keepAlive = setInterval(() => write(': still here\n\n'), keepAliveMs);
      const close = () => {
        clearInterval(keepAlive);
        open.delete(stream);
        onEnd();
      };
      open.add(stream);
      write(': here\n\n');
      // Whoever left while being admitted sends no word of it any more.
      if (response.closed || response.req.socket.destroyed) close();
      else response.once('close', close);
      if (draining()) stream.end();
      return stream;
    },
    endAll: () => open.forEach((stream) => stream.end()),
  };
}
