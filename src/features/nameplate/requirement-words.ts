import { findKind, nameInWords } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument, Requirement } from '#shared/circuit/schema.ts';
import type { QuantityId } from '#shared/units/quantities.ts';

/** What may be required: the two yardsticks of motor load that have a limit, and any reading or port pressure. */
export interface Requirable {
  readonly address: string;
  readonly words: string;
  readonly quantity: QuantityId;
}

export function requirables(document: CircuitDocument): readonly Requirable[] {
  const list: Requirable[] = [
    { address: 'stall margin', words: 'Motor: stall margin', quantity: 'ratio' },
    { address: 'rms current', words: 'Motor: RMS current of nameplate', quantity: 'fraction' },
  ];
  for (const component of document.components) {
    const kind = findKind(component.kind);
    if (!kind) continue;
    for (const reading of kind.readings) {
      list.push({
        address: `${component.id}.${reading.id}`,
        words: `${nameInWords(component)}: ${reading.label.toLowerCase()}`,
        quantity: reading.quantity,
      });
    }
    for (const port of kind.ports) {
      if (port.medium !== 'oil') continue;
      list.push({
        address: `${component.id}.${port.id}.pressure`,
        words: `${nameInWords(component)}: pressure at ${port.letter || port.label.toLowerCase()}`,
        quantity: 'pressure',
      });
    }
  }
  return list;
}

export const measureWords: Record<Requirement['measure'], string> = {
  peak: 'at its peak',
  end: 'at the end of the phase',
  'time to reach': 'time to reach',
};

/** Limits of a time to reach are times; all others are in the quantity itself. */
export function limitQuantity(requirement: Requirement, quantity: QuantityId): QuantityId {
  return requirement.measure === 'time to reach' ? 'time' : quantity;
}
