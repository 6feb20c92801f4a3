import { describe, expect, it } from 'vitest';
import { checkDocument } from '#shared/circuit/check-document.ts';
import { crowdedCircuit } from '#shared/circuit/samples/crowded.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { starters } from '#shared/circuit/samples/starters.ts';
import type { CircuitDocument, Component } from '#shared/circuit/schema.ts';
import { kindOf } from '#shared/kinds/registry.ts';
import { placePort, sweptBox } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';

const samples: readonly (readonly [string, CircuitDocument])[] = [
  ['demo', demoCircuit],
  ['crowded', crowdedCircuit],
  ...starters.map(({ id, document }) => [id, document] as const),
];

const valuesOf = (component: Component) => Object.fromEntries(Object.entries(component.parameters).map(([id, { value }]) => [id, value]));

describe.each(samples)('sample %s', (_name, document) => {
  it('is a good document', () => {
    const checked = checkDocument(document);
    expect(checked.ok ? [] : checked.issues).toEqual([]);
  });

  it('has every port on half-modules and no two symbols on top of each other', () => {
    const boxes = document.components.map((component) => {
      const symbol = symbolOf(component.kind)!;
      for (const port of Object.keys(symbol.ports)) {
        const at = placePort(symbol, component, port)!;
        expect([component.id, port, (at.x * 2) % 1, (at.y * 2) % 1]).toEqual([component.id, port, 0, 0]);
      }
      return { id: component.id, ...sweptBox(symbol, component, valuesOf(component)) };
    });
    for (const a of boxes) {
      for (const b of boxes) {
        if (a.id >= b.id) continue;
        const apart = a.x + a.w <= b.x || b.x + b.w <= a.x || a.y + a.h <= b.y || b.y + b.h <= a.y;
        expect(`${a.id} and ${b.id} ${apart ? 'apart' : 'overlap'}`).toBe(`${a.id} and ${b.id} apart`);
      }
    }
  });

  it('fits the drawing’s sheet of about 106 × 43 modules', () => {
    for (const component of document.components) {
      const box = sweptBox(symbolOf(component.kind)!, component, valuesOf(component));
      expect([component.id, box.x >= 0 && box.y >= -1 && box.x + box.w <= 107 && box.y + box.h <= 43.5]).toEqual([component.id, true]);
    }
  });

  it('has its as-found marks taken on all screws', () => {
    for (const component of document.components) {
      const screws = (kindOf(component.kind)?.screws ?? []).filter(
        (screw) => component.kind !== 'throttle' || component.parameters[screw.id],
      );
      for (const screw of screws) {
        if (component.kind === 'throttle') continue;
        expect([component.id, screw.id, component.screws?.[screw.id]?.asFound]).toEqual([
          component.id,
          screw.id,
          component.parameters[screw.id]?.value,
        ]);
      }
    }
  });
});

it('case A of the demo has no changes, B and C change one setting each', () => {
  expect(demoCircuit.cases.map(({ name, changes }) => [name, changes.length])).toEqual([
    ['As found', 0],
    ['Stop turned in', 1],
    ['Relief lowered', 1],
  ]);
});
