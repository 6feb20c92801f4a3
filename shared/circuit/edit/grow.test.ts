import { describe, expect, it } from 'vitest';
import { placedBox } from '../../symbols/place.ts';
import { symbolOf } from '../../symbols/registry.ts';
import { checkDocument } from '../check-document.ts';
import { nextParts } from '../next-parts.ts';
import { openPorts } from '../open-ports.ts';
import type { CircuitDocument } from '../schema.ts';
import { emptyCircuit } from './empty-circuit.ts';
import { growFrom, putDown } from './grow.ts';
import { lineAt } from './joins.ts';
import { seeded } from './test-circuits.ts';

const ref = (component: string, port: string) => ({ component, port });

function overlapping(document: CircuitDocument): string[] {
  const boxes = document.components.map((component) => ({ id: component.id, box: placedBox(symbolOf(component.kind)!, component) }));
  return boxes.flatMap((a, i) =>
    boxes.slice(i + 1).flatMap((b) => {
      const apart =
        a.box.x >= b.box.x + b.box.w || b.box.x >= a.box.x + a.box.w || a.box.y >= b.box.y + b.box.h || b.box.y >= a.box.y + a.box.h;
      return apart ? [] : [`${a.id} ${b.id}`];
    }),
  );
}

describe('growFrom', () => {
  const pump = putDown(emptyCircuit(), 'compensated-pump', { x: 20, y: 20 }).document;

  it('puts the motor to the left of the pump, on one height, on one shaft', () => {
    const grown = growFrom(pump, ref('p1', 'shaft'), 'electric-motor');
    const motor = grown.document.components.find((component) => component.id === grown.componentId);
    expect(grown.document.shafts[0]?.members).toHaveLength(2);
    expect(motor?.at.x).toBeLessThan(16);
    expect(motor?.mirror).toBe(false);
  });

  it('hangs a relief on a junction and leaves the pump line open for what comes next', () => {
    const grown = growFrom(pump, ref('p1', 'outlet'), 'relief-valve');
    expect(grown.document.components.map((component) => component.kind)).toEqual(['compensated-pump', 'junction', 'relief-valve']);
    const open = openPorts(grown.document).filter((port) => port.component === 'j1');
    expect(open.map((port) => port.optional)).toEqual([false]);
    expect(nextParts(grown.document, open[0]!).parts.find((part) => part.likely)?.kind).toBe('directional-valve-4-3');
  });

  it('branches off a line that is there already', () => {
    const tank = growFrom(pump, ref('p1', 'suction'), 'tank').document;
    expect(lineAt(tank, ref('p1', 'suction'))).toBeDefined();
    const grown = growFrom(tank, ref('p1', 'suction'), 'pressure-gauge');
    expect(grown.document.components.map((component) => component.kind)).toContain('junction');
  });

  it('builds a whole press from one pump by taking the likeliest part at each open port', () => {
    let document = pump;
    for (let step = 0; step < 12; step++) {
      const open = openPorts(document).find(
        (port) => !port.optional || !document.components.some((entry) => entry.kind === 'directional-valve-4-3'),
      );
      if (!open) break;
      const likely = nextParts(document, open).parts.find((part) => part.likely);
      const grown = growFrom(document, open, likely?.kind ?? 'tank');
      expect(grown.problem).toBeNull();
      document = grown.document;
    }
    const kinds = document.components.map((component) => component.kind);
    expect(kinds).toEqual(expect.arrayContaining(['electric-motor', 'relief-valve', 'directional-valve-4-3', 'cylinder', 'tank']));
    expect(overlapping(document)).toEqual([]);
    expect(checkDocument(document)).toEqual({ ok: true, document, migrated: [] });
  });

  it('says why a part cannot be joined', () => {
    expect(growFrom(pump, ref('p1', 'shaft'), 'tank').problem).toContain('nothing to join');
    expect(growFrom(pump, ref('ghost', 'x'), 'tank').problem).not.toBeNull();
  });

  it('never puts a part over another, whatever is grown where', () => {
    const random = seeded(77);
    let document = pump;
    for (let step = 0; step < 40; step++) {
      const ports = openPorts(document);
      const port = ports[Math.floor(random() * ports.length)];
      const parts = port ? nextParts(document, port).parts : [];
      const part = parts[Math.floor(random() * parts.length)];
      if (port && part) document = growFrom(document, port, part.kind).document;
    }
    expect(document.components.length).toBeGreaterThan(15);
    expect(overlapping(document)).toEqual([]);
    expect(checkDocument(document)).toEqual({ ok: true, document, migrated: [] });
  });
});
