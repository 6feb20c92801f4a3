import { createServer, type RequestListener, type Server } from 'node:http';
import { isIP } from 'node:net';

const RECEIVE_WITHIN_MS = 30_000;
const HEADERS_WITHIN_MS = 10_000;

export interface Listening {
  readonly server: Server;
  /** Address to open in a browser. */
  readonly address: string;
  /** Stops taking requests, lets the ones at work finish for `patience` milliseconds, then cuts them off. */
  close(patience: number): Promise<void>;
}

/** Rejects with the system's error when the port cannot be had. */
export function listen(app: RequestListener, host: string, port: number): Promise<Listening> {
  const server = createServer({ requestTimeout: RECEIVE_WITHIN_MS, headersTimeout: HEADERS_WITHIN_MS }, app);
  const close = async (patience: number) => {
    const closed = new Promise<void>((resolve) => {
      server.close(() => resolve());
    });
    server.closeIdleConnections();
    const cut = setTimeout(() => server.closeAllConnections(), patience);
    await closed;
    clearTimeout(cut);
  };
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      server.off('error', reject);
      const bound = server.address();
      const actual = typeof bound === 'object' && bound ? bound.port : port;
      resolve({
        server,
        close,
        address: `http://${browserHost(host)}:${actual}/`,
      });
    });
  });
}

/** A host that a browser on this machine can open: 0.0.0.0 and :: mean every address, so the loopback one serves. */
function browserHost(host: string): string {
  if (host === '0.0.0.0' || host === '::') return 'localhost';
  return isIP(host) === 6 ? `[${host}]` : host;
}

/** Sentence for a port that cannot be had; null when the error is of another sort. */
export function listenProblem(error: unknown, host: string, port: number): string | null {
  const code = error instanceof Error && 'code' in error ? error.code : '';
  if (code === 'EADDRINUSE') return `Port ${port} on ${host} is in use by another program: stop it or set PORT to a free one.`;
  if (code === 'EACCES') return `This user may not listen on port ${port}: set PORT to 1024 or above.`;
  if (code === 'EADDRNOTAVAIL') return `${host} is not an address of this machine: correct HOST.`;
  return null;
}
