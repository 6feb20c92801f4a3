/** The server: reads its configuration, brings the schema up to date, listens, and stops in order when told. */
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import type { DataSource } from 'typeorm';
import { MAX_COMPUTE_SECONDS } from '#shared/api/simulate.ts';
import { ENGINE_VERSION } from '#shared/simulation/engine-version.ts';
import { createApp, usualLimits } from './app.ts';
import { type Config, configProblem, readConfig } from './config.ts';
import { createDataSource } from './db/data-source.ts';
import { databaseAnswers } from './db/database-answers.ts';
import { databasePlace, databaseProblem } from './db/database-problem.ts';
import { runMigrations } from './db/run-migrations.ts';
import { createSimulateService } from './features/simulate/simulate.service.ts';
import { type Listening, listen, listenProblem } from './http/listen.ts';
import { createSimulationPool } from './jobs/simulation-pool.ts';

/** Time for answers at work when the server stops [ms]. */
const PATIENCE_MS = 3000;

/** Starting cannot go on for a reason that one sentence tells. */
class StartProblem extends Error {}

async function openDatabase(url: string): Promise<DataSource> {
  const source = createDataSource(url);
  try {
    await runMigrations(url);
    await source.initialize();
    return source;
  } catch (error) {
    const sentence = databaseProblem(error, databasePlace(url));
    throw sentence ? new StartProblem(sentence, { cause: error }) : error;
  }
}

async function listenOn(config: Config, app: ReturnType<typeof createApp>): Promise<Listening> {
  try {
    return await listen(app, config.host, config.port);
  } catch (error) {
    const sentence = listenProblem(error, config.host, config.port);
    throw sentence ? new StartProblem(sentence, { cause: error }) : error;
  }
}

async function start(): Promise<void> {
  const read = readConfig(process.env);
  if (!read.ok) throw new StartProblem(configProblem(read.problems));
  const config = read.value;
  if (!config.databaseUrl) throw new StartProblem('DATABASE_URL is not set: npm start sets it to its own database.');
  const logger = pino({ level: config.logLevel, base: null });
  const source = await openDatabase(config.databaseUrl);
  const pool = createSimulationPool({ timeLimit: MAX_COMPUTE_SECONDS * 1000 });
  const app = createApp({
    config,
    logger,
    databaseAnswers: () => databaseAnswers(source),
    simulate: createSimulateService(pool),
    engineVersion: ENGINE_VERSION,
    clientFolder: fileURLToPath(new URL(import.meta.url.endsWith('.ts') ? '../dist/client' : '../client', import.meta.url)),
    ...usualLimits,
  });
  const listening = await listenOn(config, app);
  const stop = async () => {
    await listening.close(PATIENCE_MS);
    await pool.close();
    await source.destroy();
  };
  onStopSign(stop);
  const address = config.publicUrl ? `${config.publicUrl}/` : listening.address;
  if (process.send) process.send({ type: 'ready', address, local: listening.address });
  else process.stdout.write(`Swashbench is ready: ${address}\n`);
}

/** Signals, or the launcher that has gone: either way the server stops by itself. */
function onStopSign(stop: () => Promise<void>): void {
  let told = false;
  const handle = () => {
    if (told) return;
    told = true;
    const hurry = setTimeout(() => process.exit(1), PATIENCE_MS * 2);
    stop().then(
      () => {
        clearTimeout(hurry);
        process.exit(0);
      },
      () => process.exit(1),
    );
  };
  for (const sign of ['SIGINT', 'SIGTERM', 'disconnect']) process.on(sign, handle);
  if (process.send && !process.connected) handle();
}

if (process.send) process.on('disconnect', () => setTimeout(() => process.exit(1), PATIENCE_MS * 3).unref());
start().catch((error: unknown) => {
  const sentence =
    error instanceof StartProblem ? error.message : `The server did not start: ${error instanceof Error ? error.message : String(error)}`;
  process.stderr.write(`${sentence}\n`);
  process.exit(1);
});
