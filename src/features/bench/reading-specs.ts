import { findKind } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument, Component } from '#shared/circuit/schema.ts';
import { LEAST_FLOW } from '#shared/pictures/pressure-ink.ts';
import type { ReadingAt } from '#shared/pictures/schematic-shapes.ts';
import type { RunResult } from '#shared/simulation/result.ts';
import { type Point, placePoint } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';
import type { QuantityId } from '#shared/units/quantities.ts';
import type { Format } from '#src/components/use-format.ts';

/** Readings that stand on the drawing beside their part. */
export interface ReadingSpec {
  readonly id: string;
  readonly component: string;
  readonly form: 'motor' | 'speed' | 'quantity' | 'relief' | 'valve';
  /** Channel that "How is this computed?" explains. */
  readonly address: string;
  readonly quantity: QuantityId;
  /** Words after the unit. */
  readonly words: string;
  /** Where its middle would best stand, in modules. */
  readonly wish: Point;
  /** Room in pixels at desk scale. */
  readonly width: number;
  readonly height: number;
  readonly small: boolean;
}

/** One line of a reading: a figure with its unit, or words alone. */
export interface ReadingLine {
  readonly value: string;
  readonly unit: string;
}

const wanted: Readonly<Record<string, readonly Omit<ReadingSpec, 'id' | 'component' | 'address' | 'wish'>[]>> = {
  'electric-motor': [
    { form: 'motor', quantity: 'torque', words: '', width: 104, height: 46, small: false },
    { form: 'speed', quantity: 'speed', words: '', width: 82, height: 22, small: true },
  ],
  'compensated-pump': [{ form: 'quantity', quantity: 'flow', words: '', width: 106, height: 26, small: false }],
  'pressure-gauge': [{ form: 'quantity', quantity: 'pressure', words: '', width: 88, height: 26, small: false }],
  'flow-meter': [{ form: 'quantity', quantity: 'flow', words: '', width: 106, height: 26, small: false }],
  'relief-valve': [{ form: 'relief', quantity: 'flow', words: 'passing', width: 150, height: 22, small: true }],
  cylinder: [
    { form: 'quantity', quantity: 'length', words: 'extended', width: 150, height: 26, small: false },
    { form: 'quantity', quantity: 'force', words: 'on the load', width: 140, height: 26, small: false },
  ],
  'directional-valve-4-3': [{ form: 'valve', quantity: 'number', words: '', width: 92, height: 18, small: true }],
  'directional-valve-4-2': [{ form: 'valve', quantity: 'number', words: '', width: 92, height: 18, small: true }],
};

const anchors: Readonly<Record<string, readonly string[]>> = {
  'electric-motor': ['torque', 'speed'],
  cylinder: ['position', 'loadForce'],
  'pressure-gauge': ['pressure'],
  'directional-valve-4-3': ['spool'],
  'directional-valve-4-2': ['spool'],
};

function hasLoad(component: Component): string | null {
  const given = (field: string) => Number(component.parameters[field]?.value ?? 0) !== 0;
  if (given('workForce')) return 'on the bale';
  return given('loadForce') || given('springRate') ? 'on the load' : null;
}

export function readingSpecs(document: CircuitDocument): ReadingSpec[] {
  const specs: ReadingSpec[] = [];
  for (const component of document.components) {
    const symbol = symbolOf(component.kind);
    if (!symbol) continue;
    (wanted[component.kind] ?? []).forEach((base, index) => {
      const reading = anchors[component.kind]?.[index] ?? 'flow';
      let { words } = base;
      if (reading === 'loadForce') {
        const load = hasLoad(component);
        if (!load) return;
        words = load;
      }
      const anchor = symbol.anchors[base.form === 'valve' ? 'reading.words' : `reading.${reading}`] ?? { x: symbol.width / 2, y: -1.5 };
      specs.push({
        ...base,
        words,
        id: `${component.id}.${reading}`,
        component: component.id,
        address: `${component.id}.${reading}`,
        wish: placePoint(symbol, component, anchor),
      });
    });
  }
  return specs;
}

const runUps = new WeakMap<RunResult, Map<string, number>>();

/** First moment at which a motor passed its pull-out speed [s]; infinity when it never did. */
function upToSpeed(run: RunResult, motor: string): number {
  let known = runUps.get(run);
  if (!known) {
    known = new Map();
    runUps.set(run, known);
  }
  const before = known.get(motor);
  if (before !== undefined) return before;
  const values = (name: string) => run.channels.find((channel) => channel.address === `${motor}.${name}`)?.values;
  const speed = values('speed');
  const pullOut = values('pullOutSpeed');
  let time = Number.POSITIVE_INFINITY;
  if (speed && pullOut) {
    const index = speed.findIndex((value, k) => value >= (pullOut[k] as number));
    if (index >= 0) time = run.times[index] as number;
  }
  known.set(motor, time);
  return time;
}

/** What a motor's reading says at a moment: torque and × rated; below pull-out speed no load figure, only the word and the current. */
export function motorLines(run: RunResult, time: number, at: ReadingAt, motor: string, format: Format): readonly ReadingLine[] {
  const speed = at(`${motor}.speed`) ?? 0;
  const pullOut = at(`${motor}.pullOutSpeed`) ?? 0;
  const current = at(`${motor}.current`) ?? 0;
  if (current > 0 && pullOut > 0 && speed < pullOut) {
    const amps = format.quantity(current, 'current', { digits: 0 });
    return [
      { value: time <= upToSpeed(run, motor) ? 'starting' : 'stalled', unit: '' },
      { value: amps.value, unit: amps.unit },
    ];
  }
  const torque = format.quantity(at(`${motor}.torque`) ?? 0, 'torque', { digits: 0 });
  return [
    { value: torque.value, unit: torque.unit },
    { value: format.number(at(`${motor}.torqueRatio`) ?? 0, 2), unit: '× rated' },
  ];
}

/** Lines of a reading at a moment; empty where the run has no such channel or nothing is to be said. */
export function readingLines(
  spec: ReadingSpec,
  run: RunResult | null,
  time: number,
  at: ReadingAt,
  document: CircuitDocument,
  format: Format,
): readonly ReadingLine[] {
  if (!run) return [];
  if (spec.form === 'motor') return motorLines(run, time, at, spec.component, format);
  const value = at(spec.address);
  if (value === undefined) return [];
  if (spec.form === 'valve') {
    const kind = findKind(document.components.find((entry) => entry.id === spec.component)?.kind ?? '');
    const near = Math.round(value);
    const word = kind?.inputs.find((input) => input.id === 'spool')?.words?.find((entry) => entry.value === near);
    return word && near !== 0 ? [{ value: '', unit: word.label }] : [];
  }
  if (spec.form === 'relief' && Math.abs(value) < LEAST_FLOW) return [];
  const shown = format.quantity(value, spec.quantity, spec.quantity === 'force' ? { digits: 0 } : {});
  return [{ value: shown.value, unit: spec.words ? `${shown.unit} ${spec.words}` : shown.unit }];
}
