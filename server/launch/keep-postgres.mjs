import { fork } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { Problem } from './problem.mjs';

const keeper = fileURLToPath(new URL('./postgres-keeper.mjs', import.meta.url));

/** Starts the keeper and waits until the database answers.
 *  @param {{ folder: string }} options @param {(sentence: string) => void} onEnd called when the database dies under us
 *  @returns {Promise<{ url: string, stop: () => Promise<void> }>} */
export function keepPostgres(options, onEnd) {
  const child = fork(keeper, [JSON.stringify(options)], {
    detached: true,
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  });
  const exited = new Promise((resolve) => {
    child.on('exit', resolve);
  });
  let stopping = false;
  const stop = async () => {
    stopping = true;
    if (child.connected) child.disconnect();
    await exited;
  };
  return new Promise((resolve, reject) => {
    let started = false;
    child.on('message', (message) => {
      if (message.url) {
        started = true;
        resolve({ url: message.url, stop });
      } else if (!started) reject(new Problem(message.problem));
      else if (!stopping) onEnd(message.problem);
    });
    child.on('error', reject);
    exited.then(() => {
      if (!started) reject(new Problem('The database did not start.'));
      else if (!stopping) onEnd('The process that keeps the database ended.');
    });
  });
}
