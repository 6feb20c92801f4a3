import type { CircuitDocument, Component } from '../schema.ts';
import { demoCircuit } from './demo.ts';

/** The demo press laid out for a narrow screen: the cylinder on top, the valve under it, gauge, pump and relief along one line, the
 *  filter at the side. Only places: the document keeps its own, and any other circuit is shown as it was drawn. */

type Place = readonly [x: number, y: number, turn?: Component['turn'], mirror?: boolean];

const places: Readonly<Record<string, Place>> = {
  A1: [1, 2],
  V3: [25, 13],
  M1: [0, 30],
  P1: [8, 27],
  V1: [18, 24],
  J1: [23, 24],
  V2: [21, 28],
  J2: [27, 24],
  S1: [25, 17.5],
  Z1: [42, 22, 3, true],
  T1: [14, 39.5],
  T2: [18, 39.5],
  T3: [22, 39.5],
  T4: [44, 39.5],
};

const routes: Readonly<Record<string, readonly (readonly [number, number])[]>> = {
  L3: [[16, 25]],
  L9: [[33, 25]],
  L10: [
    [33, 12],
    [3, 12],
  ],
  L11: [
    [19, 10],
    [35, 10],
  ],
  L12: [
    [35, 20],
    [46, 20],
  ],
};

/** Adjusters and readings that stand on the narrow drawing; the rest is in the component list. */
export const narrowTags: readonly string[] = ['P1.compensatorPressure', 'V2.setPressure', 'P1.maxVolumeStop'];
export const narrowReadings: Readonly<Record<string, number>> = { 'M1.torque': 104, 'S1.pressure': 88, 'A1.position': 84 };

function structure({ components, lines }: Pick<CircuitDocument, 'components' | 'lines'>): string {
  const parts = components.map(({ id, kind }) => `${id} ${kind}`).sort();
  const joints = lines.map(({ id, from, to }) => `${id} ${from.component}.${from.port} ${to.component}.${to.port}`).sort();
  return [...parts, ...joints].join('|');
}

const demoStructure = structure(demoCircuit);
const placed = new WeakMap<object, unknown>();

/** The same object for the same part or line, so that a turned screw redraws one symbol. */
function once<T extends object>(item: T, make: () => T): T {
  const known = placed.get(item) as T | undefined;
  if (known) return known;
  const made = make();
  placed.set(item, made);
  return made;
}

/** The document with the narrow places, for looking at only; null when its parts or lines are no longer the demo's. */
export function narrowDemo(document: CircuitDocument): CircuitDocument | null {
  if (structure(document) !== demoStructure) return null;
  return {
    ...document,
    components: document.components.map((component) =>
      once(component, () => {
        const [x, y, turn = 0, mirror = false] = places[component.id] as Place;
        return { ...component, at: { x, y }, turn, mirror };
      }),
    ),
    lines: document.lines.map((line) => once(line, () => ({ ...line, route: (routes[line.id] ?? []).map(([x, y]) => ({ x, y })) }))),
    tagPlaces: {},
    notes: [],
    labels: [],
  };
}
