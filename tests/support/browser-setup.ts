import { type ChildProcess, fork } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import type { TestProject } from 'vitest/node';
import { buildProduct } from './build-product.ts';
import { startTestCluster } from './database.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Address of the running product, with a closing slash. */
    baseUrl: string;
  }
}

const path = (relative: string) => fileURLToPath(new URL(`../../${relative}`, import.meta.url));

/** Once for all browser tests: the built client and server, as npm start runs them, on a free port with a database of their own.
 *  With BROWSER_ADDRESS (with its closing slash) a product that runs there already is used as it is. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  if (process.env.BROWSER_ADDRESS) {
    project.provide('baseUrl', process.env.BROWSER_ADDRESS);
    return async () => undefined;
  }
  await buildProduct();
  const cluster = await startTestCluster();
  const server = fork(path('dist/server/main.js'), [], {
    execArgv: [],
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      DATABASE_URL: cluster.url,
      HOST: '127.0.0.1',
      PORT: '0',
      PUBLIC_URL: '',
      LOG_LEVEL: 'error',
    },
  });
  project.provide('baseUrl', await readyAddress(server));
  return async () => {
    const ended = new Promise((resolve) => {
      server.on('exit', resolve);
    });
    server.disconnect();
    await ended;
    await cluster.stop();
  };
}

function readyAddress(server: ChildProcess): Promise<string> {
  return new Promise((resolve, reject) => {
    server.on('message', (message: { type?: string; local?: string }) => {
      if (message.type === 'ready' && message.local) resolve(message.local);
    });
    server.on('exit', (code) => reject(new Error(`the server ended with exit code ${code}`)));
  });
}
