import { expect, it } from 'vitest';
import { type QuantityId, quantities } from '#shared/units/quantities.ts';

/** One published figure: its number on the project's reference list, where it was published, and what it says. */
export function row(id: string, source: string, what: string, check: () => void): void {
  it(`${id}: ${what} [${source}]`, check);
}

/** Value in SI of a number in a unit. */
export function si(value: number, quantity: QuantityId, unit: string): number {
  const found = quantities[quantity].units.find((entry) => entry.id === unit);
  if (!found) throw new Error(`no unit ${unit} of ${quantity}`);
  return value * found.factor + found.offset;
}

/** Number in a unit of a value in SI. */
export function inUnit(value: number, quantity: QuantityId, unit: string): number {
  const one = si(1, quantity, unit) - si(0, quantity, unit);
  return (value - si(0, quantity, unit)) / one;
}

/** Equal within a relative tolerance. */
export function near(found: number, published: number, tolerance: number): void {
  expect(Math.abs(found / published - 1), `${found} against ${published}`).toBeLessThanOrEqual(tolerance);
}

export const TURN = 2 * Math.PI;
