import compression from 'compression';
import express, { type Express, Router } from 'express';
import type { Logger } from 'pino';
import type { Config } from './config.ts';
import { healthRoutes } from './features/health/health.routes.ts';
import { openapiRoutes } from './features/openapi/openapi.routes.ts';
import { simulateRoutes } from './features/simulate/simulate.routes.ts';
import type { SimulateService } from './features/simulate/simulate.service.ts';
import { clientPages } from './http/client-pages.ts';
import { errorHandler, notFound } from './http/error-handler.ts';
import { perMinute } from './http/rate-limits.ts';
import { requestId } from './http/request-id.ts';
import { requestLog } from './http/request-log.ts';
import { responseTimeout } from './http/response-timeout.ts';
import { pageNonce, securityHeaders } from './http/security-headers.ts';

export interface Dependencies {
  readonly config: Pick<Config, 'publicUrl' | 'trustProxy'>;
  readonly logger: Logger;
  readonly databaseAnswers: () => Promise<boolean>;
  readonly simulate: SimulateService;
  readonly engineVersion: number;
  /** Folder with the built client. */
  readonly clientFolder: string;
  /** Requests a minute from one address. */
  readonly limits: { readonly api: number; readonly simulate: number };
  /** Longest wait for an answer [ms]. */
  readonly answerWithin: number;
}

/** Limits of the product; tests set their own. */
export const usualLimits = {
  limits: { api: 300, simulate: 30 },
  answerWithin: 30_000,
} as const;

/** The whole site on one Express app. Does not listen. */
export function createApp(dependencies: Dependencies): Express {
  const { config, logger, limits } = dependencies;
  const site = config.publicUrl ? new URL(config.publicUrl) : null;
  const base = `${site?.pathname.replace(/\/+$/, '') ?? ''}/`;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.use(requestId, requestLog(logger), pageNonce, securityHeaders(site?.protocol === 'https:'));
  app.use(compression());
  app.use(responseTimeout(dependencies.answerWithin));
  app.use('/api', apiRoutes(dependencies, perMinute(limits.api, 'requests')));
  app.use(clientPages(dependencies.clientFolder, base));
  app.use(notFound);
  app.use(errorHandler(logger));
  return app;
}

function apiRoutes(dependencies: Dependencies, limit: express.RequestHandler): Router {
  const router = Router();
  router.use(limit);
  router.use('/health', healthRoutes(dependencies.databaseAnswers, dependencies.engineVersion));
  router.use('/openapi.json', openapiRoutes());
  router.use('/simulate', simulateRoutes(dependencies.simulate, perMinute(dependencies.limits.simulate, 'runs')));
  router.use(notFound);
  return router;
}
