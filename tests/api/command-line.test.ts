import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { runCsvHeader, runCsvRow } from '#shared/api/run-csv.ts';
import { runSummary } from '#shared/api/run-summary.ts';
import { simulateResponse } from '#shared/api/simulate.ts';
import { documentText } from '#shared/circuit/parse-document-text.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { circuitDocument } from '#shared/circuit/schema.ts';
import { post } from '../support/ask.ts';
import { createTestDatabase } from '../support/database.ts';
import { runNode } from '../support/run-node.ts';
import { startTestServer, type TestServer } from '../support/test-server.ts';

const folder = mkdtempSync(join(tmpdir(), 'swashbench-cli-'));
const file = (name: string, text: string) => {
  writeFileSync(join(folder, name), text);
  return join(folder, name);
};
const demoFile = file('demo.json', documentText(demoCircuit));
const caseName = (index: number) => demoCircuit.cases[index]?.name as string;
const simulate = (...args: string[]) => runNode(['server/launch/simulate.mjs', ...args]);

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer({ databaseUrl: (await createTestDatabase(inject('clusterUrl'))).url });
});
afterAll(async () => {
  await server.close();
  rmSync(folder, { recursive: true });
});

test('the demo tells its story: status, verdict, events, phases, findings, audit, statistics, caution', async () => {
  const { code, out, err } = await simulate(demoFile);
  expect({ code, err }).toEqual({ code: 0, err: '' });
  for (const words of [
    'Motor stalls',
    'Status: finished',
    'Findings',
    'Motor load',
    'Events',
    'By phase',
    'residual',
    'steps',
    'A calculation, not a permission.',
  ]) {
    expect(out).toContain(words);
  }
  expect(out).toMatch(/\d+\.\d{3} s {2}\S+ {2}falls below pull-out speed/);
});

test.each([0, 1, 2])('case %i gives the same bits and the same summary on the command line and on the server', async (index) => {
  const { code, out } = await simulate(demoFile, '--case', caseName(index), '--json');
  expect(code).toBe(0);
  const mine = runSummary.parse(JSON.parse(out));
  const answer = await post(`${server.url}/api/simulate`, { document: demoCircuit, case: demoCircuit.cases[index]?.id });
  const theirs = simulateResponse.parse(await answer.json());
  expect(theirs).toEqual({ outcome: 'run', run: mine });
  expect(mine.hash).toMatch(/^[0-9a-f]{8,}$/);
});

test('the tolerance asked for is used', async () => {
  const { out } = await simulate(demoFile, '--rtol', '1e-3', '--json');
  expect(runSummary.parse(JSON.parse(out)).tolerance).toBe(1e-3);
});

test('traces go to a file as its contract says', async () => {
  const path = join(folder, 'out.csv');
  const { code, out } = await simulate(demoFile, '--csv', path);
  expect(code).toBe(0);
  expect(out).toContain('Motor stalls');
  const [header = '', ...rows] = readFileSync(path, 'utf8').trimEnd().split('\r\n');
  const columns = runCsvHeader.parse(header.split(','));
  const pump = demoCircuit.components.find((component) => component.kind === 'compensated-pump')?.id;
  expect(columns).toContain(`${pump}.outlet.pressure [Pa]`);
  const values = rows.map((row) => runCsvRow.parse(row.split(',').map(Number)));
  expect(values.length).toBeGreaterThan(50);
  for (const row of values) expect(row).toHaveLength(columns.length);
  expect(values.at(-1)?.[0]).toBe(demoCircuit.duty.duration);
});

test('a bad document exits with 2 and lists every problem with field, value and what is allowed', async () => {
  const bad = { ...demoCircuit, extra: true, supply: { ...demoCircuit.supply, frequency: 400 } };
  const { code, out, err } = await simulate(file('bad.json', JSON.stringify(bad)));
  expect({ code, out }).toEqual({ code: 2, out: '' });
  expect(err).toMatch(/supply\.frequency is 400: must be at most 100/);
  expect(err).toMatch(/extra is true: /);
  expect(err).not.toMatch(/\n\s+at /);
});

test.each([
  ['broken JSON', '{"format": "swashbench-circuit",', /line 1/],
  ['an empty file', '', /empty/],
  ['a file of 20 MB', `{"pad":"${'x'.repeat(20_000_000)}"}`, /20\.0 MB/],
  ['a newer version', JSON.stringify({ ...demoCircuit, version: 99 }), /99.*newer/],
])('%s exits with 2', async (_name, text, words) => {
  const { code, err } = await simulate(file('odd.json', text));
  expect(code).toBe(2);
  expect(err).toMatch(words);
});

test('wrong arguments exit with 2 and say what is wanted', async () => {
  const outcomes = await Promise.all([
    simulate(),
    simulate(join(folder, 'missing.json')),
    simulate(demoFile, '--case', 'Nobody'),
    simulate(demoFile, '--rtol', '7'),
    simulate(demoFile, '--colour', 'red'),
    simulate(demoFile, '--json', '--csv', 'x.csv'),
  ]);
  const words = [
    /circuit file is needed/,
    /missing\.json does not exist/,
    /"Nobody".*must be one of/,
    /--rtol is "7".*1e-10 to 0\.01/,
    /--colour/,
    /not both/,
  ];
  outcomes.forEach(({ code, err }, index) => {
    expect(code).toBe(2);
    expect(err).toMatch(words[index] as RegExp);
  });
});

test('a circuit that cannot run yet exits with 2 and says what is missing', async () => {
  const empty = {
    ...demoCircuit,
    components: [],
    lines: [],
    shafts: [],
    requirements: [],
    labels: [],
    tagPlaces: {},
    duty: { ...demoCircuit.duty, commands: [] },
    cases: [demoCircuit.cases[0]],
  };
  const { code, err } = await simulate(file('empty.json', JSON.stringify(empty)));
  expect(code).toBe(2);
  expect(err).toMatch(/cannot run yet:\n {2}\S/);
});

test('the schema printed is the one that documents are checked against', async () => {
  const { code, out } = await runNode(['server/launch/schema.mjs']);
  expect(code).toBe(0);
  const schema = JSON.parse(out) as { properties: object; additionalProperties: boolean };
  expect(Object.keys(schema.properties).sort()).toEqual(Object.keys(circuitDocument.shape).sort());
  expect(schema.additionalProperties).toBe(false);
});
