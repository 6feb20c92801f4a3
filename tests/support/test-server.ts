import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Writable } from 'node:stream';
import { pino } from 'pino';
import { createApp, type Dependencies, usualLimits } from '#server/app.ts';
import { createDataSource } from '#server/db/data-source.ts';
import { databaseAnswers } from '#server/db/database-answers.ts';
import { createSimulateService } from '#server/features/simulate/simulate.service.ts';
import { listen } from '#server/http/listen.ts';
import { createSimulationPool, type PoolOptions } from '#server/jobs/simulation-pool.ts';
import { ENGINE_VERSION } from '#shared/simulation/engine-version.ts';

const PAGE = `<!doctype html><html lang="en"><head><meta charset="utf-8"><base href="/"><title>Page</title>
<script type="module" src="./assets/app-1.js" nonce="__CSP_NONCE__"></script></head><body></body></html>`;

export interface TestServerOptions {
  readonly databaseUrl: string;
  readonly config?: Partial<Dependencies['config']>;
  readonly limits?: Dependencies['limits'];
  readonly answerWithin?: number;
  readonly pool?: PoolOptions;
  readonly simulate?: Dependencies['simulate'];
  readonly withoutClient?: boolean;
}
export interface TestServer {
  /** http://127.0.0.1:<port>, without a closing slash. */
  readonly url: string;
  /** Every log line so far. */
  readonly log: readonly string[];
  close(): Promise<void>;
}

/** The real app on a free port, with a real database and real threads; the client is a page of one line. */
export async function startTestServer(options: TestServerOptions): Promise<TestServer> {
  const clientFolder = mkdtempSync(join(tmpdir(), 'swashbench-client-'));
  if (!options.withoutClient) {
    mkdirSync(join(clientFolder, 'assets'));
    writeFileSync(join(clientFolder, 'index.html'), PAGE);
    writeFileSync(join(clientFolder, 'assets', 'app-1.js'), 'export {};\n');
  }
  const log: string[] = [];
  const stream = new Writable({
    write(chunk, _encoding, done) {
      log.push(String(chunk));
      done();
    },
  });
  const source = createDataSource(options.databaseUrl);
  await source.initialize();
  const pool = createSimulationPool(options.pool ?? { threads: 1, timeLimit: 20_000 });
  const app = createApp({
    config: { publicUrl: null, trustProxy: 0, ...options.config },
    logger: pino({ level: 'debug', base: null }, stream),
    databaseAnswers: () => databaseAnswers(source),
    simulate: options.simulate ?? createSimulateService(pool),
    engineVersion: ENGINE_VERSION,
    clientFolder,
    limits: options.limits ?? { api: 100_000, simulate: 100_000 },
    answerWithin: options.answerWithin ?? usualLimits.answerWithin,
  });
  const listening = await listen(app, '127.0.0.1', 0);
  return {
    url: listening.address.replace(/\/$/, ''),
    log,
    close: async () => {
      await listening.close(500);
      await pool.close();
      if (source.isInitialized) await source.destroy();
      rmSync(clientFolder, { recursive: true, force: true });
    },
  };
}
