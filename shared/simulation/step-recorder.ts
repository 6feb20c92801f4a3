import type { Integrator } from '../numerics/solver.ts';
import { Audit } from './audit.ts';
import { ColumnReader } from './column-reader.ts';
import { PhaseTracker } from './phase-tracker.ts';
import { RowBuffer } from './row-buffer.ts';
import { SignalWatch, type Tripped } from './signal-watch.ts';
import type { CircuitSystem } from './system.ts';

/** Watches a run step by step: rows of all channels, events, energy accounts, phases. */
export class StepRecorder {
  readonly rows: RowBuffer;
  readonly signals: SignalWatch;
  readonly audit: Audit;
  readonly phases: PhaseTracker;
  private readonly system: CircuitSystem;
  private readonly reader: ColumnReader;
  private readonly y: Float64Array;
  /** Steps up to this length [s] are looked at in their middle and at their end only, longer ones at every quarter: the picture of a
   *  run has no more than a few thousand places across. */
  private readonly short: number;

  constructor(system: CircuitSystem) {
    this.system = system;
    this.rows = new RowBuffer(system.circuit.columns.length);
    this.reader = new ColumnReader(system);
    this.signals = new SignalWatch(system);
    this.audit = new Audit(system);
    this.phases = new PhaseTracker(system.circuit.document, this.rows);
    this.y = new Float64Array(system.length);
    this.short = system.circuit.duration / 4000;
  }

  private row(time: number): void {
    this.reader.write(this.rows, time);
  }

  /** State at the start of a segment: a row where the run starts or an input jumped. */
  begin(time: number, y: Float64Array, withRow: boolean): void {
    this.system.read(time, y);
    this.audit.sample(0);
    if (withRow) this.row(time);
    this.signals.begin();
  }

  /** Takes in the step just accepted. When an acting event falls into it, only the part up to the event is taken, and the
   *  event returned: the run then goes on from there. */
  step(integrator: Integrator): Tripped | null {
    const mark = this.signals.mark();
    const rows = this.rows.rows;
    const tripped = this.take(integrator, 1);
    if (tripped === null) {
      this.finish(integrator, 1);
      return null;
    }
    this.signals.rollback(mark);
    this.rows.rows = rows;
    this.take(integrator, tripped.q);
    this.signals.acted(tripped);
    this.finish(integrator, tripped.q);
    return tripped;
  }

  private take(integrator: Integrator, end: number): Tripped | null {
    const { system, y } = this;
    const length = integrator.to - integrator.from;
    let tripped: Tripped | null = null;
    const stride = length > this.short ? 1 : 2;
    for (let k = stride; k <= 4; k += stride) {
      const q = end * (k / 4);
      const whole = q === 1;
      if (!whole) integrator.dense(q, y);
      const time = whole ? integrator.to : integrator.from + q * length;
      system.read(time, whole ? integrator.after : y);
      this.row(time);
      if (k % 2 === 0) this.audit.sample(k / 2);
      tripped = this.signals.look(integrator, end * ((k - stride) / 4), q) ?? tripped;
      if (tripped !== null && end === 1) return tripped;
    }
    return null;
  }

  private finish(integrator: Integrator, q: number): void {
    this.audit.commit(integrator, q);
    if (!this.rows.full) return;
    this.phases.fold();
    this.rows.thin(this.rows.rows >> 1);
    this.phases.thinned();
  }
}
