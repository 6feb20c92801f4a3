import { checkValve } from './check-valve.ts';
import { compensatedPump } from './compensated-pump/compensated-pump.ts';
import { cylinder } from './cylinder/cylinder.ts';
import { directionalValve42 } from './directional-valve/directional-valve-4-2.ts';
import { directionalValve43 } from './directional-valve/directional-valve-4-3.ts';
import { electricMotor } from './electric-motor/electric-motor.ts';
import { filter } from './filter.ts';
import { flowMeter } from './flow-meter.ts';
import { junction } from './junction.ts';
import type { ComponentKind } from './kind.ts';
import { pressureGauge } from './pressure-gauge.ts';
import { reliefValve } from './relief-valve/relief-valve.ts';
import { tank } from './tank.ts';
import { throttle } from './throttle.ts';

const all = [
  electricMotor,
  compensatedPump,
  reliefValve,
  checkValve,
  directionalValve43,
  directionalValve42,
  throttle,
  cylinder,
  junction,
  filter,
  tank,
  pressureGauge,
  flowMeter,
] as const;

export type KindId = (typeof all)[number]['id'];

/** Every component kind, in the order in which oil meets them. */
export const kinds: readonly ComponentKind[] = all;

const byId: ReadonlyMap<string, ComponentKind> = new Map(kinds.map((kind) => [kind.id, kind]));

/** The kind of an id; undefined where this version knows none. */
export function kindOf(id: string): ComponentKind | undefined {
  return byId.get(id);
}
