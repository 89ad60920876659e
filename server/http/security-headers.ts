import helmet from 'helmet';
import type { RequestHandler } from 'express';

/**
 * One policy for every page, without nonces, for a service worker may keep index.html (OWASP ASVS 5.0.0, 3.4).
 * @param forGood whether browsers may remember that this host is https only (RFC 6797): never for a home-made certificate, whose host is
 * often localhost and serves other programs over http too.
 */
export function securityHeaders(secure: boolean, forGood: boolean): RequestHandler[] {
  return [
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'self'"],
          scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
          workerSrc: ["'self'"],
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'blob:', 'data:'],
          mediaSrc: ["'self'", 'blob:'],
          fontSrc: ["'self'"],
          connectSrc: ["'self'"],
          objectSrc: ["'none'"],
          baseUri: ["'none'"],
          formAction: ["'self'"],
          frameAncestors: ["'none'"],
          ...(secure ? { upgradeInsecureRequests: [] } : {}),
        },
      },
      crossOriginEmbedderPolicy: false,
      strictTransportSecurity: forGood,
      xFrameOptions: { action: 'deny' },
      referrerPolicy: { policy: 'no-referrer' },
    }),
    (_request, response, next) => {
      response.setHeader('Permissions-Policy', 'camera=(self), microphone=(), geolocation=()');
      next();
    },
  ];
}

/** Answers about people stay out of caches, unless a route of files says otherwise. */
export const noStore: RequestHandler = (_request, response, next) => {
  response.setHeader('Cache-Control', 'no-store');
  next();
};
