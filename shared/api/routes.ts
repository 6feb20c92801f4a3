import type { z } from 'zod';
import { circuitDocument } from '../circuit/schema.ts';
import { errorBody } from './errors.ts';
import { healthResponse } from './health.ts';
import { simulateRequest, simulateResponse } from './simulate.ts';

/** One route as it is described to callers. Schemas are named by their key in `schemas`. */
export interface RouteContract {
  readonly method: 'get' | 'post';
  readonly path: string;
  readonly summary: string;
  readonly request?: SchemaName;
  /** Bodies by status. Every other status answers with ErrorBody. */
  readonly answers: Readonly<Record<number, { readonly words: string; readonly schema?: SchemaName }>>;
}

/** Every schema with a name of its own in the API's description. */
export const schemas = {
  CircuitDocument: circuitDocument,
  ErrorBody: errorBody,
  HealthResponse: healthResponse,
  SimulateRequest: simulateRequest,
  SimulateResponse: simulateResponse,
} as const satisfies Record<string, z.core.$ZodType>;
export type SchemaName = keyof typeof schemas;

export const routes: readonly RouteContract[] = [
  {
    method: 'get',
    path: '/api/health',
    summary: 'Whether the server and its database answer',
    answers: {
      200: { words: 'All answer', schema: 'HealthResponse' },
      503: { words: 'The database does not answer', schema: 'HealthResponse' },
    },
  },
  {
    method: 'get',
    path: '/api/openapi.json',
    summary: 'This description',
    answers: { 200: { words: 'The description in OpenAPI 3.1' } },
  },
  {
    method: 'post',
    path: '/api/simulate',
    summary: 'Run one case of a circuit document; nothing is kept',
    request: 'SimulateRequest',
    answers: {
      200: {
        words: 'The run, or why the circuit cannot run yet',
        schema: 'SimulateResponse',
      },
    },
  },
];
