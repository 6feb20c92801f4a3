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

  /** Takes in the rows recorded since the last call. */
  fold(): void {
    const { times, rows } = this.rows;
    let totals = this.totals[this.totals.length - 1] ?? this.open(0);
    let first = this.next;
    for (let r = this.next; r < rows; r++) {
      const end = this.phases[this.totals.length - 1]?.to ?? Number.POSITIVE_INFINITY;
      if (times[r]! < end || this.totals.length >= this.phases.length) continue;
      this.take(totals, first, r + 1);
      totals = this.open(times[r]!);
      // Where an input jumps, the row before the jump ends the old phase and the row after it starts the new one.
      first = r + 1 < rows && times[r + 1] === times[r] ? r + 1 : r;
    }
    this.take(totals, first, rows);
    this.next = rows;
  }

  /** Tells that the buffer was thinned after `fold`. */
  thinned(): void {
    this.next = this.rows.rows;
  }

  /** Rows first … last−1 into one phase. */
  private take(totals: Totals, first: number, last: number): void {
    if (last <= first) return;
    const { times, data, columns, capacity } = this.rows;
    const follows = first > 0 && times[first - 1]! >= totals.from;
    for (let c = 0; c < columns; c++) {
      const base = c * capacity;
      let min = totals.min[c]!;
      let max = totals.max[c]!;
      let area = totals.area[c]!;
      let before = follows ? data[base + first - 1]! : data[base + first]!;
      let from = follows ? times[first - 1]! : times[first]!;
      for (let r = first; r < last; r++) {
        const value = data[base + r]!;
        const time = times[r]!;
        if (value < min) min = value;
        if (value > max) max = value;
        area += 0.5 * (time - from) * (value + before);
        before = value;
        from = time;
      }
      totals.min[c] = min;
      totals.max[c] = max;
      totals.area[c] = area;
      totals.end[c] = before;
    }
    totals.to = times[last - 1]!;
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
