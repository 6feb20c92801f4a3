import { describe, expect, it } from 'vitest';
import { overlaps } from '../../pictures/placement.ts';
import { routeLines } from '../../pictures/route.ts';
import { schematicBounds } from '../../pictures/schematic-shapes.ts';
import { symbolValues } from '../../pictures/symbol-values.ts';
import { bodyBoxes } from '../../symbols/place.ts';
import { symbolOf } from '../../symbols/registry.ts';
import { demoCircuit } from './demo.ts';
import { narrowDemo, narrowReadings, narrowTags } from './demo-narrow.ts';
import { starters } from './starters.ts';

describe('the demo on a narrow screen', () => {
  const narrow = narrowDemo(demoCircuit);
  it('keeps everything but the places', () => {
    expect(narrow?.cases).toBe(demoCircuit.cases);
    expect(narrow?.components.map(({ id, parameters }) => [id, parameters])).toEqual(
      demoCircuit.components.map(({ id, parameters }) => [id, parameters]),
    );
    expect(narrow?.lines.map(({ id, from, to }) => [id, from, to])).toEqual(demoCircuit.lines.map(({ id, from, to }) => [id, from, to]));
    expect(demoCircuit.components[0]?.at).toEqual({ x: 9, y: 29 });
  });
  it('gives the same parts for the same parts', () => {
    expect(narrowDemo({ ...demoCircuit, title: 'Another' })?.components[3]).toBe(narrow?.components[3]);
  });
  it('is no wider than a phone reads and covers no part with another', () => {
    if (!narrow) throw new Error('no narrow arrangement');
    const valuesOf = (part: (typeof narrow.components)[number]) => symbolValues(narrow, 'A', part);
    const box = schematicBounds(narrow, valuesOf, routeLines(narrow));
    expect(box?.w).toBeLessThan(51);
    expect(box?.h).toBeLessThan(43);
    const bodies = narrow.components.flatMap((part) => {
      const symbol = symbolOf(part.kind);
      if (!symbol || part.kind === 'junction' || part.kind === 'tank') return [];
      return bodyBoxes(symbol, part, valuesOf(part)).map((body) => ({ id: part.id, body }));
    });
    for (const a of bodies)
      for (const b of bodies) if (a.id < b.id) expect([a.id, b.id, overlaps(a.body, b.body)]).toEqual([a.id, b.id, false]);
  });
  it('is for the demo only', () => {
    const others = starters.filter((starter) => !starter.document.title.startsWith('Press'));
    expect(others.length).toBeGreaterThan(1);
    for (const starter of others) expect(narrowDemo(starter.document)).toBeNull();
    expect(narrowDemo({ ...demoCircuit, lines: demoCircuit.lines.slice(1) })).toBeNull();
  });
  it('names tags and readings that exist', () => {
    for (const address of [...narrowTags, ...Object.keys(narrowReadings)]) {
      expect(demoCircuit.components.some(({ id }) => id === address.split('.')[0])).toBe(true);
    }
  });
});
