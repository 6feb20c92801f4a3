import { afterEach, beforeAll, expect, inject, test } from 'vitest';
import { crowdedCircuit } from '#shared/circuit/samples/crowded.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { post, refusal } from '../support/ask.ts';
import { createTestDatabase } from '../support/database.ts';
import { startTestServer, type TestServer, type TestServerOptions } from '../support/test-server.ts';

let databaseUrl: string;
let server: TestServer | undefined;
beforeAll(async () => {
  databaseUrl = (await createTestDatabase(inject('clusterUrl'))).url;
});
afterEach(() => server?.close());

async function start(options: Omit<TestServerOptions, 'databaseUrl'>): Promise<string> {
  server = await startTestServer({ databaseUrl, ...options });
  return `${server.url}/api/simulate`;
}

/** The crowded sheet's duty over and over for an hour: far more work than these limits allow. */
function anHour() {
  const { duty } = crowdedCircuit;
  const again = Math.floor(400 / duty.commands.length);
  const commands = Array.from({ length: again }, (_, round) =>
    duty.commands.map((command) => ({ ...command, id: `${command.id}-${round}`, time: command.time + round * duty.duration })),
  ).flat();
  return {
    document: { ...crowdedCircuit, cases: crowdedCircuit.cases.slice(0, 1), duty: { ...duty, duration: 3600, commands } },
    tolerance: 'fine',
  };
}

test('a run that takes too long is given up with a sentence, and the next one runs', async () => {
  const url = await start({ pool: { threads: 1, timeLimit: 3000 } });
  const error = await refusal(await post(url, anHour()), 503, 'too-slow');
  expect(error.message).toMatch(/After 3 s of computing the run had reached [0-9.]+ s of 3600 s.*shorten the duty/);
  expect((await post(url, { document: demoCircuit, tolerance: 'draft' })).status).toBe(200);
});

test('when all threads are busy and the queue is full the server says so and when to come back', async () => {
  const url = await start({ pool: { threads: 1, queue: 1, timeLimit: 1500 } });
  const answers = await Promise.all(Array.from({ length: 5 }, () => post(url, anHour())));
  const codes = [];
  for (const answer of answers) {
    const code = answer.headers.get('retry-after') ? 'busy' : 'too-slow';
    codes.push((await refusal(answer, 503, code)).code);
  }
  expect(codes.sort()).toEqual(['busy', 'busy', 'busy', 'too-slow', 'too-slow']);
});

test('more runs a minute than allowed are refused with Retry-After, other routes go on', async () => {
  const url = await start({ limits: { api: 1000, simulate: 3 } });
  const statuses = [];
  for (let i = 0; i < 3; i++) statuses.push((await post(url, {})).status);
  expect(statuses).toEqual([400, 400, 400]);
  const refused = await post(url, {});
  const error = await refusal(refused, 429, 'too-many');
  expect(error.message).toContain('At most 3 runs a minute');
  expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
  expect((await fetch(url.replace('simulate', 'health'))).status).toBe(200);
});

test('behind a trusted proxy each caller has a limit of its own; without trust the header changes nothing', async () => {
  const call = async (url: string, from: string) => (await post(url, {}, { 'x-forwarded-for': from })).status;
  const trusting = await start({ limits: { api: 1000, simulate: 1 }, config: { trustProxy: 1 } });
  expect([await call(trusting, '192.0.2.1'), await call(trusting, '192.0.2.2'), await call(trusting, '192.0.2.1')]).toEqual([
    400, 400, 429,
  ]);
  await server?.close();
  const wary = await start({ limits: { api: 1000, simulate: 1 } });
  expect([await call(wary, '192.0.2.1'), await call(wary, '192.0.2.2')]).toEqual([400, 429]);
});

test('a caller that goes away frees its thread', async () => {
  const url = await start({ pool: { threads: 1, queue: 0, timeLimit: 60_000 } });
  const leave = new AbortController();
  const left = fetch(url, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(anHour()),
    signal: leave.signal,
  });
  setTimeout(() => leave.abort(), 1500);
  await expect(left).rejects.toThrow();
  await expect.poll(async () => (await post(url, { document: demoCircuit })).status, { timeout: 20_000, interval: 300 }).toBe(200);
});

test('an answer that is never ready is refused after the limit', async () => {
  const url = await start({ answerWithin: 300, simulate: { simulate: () => new Promise(() => {}) } });
  const error = await refusal(await post(url, { document: {} }), 503, 'too-slow');
  expect(error.message).toContain('0.3 s');
});
