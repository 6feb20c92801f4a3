import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { Tolerance } from '#shared/simulation/result.ts';
import type { SimulationReply, SimulationRequest } from './worker-messages.ts';

/** The page's end of the simulation worker. */
export interface SimulationClient {
  /** Asks for one case; an older request of the same case is dropped. */
  run: (document: CircuitDocument, caseId: string, tolerance: Tolerance, urgent: boolean) => number;
  cancel: (request: number) => void;
  close: () => void;
}

export function createSimulationClient(onReply: (reply: SimulationReply) => void, onBroken: (message: string) => void): SimulationClient {
  const worker = new Worker(new URL('./simulation.worker.ts', import.meta.url), { type: 'module' });
  let last = 0;
  worker.onmessage = (event: MessageEvent<SimulationReply>) => onReply(event.data);
  worker.onerror = (event) => onBroken(event.message || 'The calculation could not be started.');
  const send = (message: SimulationRequest) => worker.postMessage(message);
  return {
    run: (document, caseId, tolerance, urgent) => {
      last += 1;
      send({ type: 'run', request: last, document, caseId, tolerance, urgent });
      return last;
    },
    cancel: (request) => send({ type: 'cancel', request }),
    close: () => worker.terminate(),
  };
}
