import { availableParallelism } from 'node:os';
import { fileURLToPath } from 'node:url';
import { Piscina } from 'piscina';
import { AppError } from '#server/errors.ts';
import type { SimulateJob, SimulateJobResult } from './simulate-job.ts';

export interface SimulationPool {
  /** Runs a job in a thread. Refuses with 'busy' when the queue is full and 'too-slow' when the time is up.
   *  @param signal gives the run up */
  run(job: SimulateJob, signal: AbortSignal): Promise<SimulateJobResult>;
  close(): Promise<void>;
}

export interface PoolOptions {
  readonly threads?: number;
  /** Jobs that may wait. */
  readonly queue?: number;
  /** Longest time from asking to answer [ms]. */
  readonly timeLimit: number;
}

const WAITING_FOR_EACH_THREAD = 8;
const THREAD_MEMORY_MB = 512;
const IDLE_MS = 60_000;

export function createSimulationPool(options: PoolOptions): SimulationPool {
  const fromSources = import.meta.url.endsWith('.ts');
  const threads = options.threads ?? Math.max(1, availableParallelism() - 1);
  const pool = new Piscina<SimulateJob, SimulateJobResult>({
    filename: fileURLToPath(new URL(`./simulate.thread.${fromSources ? 'ts' : 'js'}`, import.meta.url)),
    execArgv: fromSources ? ['--import', 'tsx'] : [],
    minThreads: 0,
    maxThreads: threads,
    maxQueue: options.queue ?? threads * WAITING_FOR_EACH_THREAD,
    idleTimeout: IDLE_MS,
    resourceLimits: { maxOldGenerationSizeMb: THREAD_MEMORY_MB },
  });
  return {
    run: async (job, gone) => {
      const late = AbortSignal.timeout(options.timeLimit);
      try {
        return await pool.run(job, { signal: AbortSignal.any([late, gone]) });
      } catch (cause) {
        throw refusal(cause, late.aborted, gone.aborted, options.timeLimit) ?? cause;
      }
    },
    close: () => pool.destroy(),
  };
}

function refusal(cause: unknown, late: boolean, gone: boolean, timeLimit: number): AppError | null {
  if (late) {
    const message = `The run was not ready after ${timeLimit / 1000} s and was given up: shorten the duty or ask for the tolerance "draft".`;
    return new AppError('too-slow', { message, cause });
  }
  if (gone)
    return new AppError('too-slow', {
      message: 'The caller did not wait for the answer.',
      cause,
    });
  const text = cause instanceof Error ? cause.message : '';
  if (/queue is at limit|No task queue available/i.test(text)) {
    return new AppError('busy', {
      message: 'All simulation threads are busy: try again in a moment.',
      retryAfter: 2,
      cause,
    });
  }
  return null;
}
