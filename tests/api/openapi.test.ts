import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { routes } from '#shared/api/routes.ts';
import { createTestDatabase, type TestDatabase } from '../support/database.ts';
import { startTestServer, type TestServer } from '../support/test-server.ts';

interface Description {
  openapi: string;
  paths: Record<string, Record<string, { responses: Record<string, unknown>; requestBody?: unknown }>>;
  components: { schemas: Record<string, Record<string, unknown>> };
}

let database: TestDatabase;
let server: TestServer;
let description: Description;
beforeAll(async () => {
  database = await createTestDatabase(inject('clusterUrl'));
  server = await startTestServer({ databaseUrl: database.url });
  description = (await (await fetch(`${server.url}/api/openapi.json`)).json()) as Description;
});
afterAll(async () => {
  await server.close();
  await database.drop();
});

function references(value: unknown): string[] {
  if (Array.isArray(value)) return value.flatMap(references);
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, entry]) => (key === '$ref' ? [String(entry)] : references(entry)));
}

test('the description names every route, and every route it names exists under that method', async () => {
  expect(description.openapi).toBe('3.1.0');
  expect(Object.keys(description.paths).sort()).toEqual(routes.map((route) => route.path).sort());
  for (const route of routes) {
    const response = await fetch(`${server.url}${route.path}`, { method: route.method.toUpperCase() });
    expect([404, 405], `${route.method} ${route.path}`).not.toContain(response.status);
    expect(description.paths[route.path]?.[route.method]?.responses.default).toBeDefined();
  }
});

test('every reference leads to a schema, and schemas carry no ids of their own', () => {
  const wanted = references(description);
  expect(wanted.length).toBeGreaterThan(3);
  for (const reference of wanted) expect(Object.keys(description.components.schemas)).toContain(reference.split('/').pop());
  const text = JSON.stringify(description.components.schemas);
  expect(text).not.toContain('"$id"');
  expect(text).not.toContain('"$schema"');
});

test('requests are described as strict and responses as open', () => {
  expect(description.components.schemas.CircuitDocument?.additionalProperties).toBe(false);
  expect(description.components.schemas.SimulateRequest?.additionalProperties).toBe(false);
  expect(description.components.schemas.HealthResponse?.additionalProperties).not.toBe(false);
});
