import type { DataSource } from 'typeorm';
import { createDataSource } from './data-source.ts';

/** Any number that nothing else in the database uses as an advisory lock. */
const LOCK = 7_301_984;

/** Brings the schema up to date. Several processes may start at once: one migrates, the others wait and find nothing to do.
 *  On connections of its own, without a time limit: neither waiting for another server nor rewriting a table may be cut off.
 *  @returns names of the migrations that ran */
export async function runMigrations(url: string): Promise<string[]> {
  const source = createDataSource(url, { statementTimeout: 0 });
  try {
    await source.initialize();
    return await migrateLocked(source);
  } finally {
    if (source.isInitialized) await source.destroy();
  }
}

async function migrateLocked(source: DataSource): Promise<string[]> {
  const runner = source.createQueryRunner();
  await runner.connect();
  try {
    await runner.query('select pg_advisory_lock($1)', [LOCK]);
    try {
      return (await source.runMigrations()).map((migration) => migration.name);
    } finally {
      await runner.query('select pg_advisory_unlock($1)', [LOCK]);
    }
  } finally {
    await runner.release();
  }
}
