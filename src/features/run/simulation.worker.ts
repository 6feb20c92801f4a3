import { type EvaluationOutcome, evaluateCase, evaluateToEnd } from '#shared/findings/evaluate.ts';
import { tolerances } from '#shared/simulation/result.ts';
import { warmUpCircuit } from './warm-up.ts';
import { type RunExtra, type SimulationReply, type SimulationRequest, transferables } from './worker-messages.ts';

/** Host of the engine in the browser: newest request of a case wins, cancellable, hands control back every few milliseconds. */

const SLICE = 5;
const PROGRESS = 120;

interface Job {
  readonly request: Extract<SimulationRequest, { type: 'run' }>;
  readonly steps: Generator<{ time: number }, EvaluationOutcome>;
  said: number;
}

const waiting: Job[] = [];
let job: Job | null = null;
const channel = new MessageChannel();

function reply(message: SimulationReply, transfer: Transferable[] = []) {
  self.postMessage(message, { transfer });
}

function drop(request: number | null, caseId: string | null) {
  const matches = (one: Job) => one.request.request === request || (caseId !== null && one.request.caseId === caseId);
  for (let i = waiting.length - 1; i >= 0; i--) if (matches(waiting[i]!)) waiting.splice(i, 1);
  if (job && matches(job)) {
    reply({
      type: 'cancelled',
      request: job.request.request,
      caseId: job.request.caseId,
    });
    job = null;
  }
}

function finish(done: Job, outcome: EvaluationOutcome) {
  const { request, caseId } = done.request;
  if (!outcome.ok) {
    reply({ type: 'refused', request, caseId, problems: outcome.problems });
    return;
  }
  const { run, assessment, curves } = outcome.evaluation;
  const extra: RunExtra = { assessment, curves };
  reply({ type: 'result', request, caseId, run, extra }, transferables(run, curves));
}

function slice() {
  if (!job) job = waiting.shift() ?? null;
  if (!job) return;
  const began = performance.now();
  const current = job;
  try {
    for (;;) {
      const next = current.steps.next();
      if (next.done) {
        job = null;
        finish(current, next.value);
        break;
      }
      const now = performance.now();
      if (now - began > SLICE) {
        if (now - current.said > PROGRESS) {
          current.said = now;
          const { request, caseId, document } = current.request;
          reply({
            type: 'progress',
            request,
            caseId,
            time: next.value.time,
            duration: document.duty.duration,
          });
        }
        break;
      }
    }
  } catch (error) {
    job = null;
    const { request, caseId } = current.request;
    reply({
      type: 'broken',
      request,
      caseId,
      message: error instanceof Error ? error.message : String(error),
    });
  }
  if (job || waiting.length > 0) channel.port2.postMessage(null);
}

channel.port1.onmessage = slice;

self.onmessage = (event: MessageEvent<SimulationRequest>) => {
  const message = event.data;
  if (message.type === 'cancel') {
    drop(message.request, null);
    return;
  }
  drop(null, message.caseId);
  const idle = !job && waiting.length === 0;
  const steps = evaluateCase(message.document, message.caseId, tolerances[message.tolerance]);
  const next: Job = { request: message, steps, said: performance.now() };
  if (message.urgent) waiting.unshift(next);
  else waiting.push(next);
  if (idle) channel.port2.postMessage(null);
};

evaluateToEnd(warmUpCircuit, warmUpCircuit.cases[0]!.id, tolerances.draft);
reply({ type: 'ready' });
