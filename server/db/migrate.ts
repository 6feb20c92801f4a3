/** npm run db:migrate and db:revert: the schema of the database at DATABASE_URL, up to date or one step back. */
import { configProblem, readConfig } from '#server/config.ts';
import { createDataSource } from './data-source.ts';
import { databasePlace, databaseProblem } from './database-problem.ts';
import { runMigrations } from './run-migrations.ts';

async function migrate(direction: string | undefined): Promise<string> {
  if (direction !== 'up' && direction !== 'down')
    return refuse('Say "up" to bring the schema up to date or "down" to take the last step back.');
  const config = readConfig(process.env);
  if (!config.ok) return refuse(configProblem(config.problems));
  const url = config.value.databaseUrl;
  if (!url) return refuse('Set DATABASE_URL to the database whose schema is meant.');
  const source = createDataSource(url, { statementTimeout: 0 });
  try {
    if (direction === 'down') {
      await source.initialize();
      await source.undoLastMigration();
      return 'The last migration was taken back.';
    }
    const names = await runMigrations(url);
    return names.length === 0 ? 'The schema is up to date.' : `Done: ${names.join(', ')}.`;
  } catch (error) {
    const sentence = databaseProblem(error, databasePlace(url));
    if (!sentence) throw error;
    return refuse(sentence);
  } finally {
    if (source.isInitialized) await source.destroy();
  }
}

function refuse(sentence: string): string {
  process.exitCode = 1;
  return sentence;
}

process.stdout.write(`${await migrate(process.argv[2])}\n`);
