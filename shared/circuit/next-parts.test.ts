import { describe, expect, it } from 'vitest';
import { addComponent } from './edit/components.ts';
import { emptyCircuit } from './edit/empty-circuit.ts';
import { connect } from './edit/joins.ts';
import { builtPress } from './edit/test-circuits.ts';
import { flowOrder } from './flow-order.ts';
import { allNextParts, likelyJoin, nextParts } from './next-parts.ts';
import { openPorts } from './open-ports.ts';

const ref = (component: string, port: string) => ({ component, port });
const likely = (parts: ReturnType<typeof nextParts>) =>
  parts.parts.filter((part) => part.likely).map((part) => `${part.kind}.${part.port}`);

describe('nextParts', () => {
  const pump = addComponent(emptyCircuit(), 'compensated-pump', { x: 0, y: 0 }).document;

  it('offers a relief first on an unprotected pump line, then the valve that directs', () => {
    const open = nextParts(pump, ref('p1', 'outlet'));
    expect(open.question).toBe('What follows the pump line?');
    expect(likely(open)).toEqual(['relief-valve.P']);
    const relief = addComponent(pump, 'relief-valve', { x: 20, y: 0 });
    const protectedLine = connect(relief.document, ref('p1', 'outlet'), ref('v1', 'P')).document;
    const branched = connect(
      addComponent(protectedLine, 'junction', { x: 9, y: 0 }).document,
      ref('j1', 'a'),
      ref('p1', 'outlet'),
    ).document;
    expect(likely(nextParts(branched, ref('j1', 'b')))).toEqual(['directional-valve-4-3.P']);
  });

  it('looks through a check valve to the pump behind it', () => {
    const check = addComponent(pump, 'check-valve', { x: 20, y: 0 });
    const joined = connect(check.document, ref('p1', 'outlet'), ref('v1', 'A')).document;
    expect(nextParts(joined, ref('v1', 'B')).question).toBe('What follows the pump line?');
  });

  it('sends suction, drain and return to tank', () => {
    expect(likely(nextParts(pump, ref('p1', 'suction')))).toEqual(['tank.T']);
    expect(likely(nextParts(pump, ref('p1', 'drain')))).toEqual(['tank.T']);
    const valve = addComponent(pump, 'directional-valve-4-3', { x: 20, y: 0 }).document;
    expect(likely(nextParts(valve, ref('v1', 'T')))).toEqual(['tank.T']);
  });

  it('joins work ports by their letter and shafts to shafts', () => {
    const valve = addComponent(pump, 'directional-valve-4-3', { x: 20, y: 0 }).document;
    expect(likely(nextParts(valve, ref('v1', 'B')))).toEqual(['cylinder.B']);
    expect(likely(nextParts(pump, ref('p1', 'shaft')))).toEqual(['electric-motor.shaft']);
    const cylinder = addComponent(emptyCircuit(), 'cylinder', { x: 0, y: 0 }).document;
    expect(likely(nextParts(cylinder, ref('a1', 'A')))).toEqual(['directional-valve-4-3.A']);
  });

  it('marks exactly one part at every open port, and all parts have a port of its medium', () => {
    for (const port of openPorts(builtPress())) {
      expect(likely(nextParts(builtPress(), port))).toHaveLength(1);
      expect(allNextParts(builtPress(), port).length).toBeGreaterThan(0);
    }
    expect(allNextParts(pump, ref('p1', 'shaft')).map((part) => part.kind)).not.toContain('tank');
  });
});

describe('likelyJoin', () => {
  it('pairs a valve and a cylinder by letter and a motor with a pump, and nothing that is joined', () => {
    let document = addComponent(emptyCircuit(), 'directional-valve-4-3', { x: 0, y: 20 }).document;
    document = addComponent(document, 'cylinder', { x: 0, y: 0 }).document;
    document = addComponent(document, 'compensated-pump', { x: 0, y: 40 }).document;
    document = addComponent(document, 'electric-motor', { x: 0, y: 60 }).document;
    expect(likelyJoin(document, ref('a1', 'B'))).toEqual(ref('v1', 'B'));
    expect(likelyJoin(document, ref('p1', 'shaft'))).toEqual(ref('m1', 'shaft'));
    expect(likelyJoin(document, ref('v1', 'P'))).toBeNull();
    const joined = connect(document, ref('v1', 'B'), ref('a1', 'B')).document;
    expect(likelyJoin(joined, ref('a1', 'B'))).toBeNull();
  });
});

describe('openPorts', () => {
  it('lists them in flow order, a complete junction as optional', () => {
    const ports = openPorts(builtPress()).map((port) => `${port.component}.${port.port}${port.optional ? '?' : ''}`);
    expect(ports).toEqual(['p1.suction', 'p1.drain', 'j1.d?']);
  });
});

describe('flowOrder', () => {
  it('goes from the drive along the oil, and lists every part once', () => {
    const press = builtPress();
    const order = flowOrder(press);
    expect(order.slice(0, 3)).toEqual(['m1', 'p1', 'j1']);
    expect(order.indexOf('v1')).toBeLessThan(order.indexOf('a1'));
    expect([...order].sort()).toEqual(press.components.map((component) => component.id).sort());
  });
});
