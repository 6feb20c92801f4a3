import * as z from 'zod/mini';

/** GET /api/health. Status 200 when everything answers, 503 when the database does not. */
export const healthResponse = z.object({
  status: z.enum(['ok', 'degraded']),
  /** Whether the database answered a query within two seconds. */
  database: z.enum(['answers', 'does not answer']),
  /** Version of the simulation engine. */
  engineVersion: z.int(),
});
export type HealthResponse = z.infer<typeof healthResponse>;
