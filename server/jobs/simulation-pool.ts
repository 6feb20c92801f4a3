import { availableParallelism } from 'node:os';
import { fileURLToPath } from 'node:url';
import { Piscina } from 'piscina';
import { AppError } from '#server/errors.ts';
import type { SimulateResponse } from '#shared/api/simulate.ts';
import type { SimulateJob, SimulateJobResult } from './simulate-job.ts';

export interface SimulationPool {
  /** Runs a job in a thread. Refuses with 'busy' when too many wait and 'too-slow' when the computing time is up.
   *  @param gone the caller has left: the run is given up */
  run(job: Omit<SimulateJob, 'within'>, gone: AbortSignal): Promise<SimulateResponse>;
  close(): Promise<void>;
}

export interface PoolOptions {
  readonly threads?: number;
  /** Jobs that may wait. */
  readonly queue?: number;
  /** Longest computing time of one run [ms]. */
  readonly timeLimit: number;
}

const WAITING_FOR_EACH_THREAD = 8;
const THREAD_MEMORY_MB = 512;
const IDLE_MS = 60_000;

export function createSimulationPool(options: PoolOptions): SimulationPool {
  const fromSources = import.meta.url.endsWith('.ts');
  const threads = options.threads ?? Math.max(1, availableParallelism() - 1);
  const most = threads + (options.queue ?? threads * WAITING_FOR_EACH_THREAD);
  const pool = new Piscina<SimulateJob, SimulateJobResult>({
    filename: fileURLToPath(new URL(`./simulate.thread.${fromSources ? 'ts' : 'js'}`, import.meta.url)),
    execArgv: fromSources ? ['--import', 'tsx'] : [],
    minThreads: 0,
    maxThreads: threads,
    idleTimeout: IDLE_MS,
    resourceLimits: { maxOldGenerationSizeMb: THREAD_MEMORY_MB },
  });
  let taken = 0;
  return {
    run: async (job, gone) => {
      if (taken >= most) throw new AppError('busy', { message: 'All simulation threads are busy: try again in a moment.', retryAfter: 2 });
      taken += 1;
      try {
        const result = await pool.run({ ...job, within: options.timeLimit }, { signal: gone });
        if (result.outcome === 'given-up') throw tooSlow(options.timeLimit, result.time, job.document.duty.duration);
        return result;
      } catch (cause) {
        if (!gone.aborted) throw cause;
        throw new AppError('too-slow', { message: 'The caller did not wait for the answer.', cause });
      } finally {
        taken -= 1;
      }
    },
    close: () => pool.destroy(),
  };
}

function tooSlow(limit: number, time: number, duration: number): AppError {
  const reached = `${time.toFixed(2)} s of ${duration} s`;
  return new AppError('too-slow', {
    message: `After ${limit / 1000} s of computing the run had reached ${reached} and was given up: shorten the duty or ask for the tolerance "draft".`,
  });
}
