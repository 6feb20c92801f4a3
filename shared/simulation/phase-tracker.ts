import { quantityInWords } from '../circuit/in-words.ts';
import type { CircuitDocument } from '../circuit/schema.ts';
import { commandWords } from '../duty/command-words.ts';
import { type DutyPhase, dutyPhases } from '../duty/phases.ts';
import { kindOf } from '../kinds/registry.ts';
import type { ChannelPlan } from './circuit.ts';
import type { PhaseSummary } from './result.ts';
import type { RowBuffer } from './row-buffer.ts';

interface Totals {
  readonly from: number;
  to: number;
  readonly min: Float64Array;
  readonly max: Float64Array;
  readonly area: Float64Array;
  readonly end: Float64Array;
}

/** Least, most, time average and end value of every column in every phase of the duty, from all rows before any thinning. */
export class PhaseTracker {
  private readonly rows: RowBuffer;
  private readonly phases: readonly DutyPhase[];
  private readonly totals: Totals[] = [];
  private next = 0;

  constructor(document: CircuitDocument, rows: RowBuffer) {
    this.rows = rows;
    this.phases = dutyPhases(document.duty, (command) => commandWords(document, kindOf, command, quantityInWords));
  }

  private open(from: number): Totals {
    const { columns } = this.rows;
    const totals = {
      from,
      to: from,
      min: new Float64Array(columns).fill(Number.POSITIVE_INFINITY),
      max: new Float64Array(columns).fill(Number.NEGATIVE_INFINITY),
      area: new Float64Array(columns),
      end: new Float64Array(columns),
    };
    this.totals.push(totals);
    return totals;
  }

  /** Takes in the rows recorded since the last call. The last row is kept open for the next call. */
  fold(): void {
    const { times, data, rows, columns } = this.rows;
    let totals = this.totals[this.totals.length - 1] ?? this.open(0);
    for (let r = this.next; r < rows; r++) {
      const time = times[r]!;
      const at = r * columns;
      const dt = r > 0 ? time - times[r - 1]! : 0;
      this.take(totals, data, at, columns, dt);
      totals.to = time;
      const end = this.phases[this.totals.length - 1]?.to ?? Number.POSITIVE_INFINITY;
      const more = r + 1 < rows ? times[r + 1]! : Number.POSITIVE_INFINITY;
      if (time >= end && this.totals.length < this.phases.length) {
        totals = this.open(time);
        // Where an input jumps, the row before the jump ends the old phase and the row after it starts the new one.
        if (more > time) this.take(totals, data, at, columns, 0);
      }
    }
    this.next = rows;
  }

  /** Tells that the buffer was thinned after `fold`. */
  thinned(): void {
    this.next = this.rows.rows;
  }

  private take(totals: Totals, data: Float64Array, at: number, columns: number, dt: number): void {
    const { min, max, area, end } = totals;
    for (let c = 0; c < columns; c++) {
      const value = data[at + c]!;
      if (value < min[c]!) min[c] = value;
      if (value > max[c]!) max[c] = value;
      if (dt > 0) area[c]! += 0.5 * dt * (value + data[at - columns + c]!);
      end[c] = value;
    }
  }

  summaries(channels: readonly ChannelPlan[]): PhaseSummary[] {
    return this.totals.flatMap((totals, p) => {
      const phase = this.phases[p];
      if (!phase || (totals.to <= totals.from && p > 0)) return [];
      const span = totals.to - totals.from;
      const record: Record<string, { min: number; max: number; mean: number; end: number }> = {};
      for (const { address, column: c } of channels) {
        const end = totals.end[c]!;
        record[address] = { min: totals.min[c]!, max: totals.max[c]!, mean: span > 0 ? totals.area[c]! / span : end, end };
      }
      return [{ label: phase.label, from: totals.from, to: totals.to, channels: record }];
    });
  }
}
