import { type ChildProcess, spawn } from 'node:child_process';
import { chmodSync, existsSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, inject, test, vi } from 'vitest';
import { runMigrations } from '#server/db/run-migrations.ts';
import { createTestDatabase } from '../support/database.ts';
import { cleanEnvironment, projectRoot } from '../support/run-node.ts';

/** Starts in these tests take a second; a busy machine may need many. */
vi.setConfig({ testTimeout: 150_000 });

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'swashbench-start-'));
  // As root the database runs as another user, who must be able to come in.
  chmodSync(folder, 0o755);
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

/** npm start's launcher on a free port with a data folder of its own, up to the line that says it is ready. */
async function start(
  env: Readonly<Record<string, string>> = {},
): Promise<{ child: ChildProcess; address: string; ended: Promise<number | null> }> {
  const child = spawn(process.execPath, ['server/launch/start.mjs'], {
    cwd: projectRoot,
    env: cleanEnvironment({ PORT: '0', DATA_DIR: join(folder, 'data'), ...env }),
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const ended = new Promise<number | null>((resolve) => {
    child.on('exit', (code) => resolve(code));
  });
  const address = await new Promise<string>((resolve, reject) => {
    let out = '';
    child.stdout.on('data', (data) => {
      out += data;
      const found = /ready: (\S+)/.exec(out)?.[1];
      if (found) resolve(found);
    });
    child.on('exit', () => reject(new Error(`the launcher ended: ${out}`)));
  });
  return { child, address, ended };
}

/** Processes, zombies aside, whose command line or environment speaks of this test's folder. */
function remains(): string[] {
  const found: string[] = [];
  for (const pid of readdirSync('/proc').filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid)) {
    try {
      const state = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ').pop()?.[0];
      const command = readFileSync(`/proc/${pid}/cmdline`, 'utf8');
      const environment = readFileSync(`/proc/${pid}/environ`, 'utf8');
      if (state !== 'Z' && (command.includes(folder) || environment.includes(folder)))
        found.push(`${pid} ${command.replaceAll('\0', ' ')}`);
    } catch {
      // The process ended while we looked, or belongs to somebody else.
    }
  }
  return found;
}

test.each([
  ['SIGINT', 130],
  ['SIGTERM', 143],
  ['SIGKILL', null],
] as const)('%s stops the server and the database and leaves no process', async (signal, code) => {
  const { child, address, ended } = await start();
  const health = (await (await fetch(`${address}api/health`)).json()) as { database: string };
  expect(health.database).toBe('answers');
  expect(remains().length).toBeGreaterThan(2);
  child.kill(signal);
  expect(await ended).toBe(code);
  await expect.poll(remains, { timeout: 15_000, interval: 100 }).toEqual([]);
  await expect(fetch(`${address}api/health`)).rejects.toThrow();
});

test('after a kill the next start finds the data again and needs no help', async () => {
  const first = await start();
  const password = readFileSync(join(folder, 'data', 'postgres-password'), 'utf8');
  first.child.kill('SIGKILL');
  await first.ended;
  const second = await start();
  expect(((await (await fetch(`${second.address}api/health`)).json()) as { status: string }).status).toBe('ok');
  expect(readFileSync(join(folder, 'data', 'postgres-password'), 'utf8')).toBe(password);
  second.child.kill('SIGTERM');
  await second.ended;
  expect(existsSync(join(folder, 'data', 'postgres', 'postmaster.pid'))).toBe(false);
});

test('with DATABASE_URL that database is migrated and used, and no other is made', async () => {
  const database = await createTestDatabase(inject('clusterUrl'), { migrated: false });
  const { child, address, ended } = await start({ DATABASE_URL: database.url });
  expect(((await (await fetch(`${address}api/health`)).json()) as { database: string }).database).toBe('answers');
  expect(await runMigrations(database.url), 'the server has migrated already').toEqual([]);
  child.kill('SIGTERM');
  await ended;
  expect(existsSync(join(folder, 'data'))).toBe(false);
  await database.drop();
});
