/** A process of its own that holds PostgreSQL for whoever forked it. It sends { url } when the database answers, or { problem },
 *  and stops the database when its parent says so, ends or is killed: the closed channel is the sign. It runs detached, so that
 *  Ctrl-C in a terminal reaches the launcher only and the database goes last.
 *  Argument: JSON { folder, careless?, removeAfter? }. */
import { chownSync, rmSync } from 'node:fs';
import pg from 'pg';
import { databaseUser } from './database-user.mjs';
import { ensurePostgres } from './find-postgres.mjs';
import { startCluster } from './postgres-cluster.mjs';
import { Problem, systemSentence } from './problem.mjs';

const { folder, careless, removeAfter } = JSON.parse(process.argv[2]);

async function ensureDatabase(url) {
  const target = new URL(url);
  const name = target.pathname.slice(1);
  target.pathname = '/postgres';
  const client = new pg.Client({ connectionString: target.href });
  await client.connect();
  const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [name]);
  if (!rowCount) await client.query(`create database "${name}"`);
  await client.end();
}

async function keep() {
  const user = databaseUser();
  if (removeAfter && user) chownSync(folder, user.uid, user.gid);
  const bin = await ensurePostgres(() => {});
  const cluster = await startCluster({ bin, folder, careless });
  let told = false;
  const stop = async () => {
    if (told) return;
    told = true;
    await cluster.stop();
    if (removeAfter) rmSync(folder, { recursive: true, force: true });
    process.exit(0);
  };
  process.on('disconnect', stop);
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
  if (!process.connected) return stop();
  cluster.end.then(() => {
    if (told) return;
    process.send?.({
      problem: `The database stopped by itself; ${folder}/postgres.log says why.`,
    });
    process.exit(1);
  });
  await ensureDatabase(cluster.url);
  process.send?.({ url: cluster.url });
}

keep().catch((error) => {
  const sentence =
    error instanceof Problem ? error.message : (systemSentence(error, folder) ?? `The database did not start: ${error.message}`);
  if (process.connected) process.send({ problem: sentence }, () => process.exit(1));
  else process.exit(1);
});
