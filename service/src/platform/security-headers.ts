import { type RequestHandler } from 'express';
import helmet from 'helmet';
import { type Config } from './config.js';

/**
 * Strict headers. Styles may stand in the page because the interface library writes them there; scripts may not.
 * The API page is the one place that needs its own inline script, and it gets that policy alone.
 */
export function securityHeaders(config: Pick<Config, 'cookieSecure'>): RequestHandler {
  const policy = (scripts: string[]) =>
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'none'"],
          scriptSrc: scripts,
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          fontSrc: ["'self'", 'data:'],
          connectSrc: ["'self'"],
          manifestSrc: ["'self'"],
          baseUri: ["'self'"],
          formAction: ["'self'"],
          frameAncestors: ["'none'"],
        },
      },
      strictTransportSecurity: config.cookieSecure ? { maxAge: 31_536_000, includeSubDomains: false } : false,
      referrerPolicy: { policy: 'same-origin' },
      crossOriginEmbedderPolicy: false,
    });
  const page = policy(["'self'"]);
  const apiPage = policy(["'self'", "'unsafe-inline'"]);
  return (request, response, next) =>
    (request.path.startsWith('/api/docs') ? apiPage : page)(request, response, next);
}
