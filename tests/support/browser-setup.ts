import { type ChildProcess, fork } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import type { TestProject } from 'vitest/node';
import { startTestCluster } from './database.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Address of the running product, with a closing slash. */
    baseUrl: string;
  }
}

const path = (relative: string) => fileURLToPath(new URL(`../../${relative}`, import.meta.url));

/** Once for all browser tests: the built client and server, as npm start runs them, on a free port with a database of their own. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  await build();
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

function build(): Promise<void> {
  return new Promise((resolve, reject) => {
    const child = fork(path('server/launch/build.mjs'), [], { execArgv: [], stdio: 'inherit' });
    child.on('exit', (code) => (code === 0 ? resolve() : reject(new Error('the product could not be built'))));
  });
}

function readyAddress(server: ChildProcess): Promise<string> {
  return new Promise((resolve, reject) => {
    server.on('message', (message: { type?: string; local?: string }) => {
      if (message.type === 'ready' && message.local) resolve(message.local);
    });
    server.on('exit', (code) => reject(new Error(`the server ended with exit code ${code}`)));
  });
}
