import { z } from 'zod';
import type { RunResult } from '../simulation/result.ts';
import { type QuantityId, quantities, type Unit } from '../units/quantities.ts';

/** Traces as CSV: one header row, then one row for each time. Comma, point as decimal sign, no quotes needed, CR LF.
 *  All values SI; a column is headed by its address and unit, as in `P1.outlet.pressure [Pa]`. */

export const runCsvHeader = z.tuple([z.literal('time [s]')]).rest(z.string().regex(/^[A-Za-z][\w.-]* \[[^[\],]*\]$/));
export const runCsvRow = z.array(z.number());

export function runCsv(run: Pick<RunResult, 'times' | 'channels'>): string {
  const header = ['time [s]', ...run.channels.map((channel) => `${channel.address} [${siSymbol(channel.quantity)}]`)];
  const rows = Array.from(run.times, (time, index) => [time, ...run.channels.map((channel) => channel.values[index])].join(','));
  return [header.join(','), ...rows, ''].join('\r\n');
}

/** Symbol of the unit that values are stored in; it is written out where nobody reads the quantity in it. */
function siSymbol(id: QuantityId): string {
  const unit = (quantities[id].units as readonly Unit[]).find((entry) => entry.factor === 1 && entry.offset === 0);
  if (unit) return unit.symbol;
  return stored[id] ?? '1';
}

const stored: Readonly<Partial<Record<QuantityId, string>>> = {
  displacement: 'm³/rad',
  fraction: '1',
  volume: 'm³',
  turns: 'turns',
  modulus: 'Pa',
  pressurePerTurn: 'Pa/turn',
  displacementPerTurn: 'm³/rad/turn',
  leakage: 'm³/s/Pa',
};
