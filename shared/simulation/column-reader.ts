import type { Block, ReadingSpec } from '../kinds/kind.ts';
import type { Column } from './circuit.ts';
import type { RowBuffer } from './row-buffer.ts';
import type { CircuitSystem } from './system.ts';

/** Writes one row of recorded numbers from the system's reading workspace. Pressures of ports are never below minus the
 *  atmospheric pressure here (the states may be, by the model's rounding); nothing else is clipped. */
export class ColumnReader {
  private readonly system: CircuitSystem;
  private readonly pressureColumn: number[] = [];
  private readonly pressureNode: number[] = [];
  private readonly flowColumn: number[] = [];
  private readonly flowSlot: number[] = [];
  private readonly readingColumn: number[] = [];
  private readonly readingValue: ReadingSpec['value'][] = [];
  private readonly readingBlock: Block[] = [];
  private readonly readingInstance: number[] = [];
  private readonly lineColumn: number[] = [];
  private readonly lineTerms: Column['terms'][] = [];

  constructor(system: CircuitSystem) {
    this.system = system;
    const { circuit } = system;
    circuit.columns.forEach((column, c) => {
      if (column.kind === 'pressure') {
        this.pressureColumn.push(c);
        this.pressureNode.push(column.at);
      } else if (column.kind === 'flow') {
        this.flowColumn.push(c);
        this.flowSlot.push(column.at);
      } else if (column.kind === 'reading') {
        const pair = circuit.blocks[column.at]!;
        this.readingColumn.push(c);
        this.readingValue.push(pair.kind.readings[column.reading]!.value);
        this.readingBlock.push(pair.reading);
        this.readingInstance.push(column.instance);
      } else if (column.kind === 'line') {
        this.lineColumn.push(c);
        this.lineTerms.push(column.terms);
      }
    });
  }

  /** Appends a row after `system.read`. Flows are positive into the component. */
  write(rows: RowBuffer, time: number): void {
    const at = rows.add(time);
    const { data, capacity } = rows;
    const w = this.system.reading;
    const floor = -this.system.circuit.run.atmosphere;
    const { pressureColumn, pressureNode, flowColumn, flowSlot, readingColumn, readingValue, readingBlock, readingInstance } = this;
    for (let k = 0; k < pressureColumn.length; k++) data[at + capacity * pressureColumn[k]!] = Math.max(w.y[pressureNode[k]!]!, floor);
    for (let k = 0; k < flowColumn.length; k++) data[at + capacity * flowColumn[k]!] = -w.balance[flowSlot[k]!]!;
    for (let k = 0; k < readingColumn.length; k++) {
      data[at + capacity * readingColumn[k]!] = readingValue[k]!(readingBlock[k]!, readingInstance[k]!, w);
    }
    const { lineColumn, lineTerms } = this;
    for (let k = 0; k < lineColumn.length; k++) {
      let sum = 0;
      for (const { slot, sign } of lineTerms[k]!) sum += sign * w.balance[slot]!;
      data[at + capacity * lineColumn[k]!] = sum;
    }
  }
}
