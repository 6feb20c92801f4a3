import { createServer } from 'node:net';
import { Problem } from './problem.mjs';

/** Refuses a port that is taken before any long work starts. What is not a port at all is left to the server's own check. */
export function checkPort(port, host) {
  return new Promise((resolve, reject) => {
    if (!Number.isInteger(port) || port < 1 || port > 65_535) return resolve();
    const probe = createServer();
    probe.on('error', (error) => {
      if (error.code === 'EADDRINUSE') {
        reject(new Problem(`Port ${port} on ${host} is in use by another program: stop it or set PORT to a free one.`));
      } else if (error.code === 'EACCES') {
        reject(new Problem(`This user may not listen on port ${port}: set PORT to 1024 or above.`));
      } else resolve();
    });
    probe.listen(port, host, () => probe.close(() => resolve()));
  });
}
