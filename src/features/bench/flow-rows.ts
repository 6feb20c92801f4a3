import { flowOrder } from '#shared/circuit/flow-order.ts';
import { findKind, nameInWords } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument, Component } from '#shared/circuit/schema.ts';
import { LEAST_FLOW } from '#shared/pictures/pressure-ink.ts';
import type { Moment } from '#src/components/schematic/moment.ts';
import type { Format } from '#src/components/use-format.ts';
import { motorLines } from './reading-specs.ts';

/** Rows of the component list: every part in flow order with what it does at the moment. */
export interface FlowRow {
  readonly component: Component;
  readonly title: string;
}

export interface RowWords {
  readonly value: string;
  readonly unit: string;
  readonly note: string;
}

export function flowRows(document: CircuitDocument): FlowRow[] {
  const rows: FlowRow[] = [];
  for (const id of flowOrder(document)) {
    const component = document.components.find((entry) => entry.id === id);
    const kind = component && findKind(component.kind);
    if (!component || !kind || kind.id === 'junction' || kind.id === 'tank') continue;
    const word = kind.word.charAt(0).toUpperCase() + kind.word.slice(1);
    const name = nameInWords(component);
    rows.push({ component, title: name === kind.word ? word : `${word} ${name}` });
  }
  return rows;
}

/** What a row says: the main reading, and a note of words and further readings. */
export function rowWords({ component }: FlowRow, { at, run, time }: Moment, format: Format): RowWords {
  const { id } = component;
  const kind = findKind(component.kind);
  const reading = (name: string) => at(`${id}.${name}`);
  const text = (name: string) => {
    const spec = kind?.readings.find((entry) => entry.id === name);
    const value = reading(name);
    return spec && value !== undefined ? format.quantity(value, spec.quantity).text : '';
  };
  const main = (name: string, note: string): RowWords => {
    const spec = kind?.readings.find((entry) => entry.id === name);
    const value = reading(name);
    if (!spec || value === undefined) return { value: '', unit: '', note };
    const shown = format.quantity(value, spec.quantity);
    return { value: shown.value, unit: shown.unit, note };
  };
  if (!run || !kind) return { value: '', unit: '', note: 'not run yet' };
  switch (kind.id) {
    case 'electric-motor': {
      const [first, second] = motorLines(run, time, at, id, format);
      const speed = text('speed');
      if (first?.unit === '') return { value: first.value, unit: '', note: `${second?.value ?? ''} ${second?.unit ?? ''}, ${speed}` };
      return { value: second?.value ?? '', unit: second?.unit ?? '', note: `${first?.value ?? ''} ${first?.unit ?? ''}, ${speed}` };
    }
    case 'compensated-pump':
      return main('flow', joinNotes(text('outletPressure'), text('displacement')));
    case 'relief-valve': {
      const passing = Math.abs(reading('flow') ?? 0) >= LEAST_FLOW;
      return main('flow', passing ? 'passing' : 'closed');
    }
    case 'check-valve':
      return main('flow', Math.abs(reading('flow') ?? 0) >= LEAST_FLOW ? 'open' : 'closed');
    case 'directional-valve-4-3':
    case 'directional-valve-4-2': {
      const near = Math.round(reading('spool') ?? 0);
      const word = kind.inputs.find((input) => input.id === 'spool')?.words?.find((entry) => entry.value === near)?.label ?? '';
      return main('flowP', word);
    }
    case 'cylinder':
      return main('force', joinNotes(`${text('position')} extended`));
    default: {
      const [first, second] = kind.readings;
      return first ? main(first.id, second ? `${second.label.toLowerCase()} ${text(second.id)}` : '') : { value: '', unit: '', note: '' };
    }
  }
}

function joinNotes(...notes: readonly string[]): string {
  return notes.filter((note) => note !== '').join(', ');
}
