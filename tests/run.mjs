/** npm test: sets up what is missing, checks types, style and arrows, builds, runs every test project, and closes with one line:
 *  `N passed, N failed`. A check that fails counts as one failure, like a test. */
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensureBuilt } from '../server/launch/build.mjs';
import { ensureChromium } from '../server/launch/ensure-chromium.mjs';
import { ensurePackages } from '../server/launch/ensure-packages.mjs';
import { ensurePostgres } from '../server/launch/find-postgres.mjs';
import { root } from '../server/launch/paths.mjs';
import { sayProblem } from '../server/launch/problem.mjs';
import { endTools, runTool } from '../server/launch/run-tool.mjs';
import { onStopSign } from '../server/launch/stop-signs.mjs';
import { countTests } from './count-tests.mjs';

const say = (line) => process.stdout.write(`${line}\n`);
const bin = (...path) => join(root, 'node_modules', ...path);
const total = { passed: 0, failed: 0 };
let stopped = false;

const checks = [
  ['types', [bin('typescript', 'bin', 'tsc'), '-b']],
  ['style (biome)', [bin('@biomejs', 'biome', 'bin', 'biome'), 'ci', '.']],
  [
    'arrows (dependency-cruiser)',
    [bin('dependency-cruiser', 'bin', 'dependency-cruise.mjs'), '--config', 'tests/lint/dependency-cruiser.cjs', 'shared', 'server', 'src'],
  ],
  ['unused code (knip)', [bin('knip', 'bin', 'knip.js')]],
];

/** The browser project runs last and by itself: it measures times. */
const projects = [['unit', 'web', 'physics', 'api'], ['browser']];

async function timed(name, action) {
  const start = performance.now();
  const good = await action();
  say(`${good ? 'ok    ' : 'FAILED'} ${name} (${((performance.now() - start) / 1000).toFixed(1)} s)`);
  return good;
}

/** One check = one in the count. */
async function check(name, action) {
  if (stopped) return;
  const good = await timed(name, async () => {
    try {
      return await action();
    } catch (error) {
      sayProblem(error);
      return false;
    }
  });
  total[good ? 'passed' : 'failed'] += 1;
}

async function tool([file, ...args]) {
  const { code, output } = await runTool(process.execPath, [file, ...args], { env: { ...process.env, NO_COLOR: '1', FORCE_COLOR: '0' } });
  if (code !== 0) say(output.trim());
  return code === 0;
}

async function runTests(names, folder) {
  if (stopped) return;
  const report = join(folder, `${names.join('-')}.json`);
  const args = names.flatMap((name) => ['--project', name]);
  const { code } = await runTool(
    process.execPath,
    [
      bin('vitest', 'vitest.mjs'),
      'run',
      ...args,
      '--allowOnly=false',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${report}`,
    ],
    { show: true, env: { ...process.env, NODE_ENV: 'test' } },
  );
  const counted = countTests(readReport(report), code);
  for (const line of counted.remarks) say(line);
  total.passed += counted.passed;
  total.failed += counted.failed;
}

function readReport(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return null;
  }
}

async function main() {
  const start = performance.now();
  await ensurePackages(say);
  await check('PostgreSQL at hand', async () => Boolean(await ensurePostgres(say)));
  await check('Chromium at hand', async () => {
    await ensureChromium(say);
    return true;
  });
  for (const [name, command] of checks) await check(name, () => tool(command));
  for (const half of ['server', 'client']) {
    await check(`build of the ${half}`, async () => {
      await ensureBuilt(say, [half]);
      return true;
    });
  }
  const folder = mkdtempSync(join(tmpdir(), 'swashbench-reports-'));
  try {
    for (const names of projects) await runTests(names, folder);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
  say(`All of it took ${((performance.now() - start) / 60_000).toFixed(1)} minutes.`);
}

onStopSign(
  () => {
    stopped = true;
    endTools();
  },
  () => process.exit(130),
);
try {
  await main();
} catch (error) {
  sayProblem(error);
  total.failed += 1;
}
if (stopped) {
  say('Stopped before the end.');
  total.failed += 1;
}
say(`${total.passed} passed, ${total.failed} failed`);
process.exitCode = total.failed === 0 ? 0 : 1;
