import type { RequestHandler } from 'express';

/** While the server stops, a kept-alive connection ends with the answer under way instead of holding the server open. */
export const closeWhenDraining =
  (draining: () => boolean): RequestHandler =>
  (_request, response, next) => {
    if (draining()) response.setHeader('Connection', 'close');
    response.once('finish', () => {
      if (draining()) response.req.socket.end();
    });
    next();
  };
