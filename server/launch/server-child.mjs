import { fork } from 'node:child_process';

/** Runs the server as a child with a channel: it stops when the channel closes, so even a killed launcher leaves no orphan.
 *  @returns {{ ready: Promise<string>, exited: Promise<number>, stop: () => Promise<number>, kill: () => void }} ready gives the address */
export function startServerChild(file, { env, execArgv = [] }) {
  const child = fork(file, [], {
    env,
    execArgv,
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  const exited = new Promise((resolve) => {
    child.on('exit', (code) => resolve(code ?? 1));
    child.on('error', () => resolve(1));
  });
  const ready = new Promise((resolve) => {
    child.on('message', (message) => {
      if (message?.type === 'ready') resolve(message.address);
    });
  });
  const stop = () => {
    if (child.connected) child.disconnect();
    const hurry = setTimeout(() => child.kill('SIGKILL'), 8000);
    return exited.finally(() => clearTimeout(hurry));
  };
  return { ready, exited, stop, kill: () => child.kill('SIGKILL') };
}
