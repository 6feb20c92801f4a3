import type { RequestHandler } from 'express';
import { AppError } from '#server/errors.ts';

/** Refuses with 'too-slow' when nothing was answered after `milliseconds`. */
export function responseTimeout(milliseconds: number): RequestHandler {
  return (_request, response, next) => {
    const timer = setTimeout(() => {
      if (!response.headersSent)
        next(
          new AppError('too-slow', {
            message: `No answer was ready after ${milliseconds / 1000} s.`,
          }),
        );
    }, milliseconds);
    response.on('close', () => clearTimeout(timer));
    next();
  };
}
