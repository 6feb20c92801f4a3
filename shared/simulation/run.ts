import { portInWords } from '../circuit/kind-lookup.ts';
import { breakpoints } from '../circuit/profile.ts';
import { Rosenbrock } from '../numerics/rosenbrock.ts';
import { defaultSolverOptions, type Integrator, type StepFailure } from '../numerics/solver.ts';
import { SparseLu } from '../numerics/sparse-lu.ts';
import type { CompiledCircuit } from './circuit.ts';
import { ENGINE_VERSION } from './engine-version.ts';
import { BitHash } from './hash.ts';
import type { RunResult } from './result.ts';
import { StepRecorder } from './step-recorder.ts';
import { CircuitSystem } from './system.ts';

/** Steps between two hand-backs to the host. */
const STEPS_PER_YIELD = 16;
/** Longest step: a hundredth of the duty, at most this [s]. Between accepted states channels and energy accounts live on the dense
 *  output, which is of lower order than the steps. */
const LONGEST_STEP = 0.25;
/** Pressure that counts as left behind [Pa], and flow below which a net counts as shut [m³/s]. */
const LEFT_PRESSURE = 5e5;
const SHUT_FLOW = 0.1e-3 / 60;

export interface RunOptions {
  /** Relative tolerance: 1e-3 draft, 1e-4 normal, 1e-6 fine. */
  readonly tolerance: number;
  /** Steps after which the run is given up [200 000]. */
  readonly stepCap?: number;
  /** Asked at every hand-back: true ends the run with what there is, status 'stopped'. */
  readonly stop?: () => boolean;
  /** Sees every accepted step with its dense output (for tests and second opinions). */
  readonly onStep?: (step: Integrator, system: CircuitSystem) => void;
}

export interface RunProgress {
  /** Time reached [s]. */
  readonly time: number;
}

/** Runs a compiled circuit from rest through its duty. Yields every few steps: the host reads the clock and decides when to
 *  give way or stop. Returns the result; a run that cannot go on returns what it has, with the reason and where it stuck. */
export function* runSimulation(circuit: CompiledCircuit, options: RunOptions): Generator<RunProgress, RunResult> {
  const system = new CircuitSystem(circuit);
  const solverOptions = {
    ...defaultSolverOptions,
    tolerance: options.tolerance,
    stepCap: options.stepCap ?? defaultSolverOptions.stepCap,
    longestStep: Math.min(circuit.duration / 100, LONGEST_STEP),
  };
  const integrator = new Rosenbrock(system, new SparseLu(circuit.pattern, circuit.symbolic), solverOptions);
  const recorder = new StepRecorder(system);
  const hash = new BitHash();
  const y = circuit.start.slice();
  let time = 0;
  let status: RunResult['status'] = 'finished';
  let countdown = STEPS_PER_YIELD;

  while (time < circuit.duration && status === 'finished') {
    const corners = breakpoints(system.inputs, circuit.duration);
    const end = corners.find((corner) => corner > time) ?? circuit.duration;
    const jumped = system.enterSegment(time);
    recorder.begin(time, y, time === 0 || jumped);
    integrator.begin(time, y, end);
    for (;;) {
      const outcome = integrator.step();
      if (outcome === 'end') break;
      if (outcome === 'failed') {
        status = 'failed';
        break;
      }
      options.onStep?.(integrator, system);
      const tripped = recorder.step(integrator);
      if (tripped) {
        integrator.dense(tripped.q, y);
        time = integrator.from + tripped.q * (integrator.to - integrator.from);
        system.override(tripped.input, { time, ramp: tripped.ramp, value: tripped.value });
      } else {
        y.set(integrator.after);
        time = integrator.to;
      }
      hash.add(time);
      hash.addAll(y, circuit.size);
      if (--countdown === 0) {
        countdown = STEPS_PER_YIELD;
        yield { time };
        if (options.stop?.()) {
          status = 'stopped';
          break;
        }
      }
      if (tripped) break;
    }
  }
  return resultOf(circuit, options.tolerance, status, time, y, integrator, recorder, hash);
}

/** Runs to the end without handing back. */
export function runToEnd(circuit: CompiledCircuit, tolerance: number, options: Omit<RunOptions, 'tolerance'> = {}): RunResult {
  const run = runSimulation(circuit, { ...options, tolerance });
  for (;;) {
    const next = run.next();
    if (next.done) return next.value;
  }
}

function resultOf(
  circuit: CompiledCircuit,
  tolerance: number,
  status: RunResult['status'],
  time: number,
  y: Float64Array,
  integrator: Rosenbrock,
  recorder: StepRecorder,
  hash: BitHash,
): RunResult {
  recorder.phases.fold();
  const phases = recorder.phases.summaries(circuit.channels);
  const { rows } = recorder;
  rows.thinForPlot();
  const left = pressureLeft(circuit, recorder, y);
  const columns = rows.split();
  const { counts } = integrator;
  const failure = status === 'failed' ? integrator.failure : null;
  return {
    engineVersion: ENGINE_VERSION,
    caseId: circuit.caseId,
    status,
    ...(failure ? failureWords(circuit, failure) : status === 'stopped' ? { reason: `Stopped at ${time.toFixed(3)} s.` } : {}),
    time,
    duration: circuit.duration,
    tolerance,
    times: rows.times.slice(0, rows.rows),
    channels: circuit.channels.map(({ address, label, quantity, column }) => ({ address, label, quantity, values: columns[column]! })),
    events: recorder.signals.events,
    phases,
    audit: recorder.audit.result(y),
    pressureLeft: left,
    statistics: { ...counts, states: circuit.size, nonzeros: circuit.symbolic.nonzeros },
    notes: circuit.notes,
    hash: hash.text(),
  };
}

/** Why and where a run stuck, in words. */
function failureWords(circuit: CompiledCircuit, failure: StepFailure): Pick<RunResult, 'reason' | 'stuck'> {
  const label = circuit.labels[failure.state];
  const where = label ? ` at ${label.words}` : '';
  const at = `${failure.time.toFixed(4)} s`;
  const reasons: Record<StepFailure['reason'], string> = {
    'not-finite-start': `The run cannot start: a value is not a number${where}.`,
    'step-too-small': `The run stuck at ${at}${where}: no step, however short, meets the tolerance there.`,
    'step-cap': `The run was given up at ${at}${where}: it takes more steps than allowed.`,
    singular: `The run stuck at ${at}${where}: the equations have no solution there.`,
  };
  return { reason: reasons[failure.reason], stuck: { component: label?.component, state: label?.words } };
}

/** Nets under pressure at the end through which nothing flows any more. */
function pressureLeft(
  circuit: CompiledCircuit,
  recorder: StepRecorder,
  y: Float64Array,
): { net: string; label: string; pressure: number }[] {
  const { rows } = recorder;
  if (rows.rows === 0) return [];
  const column = new Map(circuit.channels.map((channel) => [channel.address, channel.column]));
  return Array.from(circuit.netOfNode).flatMap((net, node) => {
    const { id, ports } = circuit.nets.oil[net]!;
    const pressure = y[node]!;
    const shut = ports.every(({ address }) => Math.abs(rows.latest(column.get(`${address}.flow`) ?? 0)) < SHUT_FLOW);
    if (pressure <= LEFT_PRESSURE || !shut) return [];
    const words = ports.map(({ component, port }) => portInWords(circuit.document, { component, port: port.id }));
    const label = words.length > 3 ? `${words.slice(0, 3).join(', ')} and ${words.length - 3} more` : words.join(', ');
    return [{ net: id, label, pressure }];
  });
}
