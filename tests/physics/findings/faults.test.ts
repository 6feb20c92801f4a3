import { describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { liftStarter } from '#shared/circuit/samples/starter-lift.ts';
import { pressStarter } from '#shared/circuit/samples/starter-press.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { evaluateToEnd } from '#shared/findings/evaluate.ts';
import type { Assessment } from '#shared/findings/finding.ts';
import { find, rulesOf, values, words } from '#tests/support/finding-words.ts';
import { bar, changed, cubic } from '#tests/support/synthetic-run.ts';

/** Faults in real runs of the demo with its stop turned in: what a technician would be told. The symptoms are common practice,
 *  no source. */

function assessed(document: CircuitDocument): Assessment {
  const outcome = evaluateToEnd(document, document.cases[0]!.id, 1e-3);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
  return outcome.evaluation.assessment;
}
const withFault = (faults: Readonly<Record<string, number>>) => assessed(changed({ 'P1.maxVolumeStop': 16 * cubic, ...faults }));

describe('a fault is told by its symptom', () => {
  it.each([
    ['a pump stuck off stroke', { 'P1.fault.stuck-off-stroke': 1 }, 'rod-stops-short', 'rod-stops-short'],
    ['a sheared coupling', { 'P1.fault.coupling-sheared': 1 }, 'rod-stops-short', 'rod-stops-short'],
    ['a pump stuck on stroke', { 'P1.fault.stuck-on-stroke': 1 }, 'relief-passing', 'does-not-destroke'],
    ['a minimum stop wound in', { 'P1.minVolumeStop': 6 * cubic }, 'within-limits', 'does-not-destroke'],
    ['a piston that lets oil by', { 'A1.fault.piston-bypass': 0.3 }, 'within-limits', 'slower-than-pump'],
    ['a relief stuck open', { 'V2.fault.stuck-open': 1 }, 'rod-stops-short', 'relief-passing'],
    ['a relief stuck shut', { 'V2.fault.stuck-shut': 1 }, 'above-rating', 'no-relief'],
    ['a weak relief spring', { 'V2.fault.weak-spring': 0.3 }, 'relief-passing', 'relief-before-compensator'],
    ['a starter stuck in star', { 'M1.fault.stuck-in-star': 1 }, 'motor-stalls', 'motor-stalls'],
    ['a lost phase', { 'M1.fault.single-phasing': 1 }, 'motor-stalls', 'not-up-to-speed'],
    ['a seized pump', { 'P1.fault.seized': 1 }, 'motor-stalls', 'not-up-to-speed'],
    ['exchanged leads', { 'M1.fault.wrong-rotation': 1 }, 'motor-stalls', 'not-up-to-speed'],
  ] as const)('%s', (_name, faults, verdict, rule) => {
    const result = withFault(faults);
    expect(result.verdict.id).toBe(verdict);
    expect(rulesOf(result)).toContain(rule);
    // Neither a spring-back of shut-in oil nor a pump that stands is taken for a load that drives or an inlet that starves.
    expect(rulesOf(result)).not.toContain('load-drives-pump');
    expect(rulesOf(result)).not.toContain('inlet-starving');
  });

  it('and none of them is offered a screw that does not help', () => {
    for (const fault of ['P1.fault.coupling-sheared', 'V2.fault.stuck-open'])
      expect(find(withFault({ [fault]: 1 }), 'rod-stops-short').remedy?.seek).toBeUndefined();
    expect(find(withFault({ 'M1.fault.stuck-in-star': 1 }), 'motor-stalls').remedy?.seek).toBeUndefined();
  });
});

describe('a load on a lift', () => {
  it('with the pump’s power gone and no check valve runs back against its command', () => {
    const document: CircuitDocument = {
      ...liftStarter,
      components: liftStarter.components.filter((component) => component.id !== 'V1'),
      lines: liftStarter.lines
        .filter((line) => line.id !== 'L4')
        .map((line) => (line.id === 'L3' ? { ...line, to: { component: 'J1', port: 'a' } } : line)),
      duty: {
        ...liftStarter.duty,
        commands: [
          ...liftStarter.duty.commands.filter((command) => command.time < 1),
          { id: 'off', time: 3, ramp: 0, target: 'M1', input: 'contactor', value: 0, label: 'Stop' },
        ],
      },
    };
    const result = assessed(document);
    expect(result.verdict).toMatchObject({ id: 'rod-stops-short', word: 'Load runs back' });
    expect(rulesOf(result)).toEqual(expect.arrayContaining(['load-runs-away', 'load-drives-pump']));
  });

  it('at an open centre comes down, and is told so', () => {
    const document = changed({ 'V3.centre': 'open' }, liftStarter);
    const finding = find(assessed(document), 'load-runs-away');
    expect(words(finding.headline)).toContain('with the valve at centre');
  });
});

it('the starters that do their work have nothing worse than a note', () => {
  for (const document of [pressStarter, liftStarter]) {
    const result = assessed(document);
    expect(result.verdict.id).toBe('within-limits');
    expect(result.findings.filter((finding) => finding.severity < 3).map((finding) => finding.id)).toEqual([]);
  }
});

it('480 V at 60 Hz is in order on a plate of 400 V and 50 Hz', () => {
  const sixty = { ...changed({ 'P1.maxVolumeStop': 16 * cubic }), supply: { voltage: 480, frequency: 60, impedance: 0 } };
  expect(rulesOf(assessed(sixty))).not.toContain('supply-out-of-band');
});

it('a throttled case line raises dead-head bar for bar', () => {
  const throttled: CircuitDocument = {
    ...changed({ 'P1.maxVolumeStop': 16 * cubic }),
    lines: demoCircuit.lines.map((line) => (line.id === 'L2' ? { ...line, bore: 0.002, loss: true } : line)),
  };
  const { cause } = find(assessed(throttled), 'does-not-destroke');
  expect(words(cause)).toContain('bar for bar');
  const [stands, setting, , drain] = values(cause);
  expect(Math.abs(stands! - setting! - drain!)).toBeLessThan(1 * bar);
});
