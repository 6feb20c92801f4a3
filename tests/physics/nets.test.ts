import { describe, expect, it } from 'vitest';
import { effectiveDocument } from '#shared/circuit/effective-document.ts';
import { lineFlows } from '#shared/circuit/line-flows.ts';
import { findNets } from '#shared/circuit/nets.ts';
import { netsReached, waysBetweenNets } from '#shared/circuit/reach.ts';
import { channelOf } from '#shared/simulation/result.ts';
import { runToEnd } from '#shared/simulation/run.ts';
import { compiled } from '../support/reference-case.ts';
import { smallCircuit, standCircuit } from '../support/small-circuits.ts';

const branched = () =>
  smallCircuit(
    [
      'M1 electric-motor',
      'P1 compensated-pump',
      'J1 junction',
      'V1 relief-valve',
      'V2 throttle',
      'T1 tank',
      'T2 tank',
      'T3 tank',
      'T4 tank',
    ],
    ['T1.T P1.suction', 'P1.outlet J1.a', 'J1.b V1.P', 'J1.c V2.A', 'V1.T T2.T', 'V2.B T3.T', 'P1.drain T4.T'],
    { shaft: ['M1', 'P1'] },
  );

describe('nets', () => {
  it('join ports over lines and junctions and are named by their smallest address', () => {
    const nets = findNets(branched());
    const main = nets.oil[nets.oilNetOf.get('P1.outlet') ?? -1];
    expect(main?.id).toBe('J1.a');
    expect(main?.ports.map((port) => port.address)).toEqual(['J1.a', 'J1.b', 'J1.c', 'J1.d', 'P1.outlet', 'V1.P', 'V2.A']);
    expect(main?.tank).toBe(false);
    expect(nets.oil[nets.oilNetOf.get('V1.T') ?? -1]?.tank).toBe(true);
    expect(nets.shafts.map((net) => net.ports.map((port) => port.address))).toEqual([['M1.shaft', 'P1.shaft']]);
  });

  it('are parted by a line with loss', () => {
    const document = smallCircuit(['V1 throttle', 'V2 throttle'], ['V1.B V2.A loss']);
    const nets = findNets(document);
    expect(nets.oilNetOf.get('V1.B')).not.toBe(nets.oilNetOf.get('V2.A'));
    expect(nets.lossLines.map((line) => line.id)).toEqual(['l1']);
  });

  it('are reached from each other where a kind always lets oil pass', () => {
    const document = smallCircuit(['V1 check-valve', 'Z1 filter', 'T1 tank'], ['V1.B Z1.A', 'Z1.B T1.T loss']);
    const nets = findNets(document);
    const ways = waysBetweenNets(document, nets);
    const reachesTank = (address: string) => [...netsReached(nets.oilNetOf.get(address) ?? -1, ways)].some((net) => nets.oil[net]?.tank);
    expect(reachesTank('V1.A')).toBe(true);
    expect([...netsReached(nets.oilNetOf.get('T1.T') ?? -1, ways)]).not.toContain(nets.oilNetOf.get('V1.A'));
  });
});

describe('line flows', () => {
  it('follow from the flows of the ports and are what the oil does', () => {
    const run = runToEnd(compiled(branched()), 1e-4);
    const end = (address: string): number => channelOf(run, address)?.values.at(-1) ?? Number.NaN;
    expect(end('line.l2.flow')).toBeGreaterThan(1e-5);
    expect(end('line.l3.flow')).toBeCloseTo(end('V1.P.flow'), 12);
    expect(end('line.l4.flow')).toBeCloseTo(end('V2.A.flow'), 12);
    expect(end('line.l2.flow')).toBeCloseTo(-end('P1.outlet.flow'), 12);
    expect(end('J1.a.flow')).toBeCloseTo(end('line.l2.flow'), 12);
    expect(end('J1.b.flow')).toBeCloseTo(-end('line.l3.flow'), 12);
    expect(end('T2.T.flow')).toBeCloseTo(end('line.l5.flow'), 12);
    // In a steady state nothing is lost at the junction.
    expect(end('line.l2.flow')).toBeCloseTo(end('line.l3.flow') + end('line.l4.flow'), 8);
  });

  it('show a line that closes a ring as undetermined', () => {
    const document = smallCircuit(
      ['V1 throttle', 'J1 junction', 'J2 junction', 'V2 throttle'],
      ['V1.B J1.a', 'J1.b J2.b', 'J1.c J2.c', 'J2.a V2.A'],
    );
    const flows = lineFlows(document, findNets(document));
    expect(flows.filter((flow) => flow.chord)).toHaveLength(1);
    expect(flows).toHaveLength(4);
  });
});

describe('the document as a case sees it', () => {
  it('takes over changes to components, lines, sections and the duty, and leaves the original alone', () => {
    const document = standCircuit();
    document.cases.push({
      id: 'B',
      name: 'B',
      ink: 1,
      changes: [
        { target: 'P1', field: 'compensatorPressure', value: 1e7 },
        { target: 'l2', field: 'loss', value: 1 },
        { target: 'l2', field: 'length', value: 3 },
        { target: 'supply', field: 'voltage', value: 350 },
        { target: 'duty', field: 'duration', value: 5 },
        { target: 'nobody', field: 'x', value: 5 },
      ],
    });
    const before = JSON.stringify(document);
    const seen = effectiveDocument(document, 'B');
    expect(seen.components[1]?.parameters.compensatorPressure?.value).toBe(1e7);
    expect(seen.lines[1]).toMatchObject({ loss: true, length: 3 });
    expect(seen.supply.voltage).toBe(350);
    expect(seen.duty.duration).toBe(5);
    expect(JSON.stringify(document)).toBe(before);
    expect(effectiveDocument(document, 'A')).toBe(document);
  });
});
