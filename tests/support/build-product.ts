import { fork } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const script = fileURLToPath(new URL('../../server/launch/build.mjs', import.meta.url));

/** Builds client and server unless they are up to date. */
export function buildProduct(): Promise<void> {
  return new Promise((resolve, reject) => {
    const child = fork(script, [], { execArgv: [], stdio: 'inherit', env: { ...process.env, NODE_ENV: 'production' } });
    child.on('error', reject);
    child.on('exit', (code) => (code === 0 ? resolve() : reject(new Error('the product could not be built'))));
  });
}
