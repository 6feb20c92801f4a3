import { effectiveNumber, screwRange } from './effective.ts';
import { quantityInWords, rangeInWords } from './in-words.ts';
import { findComponent, findKind, findParameter, nameInWords } from './kind-lookup.ts';
import type { CircuitDocument } from './schema.ts';

/** Says which screw of a component lies outside the part's adjustable range in which case; null when all are inside. */
export function screwOutside(document: CircuitDocument, componentId: string): string | null {
  const component = findComponent(document, componentId);
  const kind = component && findKind(component.kind);
  if (!component || !kind) return null;
  for (const screw of kind.screws) {
    const spec = findParameter(kind, screw.id);
    if (spec?.type !== 'number') continue;
    for (const entry of document.cases) {
      const value = effectiveNumber(document, entry.id, componentId, screw.id);
      const range = screwRange(document, entry.id, componentId, screw.id);
      if (value === null || !range || (value >= range.min && value <= range.max)) continue;
      const words =
        range.min > range.max
          ? `the adjustable range would be empty (${rangeInWords(range.min, range.max, spec.quantity)})`
          : `${screw.label} stands at ${quantityInWords(value, spec.quantity)}, outside ${rangeInWords(range.min, range.max, spec.quantity)}`;
      return `${nameInWords(component)}, case ${entry.name || entry.id}: ${words}`;
    }
  }
  return null;
}
