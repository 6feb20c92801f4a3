import { type RequestHandler, Router } from 'express';
import { guest } from '#server/access/actor.ts';
import { onlyMethods } from '#server/http/error-handler.ts';
import { jsonBody } from '#server/http/json-body.ts';
import { validate } from '#server/http/validate.ts';
import { simulateRequest } from '#shared/api/simulate.ts';
import type { SimulateService } from './simulate.service.ts';

export function simulateRoutes(service: SimulateService, limit: RequestHandler): Router {
  const simulate: RequestHandler = async (request, response) => {
    const wanted = validate(simulateRequest, request.body);
    const gone = new AbortController();
    response.on('close', () => gone.abort());
    const answer = await service.simulate(guest, wanted, gone.signal);
    response.setHeader('Cache-Control', 'no-store');
    response.json(answer);
  };
  const router = Router();
  router.post('/', limit, jsonBody, simulate);
  router.all('/', onlyMethods('POST'));
  return router;
}
