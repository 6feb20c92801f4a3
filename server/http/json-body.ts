import express, { type RequestHandler } from 'express';
import { AppError } from '#server/errors.ts';

const MAX_BODY_BYTES = 1_100_000;

const parse = express.json({
  limit: MAX_BODY_BYTES,
  strict: true,
  type: 'application/json',
});

/** Parses a JSON body: a document of at most 1 MB and what a request says beside it. Any other type of body is refused. */
export const jsonBody: RequestHandler = (request, response, next) => {
  if (!request.is('application/json')) {
    next(
      new AppError('wrong-type', {
        message: 'Send the body as application/json.',
      }),
    );
    return;
  }
  parse(request, response, next);
};
