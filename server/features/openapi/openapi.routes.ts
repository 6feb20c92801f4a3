import { Router } from 'express';
import { onlyMethods } from '#server/http/error-handler.ts';
import { openapiDocument } from './openapi-document.ts';

export function openapiRoutes(): Router {
  const document = openapiDocument();
  const router = Router();
  router.get('/', (_request, response) => {
    response.json(document);
  });
  router.all('/', onlyMethods('GET', 'HEAD'));
  return router;
}
