import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { routes } from '#shared/api/routes.ts';
import { post, refusal } from '../support/ask.ts';
import { createTestDatabase } from '../support/database.ts';
import { startTestServer, type TestServer } from '../support/test-server.ts';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer({
    databaseUrl: (await createTestDatabase(inject('clusterUrl'))).url,
    simulate: { simulate: () => Promise.reject(new Error('secret-password in /srv/somebody')) },
  });
});
afterAll(() => server.close());

describe.each(routes)('$method $path', (route) => {
  test('other methods are refused in the one shape and say which are offered', async () => {
    for (const method of ['PUT', 'PATCH', 'DELETE', route.method === 'get' ? 'POST' : 'GET']) {
      const response = await fetch(`${server.url}${route.path}`, { method });
      await refusal(response, 405, 'wrong-method');
      expect(response.headers.get('allow')).toContain(route.method.toUpperCase());
    }
  });

  test('something after the address is not found', async () => {
    const error = await refusal(await fetch(`${server.url}${route.path}/more?x=<script>`), 404, 'not-found');
    expect(error.message).toContain(`${route.path}/more`);
    expect(error.message).not.toContain('script');
  });

  test('malformed input is refused in the one shape', async () => {
    if (!route.request) return expect(route.method).toBe('get');
    const url = `${server.url}${route.path}`;
    await refusal(await post(url, '{'), 400, 'bad-json');
    await refusal(await post(url, '"text"'), 400, 'bad-json');
    for (const body of ['null', '[]', '{}', '{"document": []}', '{"document": 3}', '{"document": "x", "case": 7}']) {
      const error = await refusal(await post(url, body), 400, body === 'null' ? 'bad-json' : 'bad-input');
      if (body !== 'null') expect(error.details?.length, body).toBeGreaterThan(0);
    }
    await refusal(await post(url, 'x=1', { 'content-type': 'application/x-www-form-urlencoded' }), 415, 'wrong-type');
    await refusal(await fetch(url, { method: 'POST' }), 415, 'wrong-type');
  });
});

test('unknown API addresses, bad escapes and bare methods are refused in the one shape', async () => {
  await refusal(await fetch(`${server.url}/api`), 404, 'not-found');
  await refusal(await fetch(`${server.url}/api/shops`), 404, 'not-found');
  await refusal(await fetch(`${server.url}/%E0%A4%A`), 400, 'bad-address');
  await refusal(await fetch(`${server.url}/api/%E0%A4%A`), 404, 'not-found');
  await refusal(await post(`${server.url}/bench`, {}), 405, 'wrong-method');
});

test('a fault of ours says nothing but its request id; the log has it, without body, headers or query', async () => {
  const response = await post(
    `${server.url}/api/simulate?token=abc`,
    { document: { note: 'private-words' } },
    { authorization: 'Bearer abc', cookie: 'id=abc' },
  );
  const error = await refusal(response, 500, 'internal');
  expect(error.message).not.toContain('secret');
  const lines = server.log.filter((line) => line.includes(error.requestId));
  expect(lines.join('')).toContain('unforeseen failure');
  expect(lines.join('')).not.toMatch(/token|Bearer|private-words|cookie|127\.0\.0\.1/);
});
