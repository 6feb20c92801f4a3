import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { healthResponse } from '#shared/api/health.ts';
import { ENGINE_VERSION } from '#shared/simulation/engine-version.ts';
import { createTestDatabase, type TestDatabase } from '../support/database.ts';
import { startTestServer, type TestServer } from '../support/test-server.ts';

let database: TestDatabase;
let server: TestServer;
beforeAll(async () => {
  database = await createTestDatabase(inject('clusterUrl'));
  server = await startTestServer({ databaseUrl: database.url });
});
afterAll(() => server.close());

test('health says that the database answers, and that it does not once it has gone', async () => {
  const before = await fetch(`${server.url}/api/health`);
  expect(before.status).toBe(200);
  expect(before.headers.get('cache-control')).toBe('no-store');
  expect(healthResponse.parse(await before.json())).toEqual({ status: 'ok', database: 'answers', engineVersion: ENGINE_VERSION });

  await database.drop();
  const after = await fetch(`${server.url}/api/health`);
  expect(after.status).toBe(503);
  expect(healthResponse.parse(await after.json())).toMatchObject({ status: 'degraded', database: 'does not answer' });
  expect((await fetch(`${server.url}/`)).status, 'the bench needs no database').toBe(200);
});
