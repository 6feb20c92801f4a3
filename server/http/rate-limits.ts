import type { RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';
import { AppError } from '#server/errors.ts';

/** At most `limit` requests a minute from one address; more are refused with Retry-After. */
export function perMinute(limit: number, what: string): RequestHandler {
  return rateLimit({
    windowMs: 60_000,
    limit,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    // A forwarding header from a proxy that is not trusted is simply not believed.
    validate: { xForwardedForHeader: false },
    handler: (request, _response, next) => {
      const reset = 'rateLimit' in request ? (request.rateLimit as { resetTime?: Date }).resetTime : undefined;
      const retryAfter = Math.max(1, Math.ceil(((reset?.getTime() ?? 0) - Date.now()) / 1000));
      next(
        new AppError('too-many', {
          message: `At most ${limit} ${what} a minute are answered: try again in ${retryAfter} s.`,
          retryAfter,
        }),
      );
    },
  });
}
