import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { setValue } from '#shared/circuit/edit/values.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { evaluateToEnd } from '#shared/findings/evaluate.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';
import { startRunController } from './run-controller.ts';
import type { SimulationReply, SimulationRequest } from './worker-messages.ts';

type Run = Extract<SimulationRequest, { type: 'run' }>;

/** Stands for the browser's worker: keeps what was asked, answers when told to. */
class FakeWorker {
  static all: FakeWorker[] = [];
  readonly asked: Run[] = [];
  onmessage: ((event: { data: SimulationReply }) => void) | null = null;
  onerror: unknown = null;
  constructor() {
    FakeWorker.all.push(this);
  }
  postMessage(message: Run) {
    this.asked.push(message);
  }
  terminate() {}
}

const known = new Map<string, ReturnType<typeof evaluateToEnd>>();
const tolerances = { draft: 1e-3, normal: 1e-4, fine: 1e-6 } as const;

/** One true run of the demo per case and tolerance; the message is made anew, as a worker makes it. */
function answer({ request, caseId, tolerance }: Run): SimulationReply {
  const key = `${caseId} ${tolerance}`;
  if (!known.has(key)) known.set(key, evaluateToEnd(demoCircuit, caseId, tolerances[tolerance]));
  const outcome = known.get(key)!;
  if (!outcome.ok) throw new Error('the demo runs');
  const { run, assessment, curves } = outcome.evaluation;
  return { type: 'result', request, caseId, run: { ...run }, extra: { assessment, curves } };
}

const [a, b, c] = demoCircuit.cases.map((entry) => entry.id) as [string, string, string];
let stop: () => void;
let worker: FakeWorker;
const reply = (request: Run) => worker.onmessage?.({ data: answer(request) });
const last = () => worker.asked[worker.asked.length - 1]!;

/** @param displacement [cm³/rev] */
function turn(cubic: number) {
  const displacement = (cubic * 1e-6) / (2 * Math.PI);
  const { edit } = useDocument.getState();
  edit((document) => setValue(document, b, 'P1', 'maxVolumeStop', displacement).document);
}

beforeEach(() => {
  vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout', 'performance'] });
  vi.stubGlobal('Worker', FakeWorker);
  FakeWorker.all = [];
  useRuns.setState({ byCase: {}, due: {}, remedies: {} });
  useDocument.getState().load(demoCircuit);
  useDocument.getState().setActiveCase(b);
  useDocument.getState().toggleOverlay(a);
  stop = startRunController();
  worker = FakeWorker.all[0]!;
  for (const request of [...worker.asked]) reply(request);
});
afterEach(() => {
  stop();
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

describe('runs of the circuit in hand', () => {
  it('start with the case on the drawing, then overlaid ones, then the rest', () => {
    expect(worker.asked.map((request) => request.caseId)).toEqual([b, a, c]);
    expect(worker.asked.every((request) => request.tolerance === 'normal')).toBe(true);
    expect(Object.values(useRuns.getState().byCase).every((entry) => entry.state === 'done' && !entry.stale)).toBe(true);
    expect(useRuns.getState().due).toEqual({});
  });

  it('are due at once, but the former traces are marked stale only when the new ones keep us waiting', () => {
    turn(20);
    expect(useRuns.getState().due).toEqual({ [b]: true });
    expect(useRuns.getState().byCase[b]?.stale).toBe(false);
    vi.advanceTimersByTime(200);
    expect(useRuns.getState().byCase[b]).toMatchObject({ stale: true, state: 'running' });
    reply(last());
    expect(useRuns.getState().byCase[b]).toMatchObject({ stale: false, state: 'done' });
    expect(useRuns.getState().due).toEqual({});
  });

  it('go from one picture to the next in one change when the run comes soon', () => {
    const changes: boolean[] = [];
    const off = useRuns.subscribe((state, before) => changes.push(state.byCase !== before.byCase));
    turn(20);
    vi.advanceTimersByTime(30);
    reply(last());
    off();
    expect(changes.filter(Boolean)).toHaveLength(1);
    expect(useRuns.getState().byCase[b]?.document).toBe(useDocument.getState().document);
  });

  it('are drafts while a screw is in hand: one at a time, the newest next, a slow one given up', () => {
    useDocument.getState().beginGesture();
    const before = worker.asked.length;
    turn(20);
    turn(19);
    turn(18);
    expect(worker.asked.length - before).toBe(1);
    expect(last().tolerance).toBe('draft');
    reply(last());
    expect(worker.asked.length - before).toBe(2);
    expect(last().document).toBe(useDocument.getState().document);
    expect(useRuns.getState().due).toEqual({ [b]: true });
    vi.advanceTimersByTime(70);
    turn(17);
    expect(worker.asked.length - before).toBe(3);
    reply(last());
    expect(useRuns.getState().due).toEqual({});
    useDocument.getState().endGesture();
    vi.advanceTimersByTime(300);
    expect(last()).toMatchObject({ caseId: b, tolerance: 'normal' });
  });

  it('forget a case that was deleted while it ran', () => {
    turn(20);
    const request = last();
    useDocument.getState().edit((document) => ({ ...document, cases: document.cases.filter((entry) => entry.id !== b) }));
    reply(request);
    expect(useRuns.getState().byCase[b]).toBeUndefined();
    expect(useRuns.getState().due[b]).toBeUndefined();
  });
});
