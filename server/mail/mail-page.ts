import { Router, type Request } from 'express';
import { notFound } from '../http/failure';
import { goneView, messageView, messagesView } from './mail-views';
import type { KeptMessage } from './local-smtp';

/** The page that shows the mail this server did not send. */
export interface MailPage {
  readonly address: string;
  /** Whether this asker may see it: it shows links that reset passwords. */
  isOpenTo(request: Request): boolean;
  readonly router: Router;
}

const address = '/mail';
const loopback = /^(127\.\d+\.\d+\.\d+|::1|::ffff:127\.\d+\.\d+\.\d+)$/;
const localNames = new Set(['localhost', '127.0.0.1', '[::1]']);

/**
 * Whether somebody at this very machine asks: from a loopback address, not passed on by a proxy that the settings do not name, and under a
 * local name (else a page elsewhere could point a name of its own at this machine and read along: DNS rebinding).
 */
function asksFromHere(request: Request): boolean {
  const passedOnUnnamed = request.app.get('trust proxy') === 0 && request.get('x-forwarded-for') !== undefined;
  return !passedOnUnnamed && loopback.test(request.ip ?? '') && localNames.has(request.hostname);
}

/** @param toAnyone whether the settings show it to whoever can reach the server. */
export function createMailPage(messages: () => readonly KeptMessage[], toAnyone: boolean): MailPage {
  const isOpenTo = (request: Request) => toAnyone || asksFromHere(request);
  const router = Router();
  router.use(address, (request, response, next) => {
    if (!isOpenTo(request)) return next(notFound());
    response.setHeader('Cache-Control', 'no-store');
    next();
  });
  const find = (id: string) => messages().find((kept) => kept.id === Number(id));
  router.get(address, (_request, response) => void response.type('html').send(messagesView(messages())));
  router.get(`${address}/:id`, (request, response) => {
    const message = find(request.params.id);
    response.status(message ? 200 : 404).type('html').send(message ? messageView(message) : goneView());
  });
  router.get(`${address}/:id/set`, (request, response) => {
    const html = find(request.params.id)?.html;
    if (!html) throw notFound();
    response.setHeader('Content-Security-Policy', "default-src 'none'; style-src 'unsafe-inline'; sandbox");
    response.type('html').send(html);
  });
  return { address, isOpenTo, router };
}
