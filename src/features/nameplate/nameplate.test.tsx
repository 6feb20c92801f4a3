import '@testing-library/jest-dom/vitest';
import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, describe, expect, it } from 'vitest';
import { removeItems } from '#shared/circuit/edit/removal.ts';
import { effectiveNumber } from '#shared/circuit/effective.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import type { CircuitCase } from '#shared/circuit/schema.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useExplain } from '#src/stores/explain-store.ts';
import { openNameplate, useNameplate } from '#src/stores/nameplate-store.ts';
import { NameplateLayer } from './nameplate-layer.tsx';

const CC = 1e-6 / (2 * Math.PI);
const [first, second] = demoCircuit.cases as [CircuitCase, CircuitCase];

function open(target: string, caseId = first.id) {
  useDocument.getState().setActiveCase(caseId);
  openNameplate(target);
  render(<NameplateLayer />);
}
function row(field: string): HTMLElement {
  return document.querySelector(`[data-field="${field}"]`) as HTMLElement;
}
async function type(field: string, text: string) {
  const input = within(row(field)).getByRole('textbox');
  await userEvent.clear(input);
  await userEvent.type(input, `${text}{Enter}`);
}
const valueIn = (field: string) => {
  const { document: circuit, activeCase } = useDocument.getState();
  return effectiveNumber(circuit, activeCase, 'P1', field);
};

beforeEach(() => {
  useDocument.getState().load(demoCircuit);
  useNameplate.getState().close();
  useExplain.getState().close();
});

describe('a nameplate', () => {
  it('shows a value as typed, the same in the other system, and where it comes from', () => {
    open('P1');
    expect(within(row('compensatorPressure')).getByRole('textbox')).toHaveValue('190 bar');
    expect(row('compensatorPressure')).toHaveTextContent('2756 psi');
    expect(row('compensatorPressure').querySelector('.source-typed')).toHaveTextContent('typed');
    expect(row('leakage').querySelector('.source')).toHaveTextContent('typical');
  });
  it('keeps a value in the unit it was typed in', async () => {
    open('P1');
    await type('compensatorPressure', '2610 psi');
    expect(valueIn('compensatorPressure')).toBeCloseTo(2610 * 6894.757293, -1);
    expect(within(row('compensatorPressure')).getByRole('textbox')).toHaveValue('2610 psi');
  });
  it('refuses what the screw cannot reach, in the row, with the nearest value', async () => {
    open('P1');
    const before = valueIn('maxVolumeStop');
    await type('maxVolumeStop', '4');
    expect(screen.getByRole('alert')).toHaveTextContent('The screw turns between 7');
    expect(valueIn('maxVolumeStop')).toBe(before);
    await userEvent.click(screen.getByRole('button', { name: /^Use 7/ }));
    expect(valueIn('maxVolumeStop')).toBeCloseTo(7 * CC, 12);
    expect(screen.queryByRole('alert')).toBeNull();
  });
  it('runs a setting above a rating as a trial, says so, and offers the way back', async () => {
    open('P1');
    await type('ratedPressure', '180');
    expect(screen.getByText('Above rating.')).toBeVisible();
    await userEvent.click(screen.getByRole('button', { name: /^Back to 180/ }));
    expect(valueIn('compensatorPressure')).toBe(180e5);
    expect(screen.queryByText('Above rating.')).toBeNull();
  });
  it('writes into the case on the drawing, and an emptied field gives the found value back', async () => {
    open('P1', second.id);
    expect(row('maxVolumeStop')).toHaveAttribute('data-changed');
    await type('maxVolumeStop', '20');
    expect(effectiveNumber(useDocument.getState().document, first.id, 'P1', 'maxVolumeStop')).toBeCloseTo(28 * CC, 12);
    expect(valueIn('maxVolumeStop')).toBeCloseTo(20 * CC, 12);
    await userEvent.clear(within(row('maxVolumeStop')).getByRole('textbox'));
    await userEvent.keyboard('{Enter}');
    expect(valueIn('maxVolumeStop')).toBeCloseTo(28 * CC, 12);
  });
  it('explains each value', async () => {
    open('P1');
    await userEvent.click(within(row('displacement')).getByRole('button', { name: 'Displacement' }));
    expect(useExplain.getState().address).toBe('plate:P1.displacement');
  });
  it('sets faults by their severity and the data of the lines at its ports', async () => {
    open('P1');
    await userEvent.click(screen.getByRole('button', { name: /^Faults/ }));
    await type('fault.worn', '40 %');
    expect(valueIn('fault.worn')).toBeCloseTo(0.4, 12);
    const line = useDocument.getState().document.lines.find((entry) => entry.from.component === 'P1' || entry.to.component === 'P1');
    await type('length', '2 ft');
    expect(useDocument.getState().document.lines.find((entry) => entry.id === line?.id)?.length ?? 0).toBeGreaterThan(0);
  });
  it('closes on Escape and when its part is deleted', async () => {
    open('P1');
    await userEvent.keyboard('{Escape}');
    expect(useNameplate.getState().target).toBeNull();
    act(() => openNameplate('P1'));
    act(() => useDocument.getState().edit((circuit) => removeItems(circuit, ['P1'])));
    expect(useNameplate.getState().target).toBeNull();
  });
});

describe('plates of the whole circuit', () => {
  it('set supply and site; a supply tried against a frozen as-found makes a case of its own', async () => {
    open('supply');
    await type('voltage', '360');
    await type('altitude', '2000 ft');
    const { document: circuit, activeCase } = useDocument.getState();
    expect(activeCase).not.toBe(first.id);
    expect(circuit.supply.voltage).toBe(400);
    expect(effectiveNumber(circuit, activeCase, 'supply', 'voltage')).toBe(360);
    expect(effectiveNumber(circuit, activeCase, 'site', 'altitude')).toBeCloseTo(609.6, 9);
  });
  it('refuse what the document does not allow', async () => {
    open('fluid');
    await type('airFraction', '40 %');
    expect(screen.getByRole('alert')).toHaveTextContent('Free air in the oil');
    expect(useDocument.getState().document).toBe(demoCircuit);
  });
  it('set the duty', async () => {
    open('duty');
    await userEvent.click(screen.getByRole('checkbox'));
    expect(useDocument.getState().document.duty.repeat).toBe(!demoCircuit.duty.repeat);
    await userEvent.click(screen.getAllByRole('button', { name: /^Delete "/ })[0] as HTMLElement);
    expect(useDocument.getState().document.duty.commands).toHaveLength(demoCircuit.duty.commands.length - 1);
  });
  it('add, change and delete requirements', async () => {
    open('requirements');
    const before = demoCircuit.requirements.length;
    await userEvent.selectOptions(screen.getByLabelText(/^Add a requirement on/), 'rms current');
    expect(useDocument.getState().document.requirements).toHaveLength(before + 1);
    await userEvent.click(screen.getAllByRole('button', { name: 'Delete' })[0] as HTMLElement);
    expect(useDocument.getState().document.requirements).toHaveLength(before);
  });
});
