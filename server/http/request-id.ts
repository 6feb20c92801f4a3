import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';

/** A fresh id for each request, in res.locals and in the answer. Ids sent by clients are not trusted. */
export const requestId: RequestHandler = (_request, response, next) => {
  const id = randomUUID();
  response.locals.requestId = id;
  response.setHeader('X-Request-Id', id);
  next();
};
