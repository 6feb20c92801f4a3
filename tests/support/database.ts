import { fork } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import pg from 'pg';
import { runMigrations } from '#server/db/run-migrations.ts';

const keeper = fileURLToPath(new URL('../../server/launch/postgres-keeper.mjs', import.meta.url));
const TEMPLATE = 'template_migrated';

export interface TestCluster {
  /** Address of the cluster's first database, which is never migrated. */
  readonly url: string;
  stop(): Promise<void>;
}

/** A throw-away PostgreSQL in a folder of its own. It ends with this process, however that ends. */
export function startTestCluster(): Promise<TestCluster> {
  const folder = mkdtempSync(join(tmpdir(), 'swashbench-test-'));
  const child = fork(keeper, [JSON.stringify({ folder, careless: true, removeAfter: true })], {
    detached: true,
    execArgv: [],
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  });
  const ended = new Promise<void>((resolve) => {
    child.on('exit', () => resolve());
  });
  return new Promise((resolve, reject) => {
    child.on('message', (message: { url?: string; problem?: string }) => {
      if (message.url === undefined) {
        reject(new Error(message.problem));
        return;
      }
      const stop = async () => {
        if (child.connected) child.disconnect();
        await ended;
      };
      resolve({ url: message.url, stop });
    });
    child.on('error', reject);
  });
}

/** Same cluster, another database. */
export function databaseUrl(clusterUrl: string, name: string): string {
  const url = new URL(clusterUrl);
  url.pathname = `/${name}`;
  return url.href;
}

async function command(clusterUrl: string, sql: string): Promise<void> {
  const client = new pg.Client({ connectionString: clusterUrl });
  await client.connect();
  try {
    await client.query(sql);
  } finally {
    await client.end();
  }
}

/** Migrates the database that every test file gets a copy of. */
export async function makeTemplate(clusterUrl: string): Promise<void> {
  await command(clusterUrl, `create database ${TEMPLATE}`);
  await runMigrations(databaseUrl(clusterUrl, TEMPLATE));
}

export interface TestDatabase {
  readonly url: string;
  drop(): Promise<void>;
}

/** A database of its own: a copy of the migrated template, or an empty one. */
export async function createTestDatabase(clusterUrl: string, { migrated = true } = {}): Promise<TestDatabase> {
  const name = `test_${randomUUID().replaceAll('-', '')}`;
  await command(clusterUrl, `create database ${name}${migrated ? ` template ${TEMPLATE}` : ''}`);
  return {
    url: databaseUrl(clusterUrl, name),
    drop: () => command(clusterUrl, `drop database if exists ${name} with (force)`),
  };
}
