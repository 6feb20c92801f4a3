/** npm start: brings everything the machine lacks, starts the database and the server, prints the address, and stops both again. */
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { ensureBuilt } from './build.mjs';
import { checkPort } from './check-port.mjs';
import { lockData } from './data-lock.mjs';
import { ensurePackages } from './ensure-packages.mjs';
import { ensurePostgres } from './find-postgres.mjs';
import { keepPostgres } from './keep-postgres.mjs';
import { root } from './paths.mjs';
import { Problem, sayProblem } from './problem.mjs';
import { endTools } from './run-tool.mjs';
import { startServerChild } from './server-child.mjs';
import { onStopSign } from './stop-signs.mjs';

const say = (line) => process.stdout.write(`${line}\n`);
const state = { stopping: false, release: null, database: null, server: null };

async function shutDown(code) {
  if (state.stopping) return;
  state.stopping = true;
  endTools();
  await state.server?.stop();
  await state.database?.stop();
  state.release?.();
  process.exit(code);
}

async function ownDatabase(folder) {
  state.release = lockData(folder);
  await ensurePostgres(say);
  if (state.stopping) return null;
  state.database = await keepPostgres({ folder }, (sentence) => {
    sayProblem(new Problem(sentence));
    shutDown(1);
  });
  return state.database.url;
}

async function start() {
  const port = Number(process.env.PORT || 8420);
  await checkPort(port, process.env.HOST || '127.0.0.1');
  await ensurePackages(say);
  await ensureBuilt(say);
  const { readConfig, configProblem } = await import(pathToFileURL(join(root, 'dist/server/config.js')).href);
  const config = readConfig(process.env);
  if (!config.ok) throw new Problem(configProblem(config.problems));
  const url = config.value.databaseUrl ?? (await ownDatabase(config.value.dataDir));
  if (state.stopping) return state.database?.stop();
  state.server = startServerChild(join(root, 'dist/server/main.js'), {
    env: { ...process.env, NODE_ENV: 'production', DATABASE_URL: url },
  });
  state.server.ready.then((address) => say(`Swashbench is ready: ${address}   (Ctrl-C stops it)`));
  state.server.exited.then((code) => shutDown(code));
}

onStopSign(
  (signal) => shutDown(signal === 'SIGINT' ? 130 : 143),
  () => state.server?.kill(),
);
start().catch((error) => {
  if (state.stopping) return;
  sayProblem(error);
  shutDown(1);
});
