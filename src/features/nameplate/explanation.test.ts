import { beforeAll, describe, expect, it } from 'vitest';
import { findKind } from '#shared/circuit/kind-lookup.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { evaluateToEnd } from '#shared/findings/evaluate.ts';
import { type ExplainContext, explanationOf } from './explanation.ts';

let context: ExplainContext;
beforeAll(() => {
  const outcome = evaluateToEnd(demoCircuit, demoCircuit.cases[0]?.id ?? '', 1e-3);
  if (!outcome.ok) throw new Error(outcome.problems.map((problem) => problem.message).join('; '));
  const { run, assessment } = outcome.evaluation;
  context = { document: demoCircuit, caseId: run.caseId, run, assessment, time: 1 };
});

describe('"How is this computed?"', () => {
  it('answers for every reading of every part with equation, source and its value at the cursor', () => {
    const unknown: string[] = [];
    for (const component of demoCircuit.components) {
      for (const reading of findKind(component.kind)?.readings ?? []) {
        const explained = explanationOf(context, `${component.id}.${reading.id}`);
        expect(explained?.equation, `${component.id}.${reading.id}`).toBeTruthy();
        expect(explained?.source).toBeTruthy();
        expect(explained?.value, `${component.id}.${reading.id} has a value`).toBeDefined();
        for (const input of explained?.inputs ?? []) {
          if (input.value[0] === 'known to the run only') unknown.push(`${component.id}.${reading.id} needs ${input.label}`);
        }
      }
    }
    expect(unknown).toEqual([]);
  });
  it('answers for every pressure, flow and line flow the run returns', () => {
    for (const channel of context.run?.channels ?? []) {
      const explained = explanationOf(context, channel.address);
      expect(explained, channel.address).not.toBeNull();
      expect(explained?.value, channel.address).toBeDefined();
    }
  });
  it('answers for every value on a nameplate, with its help and source', () => {
    for (const component of demoCircuit.components) {
      for (const spec of findKind(component.kind)?.parameters ?? []) {
        const explained = explanationOf(context, `plate:${component.id}.${spec.id}`);
        expect(explained?.words?.[0], `${component.id}.${spec.id}`).toBe(spec.help);
        expect(explained?.source).toBe(spec.source);
      }
    }
  });
  it('tells a parameter from a reading of the same name', () => {
    expect(explanationOf(context, 'plate:P1.displacement')?.title).not.toBe(explanationOf(context, 'P1.displacement')?.title);
  });
  it('answers for every finding, the verdict and the three yardsticks', () => {
    const assessment = context.assessment;
    if (!assessment) throw new Error('no assessment');
    expect(assessment.findings.length).toBeGreaterThan(0);
    for (const finding of assessment.findings) expect(explanationOf(context, `finding.${finding.id}`)?.equation, finding.rule).toBeTruthy();
    expect(explanationOf(context, 'verdict')?.words?.[0]).toBe(assessment.verdict.word);
    const [yardsticks] = assessment.yardsticks;
    for (const name of ['stall-margin', 'rms-current', 'peak-torque'])
      expect(explanationOf(context, `yardstick.${yardsticks?.motor}.${name}`)?.value, name).toBeDefined();
  });
  it('says nothing under an address that is gone', () => {
    for (const address of ['nobody.flow', 'P1.nothing', 'finding.none', 'line.none.flow', ''])
      expect(explanationOf(context, address)).toBeNull();
  });
});
