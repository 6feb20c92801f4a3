/** npm run dev: the database, the API from its sources (restarted on every change) and the client with hot reloading,
 *  on one address. */
import { watch } from 'node:fs';
import { join } from 'node:path';
import { checkPort } from './check-port.mjs';
import { lockData } from './data-lock.mjs';
import { ensurePackages } from './ensure-packages.mjs';
import { ensurePostgres } from './find-postgres.mjs';
import { keepPostgres } from './keep-postgres.mjs';
import { root } from './paths.mjs';
import { Problem, sayProblem } from './problem.mjs';
import { startServerChild } from './server-child.mjs';
import { onStopSign } from './stop-signs.mjs';

const say = (line) => process.stdout.write(`${line}\n`);
const state = {
  stopping: false,
  release: null,
  database: null,
  api: null,
  vite: null,
};

async function shutDown(code) {
  if (state.stopping) return;
  state.stopping = true;
  await state.vite?.close();
  await state.api?.stop();
  await state.database?.stop();
  state.release?.();
  process.exit(code);
}

async function readConfiguration() {
  const { tsImport } = await import('tsx/esm/api');
  const { readConfig, configProblem } = await tsImport(join(root, 'server/config.ts'), import.meta.url);
  const config = readConfig(process.env);
  if (!config.ok) throw new Problem(configProblem(config.problems));
  return config.value;
}

async function ownDatabase(folder) {
  state.release = lockData(folder);
  await ensurePostgres(say);
  state.database = await keepPostgres({ folder }, (sentence) => {
    sayProblem(new Problem(sentence));
    shutDown(1);
  });
  return state.database.url;
}

/** Starts the API and starts it again 100 ms after the last change of a source. */
function runApi(env) {
  const begin = () => {
    const api = startServerChild(join(root, 'server/main.ts'), {
      env,
      execArgv: ['--import', 'tsx'],
    });
    state.api = api;
    api.exited.then((code) => {
      if (state.api === api && !state.stopping) say(`The server ended (exit code ${code}); it starts again at the next change.`);
    });
  };
  let timer;
  const again = (_event, file) => {
    if (!file?.endsWith('.ts') || file.endsWith('.test.ts')) return;
    clearTimeout(timer);
    timer = setTimeout(async () => {
      const old = state.api;
      state.api = null;
      await old?.stop();
      if (!state.stopping) begin();
    }, 100);
  };
  for (const folder of ['server', 'shared']) watch(join(root, folder), { recursive: true }, again);
  begin();
  return Promise.race([state.api.ready, state.api.exited]);
}

async function start() {
  await ensurePackages(say);
  const config = await readConfiguration();
  await checkPort(config.port, config.host);
  const apiPort = config.port + 1;
  await checkPort(apiPort, '127.0.0.1');
  const url = config.databaseUrl ?? (await ownDatabase(config.dataDir));
  runApi({
    ...process.env,
    DATABASE_URL: url,
    HOST: '127.0.0.1',
    PORT: String(apiPort),
  });
  const { createServer } = await import('vite');
  state.vite = await createServer({
    root,
    server: {
      host: config.host,
      port: config.port,
      strictPort: true,
      proxy: {
        '/api': { target: `http://127.0.0.1:${apiPort}`, changeOrigin: false },
      },
    },
  });
  await state.vite.listen();
  say(`Swashbench for developers: http://${config.host}:${config.port}/   (Ctrl-C stops it)`);
}

onStopSign(
  (signal) => shutDown(signal === 'SIGINT' ? 130 : 143),
  () => process.exit(1),
);
start().catch((error) => {
  if (state.stopping) return;
  sayProblem(error);
  shutDown(1);
});
