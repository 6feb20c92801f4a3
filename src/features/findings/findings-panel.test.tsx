import '@testing-library/jest-dom/vitest';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, describe, expect, it } from 'vitest';
import { effectiveNumber } from '#shared/circuit/effective.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import type { CircuitCase } from '#shared/circuit/schema.ts';
import type { Assessment, Finding } from '#shared/findings/finding.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useExplain } from '#src/stores/explain-store.ts';
import { remedyKey, useRuns } from '#src/stores/run-store.ts';
import { FindingsPanel } from './findings-panel.tsx';

const [first, second] = demoCircuit.cases as [CircuitCase, CircuitCase];

function finding(id: string, severity: Finding['severity'], patch: Partial<Finding> = {}): Finding {
  return {
    id,
    rule: 'motor-stalls',
    severity,
    caseId: first.id,
    headline: [`${id} happened`],
    cause: ['At ', { value: 149e5, quantity: 'pressure', address: 'P1.outlet.pressure' }, '.'],
    ...patch,
  };
}
const stall = finding('stall', 0, {
  time: 2.1,
  caution: 'Find the cause before resetting.',
  remedy: {
    words: ['Turn the stop in.'],
    seek: {
      target: 'P1',
      field: 'maxVolumeStop',
      quantity: 'displacement',
      low: 1e-6,
      high: 5e-6,
      want: 'largest',
      goal: 'not-stalled-with-margin',
    },
  },
});
const findings = [
  stall,
  finding('trip', 0, { caution: 'Find the cause before resetting.' }),
  finding('heat', 2),
  finding('gap', 2),
  finding('left', 3),
];
const assessment: Assessment = {
  caseId: first.id,
  verdict: { id: 'motor-stalls', word: 'Motor stalls' },
  findings,
  yardsticks: [
    {
      motor: 'M1',
      stallMargin: 1.499,
      stalled: false,
      rmsCurrent: 0.704,
      rmsTorque: 0.6,
      peakTorque: 1.284,
      peakCurrent: 14,
      tripTime: null,
    },
  ],
  requirements: [],
  heat: 0,
};

beforeEach(() => {
  useDocument.getState().load(demoCircuit);
  useRuns.setState({ byCase: {}, remedies: {} });
  useRuns.getState().put(first.id, { state: 'done', assessment });
});

describe('FindingsPanel', () => {
  it('shows the worst three, then the rest in place', async () => {
    render(<FindingsPanel form="list" />);
    expect(screen.getAllByRole('article')).toHaveLength(3);
    await userEvent.click(screen.getByRole('button', { name: '2 more' }));
    expect(screen.getAllByRole('article')).toHaveLength(5);
  });
  it('says a caution once, not with each finding that brings it', () => {
    render(<FindingsPanel form="list" />);
    expect(screen.getAllByText('Find the cause before resetting.')).toHaveLength(1);
  });
  it('puts the cursor on the moment', async () => {
    render(<FindingsPanel form="list" />);
    await userEvent.click(screen.getByRole('button', { name: 'Show the moment' }));
    expect(useCursor.getState().time).toBe(2.1);
  });
  it('opens how a figure was computed, for the finding’s own case', async () => {
    render(<FindingsPanel form="list" />);
    await userEvent.click(within(screen.getAllByRole('article')[0] as HTMLElement).getByRole('button', { name: /149/ }));
    expect(useExplain.getState()).toMatchObject({ address: 'P1.outlet.pressure', caseId: first.id });
  });
  it('finds the setting, then offers it as a new case', async () => {
    const { rerender } = render(<FindingsPanel form="list" />);
    expect(screen.getByText(/Finding the setting/)).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Try it as a new case' })).toBeNull();
    const value = 10e-6 / (2 * Math.PI);
    useRuns.getState().putRemedy(remedyKey(stall), {
      found: true,
      change: { target: 'P1', field: 'maxVolumeStop', value },
      words: ['Margin 1.3.'],
      runs: 7,
    });
    rerender(<FindingsPanel form="list" />);
    await userEvent.click(await screen.findByRole('button', { name: 'Try it as a new case' }));
    const { document, activeCase, overlays } = useDocument.getState();
    expect(document.cases).toHaveLength(demoCircuit.cases.length + 1);
    expect(effectiveNumber(document, activeCase, 'P1', 'maxVolumeStop')).toBeCloseTo(value, 12);
    expect(overlays).toContain(first.id);
  });
  it('says when the setting has been tried already', () => {
    const tried = effectiveNumber(demoCircuit, second.id, 'P1', 'maxVolumeStop') as number;
    useRuns.getState().putRemedy(remedyKey(stall), {
      found: true,
      change: { target: 'P1', field: 'maxVolumeStop', value: tried * 1.1 },
      words: [],
      runs: 7,
    });
    render(<FindingsPanel form="list" />);
    expect(screen.getByRole('button', { name: 'Tried as case B' })).toBeVisible();
  });
  it('rounds the stall margin down and loads to nearest, in this order', () => {
    render(<FindingsPanel form="list" />);
    const rows = within(screen.getByRole('table')).getAllByRole('row').slice(1);
    expect(rows.map((row) => row.textContent)).toEqual([
      expect.stringMatching(/^Stall margin1\.4$/),
      expect.stringMatching(/nameplate70\s%$/),
      expect.stringMatching(/rated torque1\.28$/),
    ]);
  });
  it('says why a case was not run', () => {
    useRuns
      .getState()
      .put(first.id, { state: 'refused', assessment: null, problems: [{ severity: 'problem', code: 'x', message: 'P1 has no tank.' }] });
    render(<FindingsPanel form="list" />);
    expect(screen.getByText('P1 has no tank.')).toBeVisible();
  });
});
