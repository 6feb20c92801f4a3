import type { Block, SignalSpec, TripSpec } from '../kinds/kind.ts';
import { bisect, crosses } from '../numerics/events.ts';
import type { Integrator } from '../numerics/solver.ts';
import type { RunEvent } from './result.ts';
import type { CircuitSystem } from './system.ts';

/** Events kept in a result; a signal that chatters more than this is cut short. */
const MOST_EVENTS = 5000;

interface Watched {
  readonly spec: SignalSpec;
  readonly block: Block;
  readonly instance: number;
  readonly component: string;
  /** Acting event of this signal, and the input it overrides. */
  readonly trip: TripSpec | undefined;
  readonly tripInput: number;
  readonly tripRamp: number;
}

/** A trip that has happened. */
export interface Tripped {
  readonly q: number;
  readonly input: number;
  readonly ramp: number;
  readonly value: number;
  readonly index: number;
}

/** Looks at the signals of every component at each recorded place and narrows their sign changes down on the dense output. */
export class SignalWatch {
  readonly events: RunEvent[] = [];
  private readonly system: CircuitSystem;
  private readonly watched: Watched[] = [];
  private readonly before: Float64Array;
  private readonly now: Float64Array;
  private readonly atStart: Float64Array;
  private readonly done: Uint8Array;
  private readonly y: Float64Array;

  constructor(system: CircuitSystem) {
    this.system = system;
    for (const { kind, block, reading } of system.circuit.blocks) {
      const inputs = kind.inputs.map((input) => input.id);
      for (let instance = 0; instance < block.count; instance++) {
        for (const spec of kind.signals) {
          const trip = kind.trips.find((entry) => entry.signal === spec.id);
          const at = trip ? inputs.indexOf(trip.input) : -1;
          this.watched.push({
            spec,
            block: reading,
            instance,
            component: block.componentIds[instance]!,
            trip: at < 0 ? undefined : trip,
            tripInput: at < 0 ? -1 : block.input[instance * block.inputCount + at]!,
            tripRamp: kind.inputs[at]?.ramp ?? 0,
          });
        }
      }
    }
    const count = this.watched.length;
    this.before = new Float64Array(count);
    this.now = new Float64Array(count);
    this.atStart = new Float64Array(count);
    this.done = new Uint8Array(count);
    this.y = new Float64Array(system.length);
  }

  /** Takes the signals as they are after `system.read`, without looking for crossings (start of a segment). */
  begin(): void {
    this.measure(this.before);
  }

  /** Remembers where the step starts, so that it can be looked at again. */
  mark(): number {
    this.atStart.set(this.before);
    return this.events.length;
  }

  rollback(mark: number): void {
    this.before.set(this.atStart);
    this.events.length = mark;
  }

  private measure(into: Float64Array): void {
    const { watched } = this;
    const w = this.system.reading;
    for (let k = 0; k < watched.length; k++) {
      const { spec, block, instance } = watched[k]!;
      into[k] = spec.value(block, instance, w);
    }
  }

  /** Measures at place `q` (after `system.read` there) and logs every crossing since place `from`. Returns the earliest
   *  acting event that has not acted yet, or null. Leaves the reading workspace at another place. */
  look(integrator: Integrator, from: number, q: number): Tripped | null {
    const { watched, before, now, done } = this;
    this.measure(now);
    let tripped: Tripped | null = null;
    const found: RunEvent[] = [];
    for (let k = 0; k < watched.length; k++) {
      const crossing = crosses(before[k]!, now[k]!);
      before[k] = now[k]!;
      if (crossing === null) continue;
      const { spec, component, trip, tripInput, tripRamp } = watched[k]!;
      const rising = crossing === 'rises';
      const place = bisect((at) => this.valueAt(k, integrator, at), from, q, rising, integrator.to - integrator.from);
      const time = integrator.from + place * (integrator.to - integrator.from);
      if (trip && rising && !done[k] && (tripped === null || place < tripped.q)) {
        tripped = { q: place, input: tripInput, ramp: tripRamp, value: trip.value, index: k };
      }
      if (this.events.length + found.length < MOST_EVENTS) {
        found.push({ signal: spec.id, component, time, rising, label: rising ? spec.rises : spec.falls });
      }
    }
    found.sort((a, b) => a.time - b.time);
    this.events.push(...found);
    return tripped;
  }

  /** An acting event acts once a run. */
  acted(tripped: Tripped): void {
    this.done[tripped.index] = 1;
  }

  private valueAt(k: number, integrator: Integrator, q: number): number {
    const { spec, block, instance } = this.watched[k]!;
    integrator.dense(q, this.y);
    this.system.read(integrator.from + q * (integrator.to - integrator.from), this.y);
    return spec.value(block, instance, this.system.reading);
  }
}
