import { afterEach, beforeAll, expect, inject, test } from 'vitest';
import { refusal } from '../support/ask.ts';
import { createTestDatabase } from '../support/database.ts';
import { startTestServer, type TestServer, type TestServerOptions } from '../support/test-server.ts';

let databaseUrl: string;
let server: TestServer | undefined;
beforeAll(async () => {
  databaseUrl = (await createTestDatabase(inject('clusterUrl'))).url;
});
afterEach(() => server?.close());

async function start(options: Omit<TestServerOptions, 'databaseUrl'> = {}): Promise<string> {
  server = await startTestServer({ databaseUrl, ...options });
  return server.url;
}

/** Directives of the content policy by name. */
function policy(response: Response): Record<string, string> {
  const entries = (response.headers.get('content-security-policy') ?? '').split(';').map((entry) => entry.trim().split(/\s+(.*)/));
  return Object.fromEntries(entries.map(([name, value]) => [name, value ?? '']));
}

test('the page carries a nonce of its own each time and is not kept by caches', async () => {
  const url = await start();
  const nonces = [];
  for (let i = 0; i < 2; i++) {
    const response = await fetch(`${url}/`);
    const html = await response.text();
    const nonce = /nonce="([^"]+)"/.exec(html)?.[1];
    expect(html).not.toContain('__CSP_NONCE__');
    expect(policy(response)['style-src']).toBe(`'self' 'nonce-${nonce}'`);
    expect(response.headers.get('cache-control')).toBe('no-store');
    nonces.push(nonce);
  }
  expect(nonces[0]).not.toBe(nonces[1]);
});

test('the content policy is strict on every answer', async () => {
  const url = await start();
  for (const path of ['/', '/api/health', '/api/nothing', '/assets/app-1.js']) {
    const response = await fetch(`${url}${path}`);
    const directives = policy(response);
    expect(response.headers.get('content-security-policy'), path).not.toMatch(/unsafe-|\*|https?:/);
    expect(directives).toMatchObject({
      'default-src': "'self'",
      'script-src': "'self'",
      'worker-src': "'self'",
      'connect-src': "'self'",
      'object-src': "'none'",
      'base-uri': "'self'",
      'frame-ancestors': "'none'",
    });
    expect(response.headers.get('x-content-type-options')).toBe('nosniff');
    expect(response.headers.get('x-powered-by')).toBeNull();
    expect(response.headers.get('referrer-policy')).toBe('no-referrer');
  }
});

test('https is insisted on only when the site is reached by https', async () => {
  const plain = await fetch(`${await start()}/`);
  expect(plain.headers.get('strict-transport-security')).toBeNull();
  expect(policy(plain)).not.toHaveProperty('upgrade-insecure-requests');
  await server?.close();
  const secure = await fetch(`${await start({ config: { publicUrl: 'https://bench.example' } })}/`);
  expect(secure.headers.get('strict-transport-security')).toContain('max-age=');
  expect(policy(secure)).toHaveProperty('upgrade-insecure-requests');
});

test.each([
  [null, '/'],
  ['https://example.org', '/'],
  ['https://example.org/tools/bench', '/tools/bench/'],
])('with PUBLIC_URL %s the page has the base %s at every depth', async (publicUrl, base) => {
  const url = await start({ config: { publicUrl } });
  for (const path of ['/', '/index.html', '/draw', '/circuits/12/cases/b']) {
    const response = await fetch(`${url}${path}`);
    const html = await response.text();
    expect(response.status).toBe(200);
    expect(html.match(/<base [^>]*>/g)).toEqual([`<base href="${base}">`]);
    expect(html.indexOf('<base ')).toBeLessThan(html.indexOf('src='));
  }
});

test('hashed assets are kept for ever and a missing one is not the page', async () => {
  const url = await start();
  const asset = await fetch(`${url}/assets/app-1.js`);
  expect(asset.headers.get('cache-control')).toContain('immutable');
  expect(asset.headers.get('content-type')).toContain('javascript');
  await refusal(await fetch(`${url}/assets/app-2.js`), 404, 'not-found');
});

test('nothing outside the client folder is served', async () => {
  const url = await start();
  for (const path of ['/..%2f..%2fetc/passwd', '/assets/..%2f..%2fpackage.json', '/.git/config', '/assets/%2e%2e/%2e%2e/package.json']) {
    const text = await (await fetch(`${url}${path}`)).text();
    expect(text, path).not.toMatch(/root:|"dependencies"|\[core\]/);
  }
});

test('without a built client the page says so, and the API works', async () => {
  const url = await start({ withoutClient: true });
  const error = await refusal(await fetch(`${url}/`), 404, 'not-found');
  expect(error.message).toContain('npm start');
  expect((await fetch(`${url}/api/health`)).status).toBe(200);
});
