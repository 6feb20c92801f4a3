import type { QuantityId } from '../units/quantities.ts';
import type { DutyComponent } from './duty.ts';

/** One lane of the tape: a channel and its title. */
export interface Lane {
  readonly address: string;
  readonly title: string;
  readonly quantity: QuantityId;
  /** 'load' marks the motor's torque lane: it ends at a stall and shows no figure below pull-out speed. */
  readonly role?: 'load';
}

interface LaneRule {
  readonly kind: string;
  readonly reading: string;
  readonly title: string;
  readonly quantity: QuantityId;
  readonly role?: 'load';
}

/** The five questions a person asks of a power unit, in the order of the oil. */
const asked: readonly LaneRule[] = [
  {
    kind: 'compensated-pump',
    reading: 'outlet.pressure',
    title: 'Pump port',
    quantity: 'pressure',
  },
  {
    kind: 'compensated-pump',
    reading: 'flow',
    title: 'Flow',
    quantity: 'flow',
  },
  {
    kind: 'electric-motor',
    reading: 'torqueRatio',
    title: 'Motor torque',
    quantity: 'ratio',
    role: 'load',
  },
  {
    kind: 'electric-motor',
    reading: 'speed',
    title: 'Shaft speed',
    quantity: 'speed',
  },
  {
    kind: 'cylinder',
    reading: 'position',
    title: 'Rod extended',
    quantity: 'length',
  },
];

/** What fills the lanes that are left where a circuit lacks some of the five. */
const fillers: readonly LaneRule[] = [
  {
    kind: 'relief-valve',
    reading: 'flow',
    title: 'Relief passing',
    quantity: 'flow',
  },
  { kind: 'cylinder', reading: 'force', title: 'Rod force', quantity: 'force' },
  {
    kind: 'cylinder',
    reading: 'capPressure',
    title: 'Cap end',
    quantity: 'pressure',
  },
  {
    kind: 'electric-motor',
    reading: 'current',
    title: 'Motor current',
    quantity: 'current',
  },
  {
    kind: 'pressure-gauge',
    reading: 'pressure',
    title: 'Gauge',
    quantity: 'pressure',
  },
  {
    kind: 'flow-meter',
    reading: 'flow',
    title: 'Meter flow',
    quantity: 'flow',
  },
  {
    kind: 'cylinder',
    reading: 'velocity',
    title: 'Rod speed',
    quantity: 'velocity',
  },
];

/** Lanes on a full tape. */
export const LANES = 5;

/** Default lanes of a circuit: the five questions for its first pump, motor and cylinder, then further cylinders and what
 *  else is there, at most `most`. Names lead the title where a circuit holds several of one kind. */
export function defaultLanes(document: { readonly components: readonly DutyComponent[] }, most: number = LANES): Lane[] {
  const lanes: Lane[] = [];
  const take = (rule: LaneRule, component: DutyComponent, several: boolean) => {
    const address = `${component.id}.${rule.reading}`;
    if (lanes.length >= most || lanes.some((lane) => lane.address === address)) return;
    const title = several ? `${component.name} ${rule.title.charAt(0).toLowerCase()}${rule.title.slice(1)}` : rule.title;
    lanes.push({
      address,
      title,
      quantity: rule.quantity,
      ...(rule.role ? { role: rule.role } : {}),
    });
  };
  const ofKind = (kind: string) => document.components.filter((component) => component.kind === kind);
  for (const rule of asked) {
    const all = ofKind(rule.kind);
    if (all[0]) take(rule, all[0], all.length > 1);
  }
  for (const rule of fillers) {
    const all = ofKind(rule.kind);
    for (const component of all) take(rule, component, all.length > 1);
  }
  return lanes;
}

/** The lanes that stay when there is room for fewer: load first on one lane, then pressure, then the rod. */
export function fewerLanes(lanes: readonly Lane[], room: number): Lane[] {
  if (lanes.length <= room) return [...lanes];
  const worth = (lane: Lane): number =>
    lane.role === 'load' ? 0 : lane.quantity === 'pressure' ? 1 : lane.quantity === 'length' ? 2 : lane.quantity === 'flow' ? 3 : 4;
  const kept = [...lanes].sort((a, b) => worth(a) - worth(b)).slice(0, room);
  return lanes.filter((lane) => kept.includes(lane));
}
