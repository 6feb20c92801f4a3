import { type Quantity, type QuantityId, quantities, type Unit } from './quantities.ts';

/** How one person wants numbers shown. `decimal` is the decimal sign of their locale. */
export interface UnitPreferences {
  readonly system: 'si' | 'us';
  readonly overrides?: Readonly<Partial<Record<QuantityId, string>>>;
  readonly decimal?: '.' | ',';
}

export function quantityOf(id: QuantityId): Quantity {
  return quantities[id];
}

/** Unit of a quantity by its id; the quantity's SI-system unit when the id is unknown (a saved choice from an older version). */
export function unitById(quantity: QuantityId, unitId: string): Unit {
  const { units, si } = quantityOf(quantity);
  return units.find((unit) => unit.id === unitId) ?? (units.find((unit) => unit.id === si) as Unit);
}

/** The unit a person reads this quantity in. */
export function preferredUnit(quantity: QuantityId, preferences: UnitPreferences): Unit {
  return unitById(quantity, preferences.overrides?.[quantity] ?? quantityOf(quantity)[preferences.system]);
}

/** The unit of the other system, for the "also" column; undefined where both systems use the same one. */
export function otherUnit(quantity: QuantityId, unit: Unit): Unit | undefined {
  const { si, us } = quantityOf(quantity);
  const other = unitById(quantity, unit.id === us ? si : unit.id === si ? us : si);
  return other.id === unit.id ? undefined : other;
}

/** SI value → number in the unit. */
export function fromSi(value: number, unit: Unit): number {
  return (value - unit.offset) / unit.factor;
}

/** Number in the unit → SI value. */
export function toSi(shown: number, unit: Unit): number {
  return shown * unit.factor + unit.offset;
}
