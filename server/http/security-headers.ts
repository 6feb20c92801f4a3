import { randomBytes } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import type { RequestHandler, Response } from 'express';
import helmet from 'helmet';

/** Makes the nonce that the page's own style elements carry. */
export const pageNonce: RequestHandler = (_request, response, next) => {
  response.locals.nonce = randomBytes(16).toString('base64');
  next();
};

/** Strict content policy: everything from here, nothing inline but styles with this answer's nonce, no eval.
 *  Pictures may also come from blob: and data:, which the export of the drawing needs.
 *  @param secure the site is reached by https */
export function securityHeaders(secure: boolean): RequestHandler {
  const nonce = (_request: IncomingMessage, response: unknown) => `'nonce-${(response as Response).locals.nonce}'`;
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        scriptSrcAttr: ["'none'"],
        styleSrc: ["'self'", nonce],
        imgSrc: ["'self'", 'blob:', 'data:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'"],
        manifestSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(secure ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: secure ? { maxAge: 15_552_000 } : false,
    crossOriginEmbedderPolicy: false,
    xFrameOptions: { action: 'deny' },
    referrerPolicy: { policy: 'no-referrer' },
  });
}
