import type { KindId } from '../kinds/registry.ts';
import { checkValveSymbol } from './check-valve.ts';
import { compensatedPumpSymbol } from './compensated-pump.ts';
import { cylinderSymbol } from './cylinder.ts';
import { directionalValve42Symbol } from './directional-valve-4-2.ts';
import { directionalValve43Symbol } from './directional-valve-4-3.ts';
import { electricMotorSymbol } from './electric-motor.ts';
import { filterSymbol } from './filter.ts';
import { flowMeterSymbol } from './flow-meter.ts';
import { junctionSymbol } from './junction.ts';
import { pressureGaugeSymbol } from './pressure-gauge.ts';
import { reliefValveSymbol } from './relief-valve.ts';
import type { SymbolDefinition } from './symbol.ts';
import { tankSymbol } from './tank.ts';
import { throttleSymbol } from './throttle.ts';

/** One symbol per component kind. */
export const symbols = {
  'electric-motor': electricMotorSymbol,
  'compensated-pump': compensatedPumpSymbol,
  'relief-valve': reliefValveSymbol,
  'check-valve': checkValveSymbol,
  'directional-valve-4-3': directionalValve43Symbol,
  'directional-valve-4-2': directionalValve42Symbol,
  throttle: throttleSymbol,
  cylinder: cylinderSymbol,
  junction: junctionSymbol,
  filter: filterSymbol,
  tank: tankSymbol,
  'pressure-gauge': pressureGaugeSymbol,
  'flow-meter': flowMeterSymbol,
} satisfies Record<KindId, SymbolDefinition>;

/** The symbol of a kind, or undefined for a kind that does not exist. */
export function symbolOf(kind: string): SymbolDefinition | undefined {
  return Object.hasOwn(symbols, kind) ? symbols[kind as keyof typeof symbols] : undefined;
}
