import { type RequestHandler, Router } from 'express';
import { onlyMethods } from '#server/http/error-handler.ts';
import type { HealthResponse } from '#shared/api/health.ts';

/** @param databaseAnswers asks the database; never throws */
export function healthRoutes(databaseAnswers: () => Promise<boolean>, engineVersion: number): Router {
  const health: RequestHandler = async (_request, response) => {
    const answers = await databaseAnswers();
    const body: HealthResponse = {
      status: answers ? 'ok' : 'degraded',
      database: answers ? 'answers' : 'does not answer',
      engineVersion,
    };
    response.setHeader('Cache-Control', 'no-store');
    response.status(answers ? 200 : 503).json(body);
  };
  const router = Router();
  router.get('/', health);
  router.all('/', onlyMethods('GET', 'HEAD'));
  return router;
}
