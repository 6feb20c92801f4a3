import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { simulateResponse } from '#shared/api/simulate.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { evaluateCase } from '#shared/findings/evaluate.ts';
import { tolerances } from '#shared/simulation/result.ts';
import { post, refusal } from '../support/ask.ts';
import { createTestDatabase, type TestDatabase } from '../support/database.ts';
import { startTestServer, type TestServer } from '../support/test-server.ts';

let database: TestDatabase;
let server: TestServer;
beforeAll(async () => {
  database = await createTestDatabase(inject('clusterUrl'));
  server = await startTestServer({ databaseUrl: database.url });
});
afterAll(async () => {
  await server.close();
  await database.drop();
});

const simulate = (body: unknown) => post(`${server.url}/api/simulate`, body);
const demo = demoCircuit;
const caseId = (index: number) => demo.cases[index]?.id as string;

async function runOf(body: unknown) {
  const response = await simulate(body);
  expect(response.status).toBe(200);
  const answer = simulateResponse.parse(await response.json());
  if (answer.outcome !== 'run') throw new Error(`no run: ${JSON.stringify(answer.problems)}`);
  return answer.run;
}

describe('a good document', () => {
  test('the first case runs without being named, with verdict, findings, events, phases, audit and statistics', async () => {
    const run = await runOf({ document: demo });
    expect(run.case.id).toBe(caseId(0));
    expect(run.status).toBe('finished');
    expect(run.verdict).toMatchObject({ id: 'motor-stalls', word: 'Motor stalls' });
    expect(run.findings.map((finding) => finding.rule)).toContain('motor-stalls');
    expect(run.events.length).toBeGreaterThan(3);
    expect(run.phases.length).toBeGreaterThan(1);
    expect(run.audit?.residual).toBeLessThan(1e-3);
    expect(run.statistics.steps).toBeGreaterThan(10);
    expect(run.channels).toBeUndefined();
  });

  test('another case gives its own verdict', async () => {
    const verdicts = [
      (await runOf({ document: demo, case: caseId(1) })).verdict.id,
      (await runOf({ document: demo, case: caseId(2) })).verdict.id,
    ];
    expect(verdicts).toEqual(['within-limits', 'trips']);
  });

  test('the bits are those of the engine in this process', async () => {
    const evaluation = evaluateCase(demo, caseId(1), tolerances.normal);
    let step = evaluation.next();
    while (!step.done) step = evaluation.next();
    if (!step.value.ok) throw new Error('the demo does not compile');
    const run = await runOf({ document: demo, case: caseId(1) });
    expect(run.hash).toBe(step.value.evaluation.run.hash);
  });

  test('channels come only when asked for, all as long as the time base', async () => {
    const pump = demo.components.find((component) => component.kind === 'compensated-pump')?.id;
    const address = `${pump}.outlet.pressure`;
    const run = await runOf({ document: demo, channels: [address, 'nothing.here'] });
    expect(run.channels?.map((channel) => channel.address)).toEqual([address]);
    expect(run.channels?.[0]?.values.length).toBe(run.times?.length);
  });

  test('the tolerance asked for is the one used', async () => {
    expect((await runOf({ document: demo, tolerance: 'draft' })).tolerance).toBe(tolerances.draft);
  });
});

test('a circuit with an open port is an answer in words, not an error', async () => {
  const pump = demo.components.find((component) => component.kind === 'compensated-pump')?.id;
  const open = {
    ...demo,
    lines: demo.lines.filter(
      (line) =>
        !(line.from.component === pump && line.from.port === 'outlet') && !(line.to.component === pump && line.to.port === 'outlet'),
    ),
  };
  const response = await simulate({ document: open });
  expect(response.status).toBe(200);
  const answer = simulateResponse.parse(await response.json());
  if (answer.outcome !== 'cannot-run') throw new Error('it ran');
  expect(answer.problems.some((problem) => problem.severity === 'problem' && problem.component === pump)).toBe(true);
});

describe('a bad request', () => {
  test('every foreign field is named', async () => {
    const error = await refusal(await simulate({ document: demo, casse: 'a', rtol: 1 }), 400, 'bad-input');
    expect(error.details?.map((detail) => detail.path).sort()).toEqual(['casse', 'rtol']);
  });

  test('all that is wrong with a document is told at once, with value and what is allowed', async () => {
    const [first, ...rest] = demo.components;
    const bad = {
      ...demo,
      extra: 1,
      supply: { ...demo.supply, voltage: -5 },
      components: [{ ...first, turn: 7 }, ...rest],
      duty: { ...demo.duty, duration: '12' },
    };
    const error = await refusal(await simulate({ document: bad }), 400, 'bad-input');
    const said = Object.fromEntries((error.details ?? []).map((detail) => [detail.path, detail.message]));
    expect(said['document.extra']).toContain('is 1');
    expect(said['document.supply.voltage']).toMatch(/is -5.*at least 0/);
    expect(said['document.components[0].turn']).toMatch(/is 7.*0, 1, 2, 3/);
    expect(said['document.duty.duration']).toMatch(/is "12".*number/);
  });

  test('a value that JSON cannot carry, an unknown case, a foreign format and a newer version are refused by name', async () => {
    const notFinite = await refusal(
      await simulate(JSON.stringify({ document: demo }).replace(/"voltage":\d+/, '"voltage":1e999')),
      400,
      'bad-input',
    );
    expect(notFinite.details?.[0]?.path).toBe('document.supply.voltage');
    const unknown = await refusal(await simulate({ document: demo, case: 'zz' }), 400, 'bad-input');
    expect(unknown.details?.[0]).toMatchObject({ path: 'case' });
    expect(unknown.details?.[0]?.message).toContain(caseId(0));
    const foreign = await refusal(await simulate({ document: { ...demo, format: 'other' } }), 400, 'bad-input');
    expect(foreign.details?.[0]?.path).toBe('document.format');
    const newer = await refusal(await simulate({ document: { ...demo, version: 99 } }), 400, 'bad-input');
    expect(newer.details?.[0]?.message).toContain('99');
  });

  test('names are text: markup in them comes back as it was and runs nowhere', async () => {
    const title = '<img src=x onerror=alert(1)>';
    const run = await runOf({ document: { ...demo, title } });
    expect(run.circuit).toBe(title);
  });

  test('bodies of 20 MB, of another type, in an unknown encoding, and broken JSON are refused', async () => {
    await refusal(await simulate({ document: { pad: 'x'.repeat(20_000_000) } }), 413, 'too-large');
    await refusal(await post(`${server.url}/api/simulate`, '{}', { 'content-type': 'text/plain' }), 415, 'wrong-type');
    await refusal(await post(`${server.url}/api/simulate`, '{}', { 'content-encoding': 'smoke' }), 415, 'wrong-type');
    await refusal(await simulate('{"document": NaN}'), 400, 'bad-json');
    await refusal(await simulate('[1, 2'), 400, 'bad-json');
  });

  test('a prototype in the body changes nothing', async () => {
    const error = await refusal(
      await simulate('{"document": {}, "__proto__": {"admin": true}, "constructor": {"prototype": {"admin": true}}}'),
      400,
      'bad-input',
    );
    expect(error.details?.length).toBeGreaterThan(0);
    expect(({} as { admin?: boolean }).admin).toBeUndefined();
  });
});
