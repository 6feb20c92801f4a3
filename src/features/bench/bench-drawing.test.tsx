import { fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { effectiveNumber } from '#shared/circuit/effective.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { usePreferences } from '#src/stores/preferences-store.ts';
import { BenchDrawing } from './bench-drawing.tsx';

vi.setConfig({ testTimeout: 60_000 });

const CUBIC = 1e-6 / (2 * Math.PI);
const store = () => useDocument.getState();
const stop = () => (effectiveNumber(store().document, store().activeCase, 'P1', 'maxVolumeStop') ?? 0) / CUBIC;
const relief = () => (effectiveNumber(store().document, store().activeCase, 'V2', 'setPressure') ?? 0) / 1e5;
const slider = (address: string) => {
  const tag = document.querySelector<HTMLElement>(`[data-tag="${address}"]`);
  if (!tag) throw new Error(`no tag ${address}`);
  return within(tag).getByRole('slider', { hidden: true });
};

beforeEach(() => {
  usePreferences.setState({ system: 'si', overrides: {} });
  store().load(demoCircuit);
  store().setActiveCase('B');
});

describe('the drawing of the bench', () => {
  it('carries a tag for everything that can be turned', () => {
    render(<BenchDrawing onOpen={() => undefined} />);
    const addresses = [...document.querySelectorAll('[data-tag]')].map((tag) => tag.getAttribute('data-tag'));
    expect(addresses.sort()).toEqual(
      ['A1.workForce', 'P1.compensatorPressure', 'P1.maxVolumeStop', 'P1.minVolumeStop', 'V2.setPressure', 'supply.voltage'].sort(),
    );
    expect(document.querySelectorAll('[data-component]')).toHaveLength(demoCircuit.components.length);
    expect(document.querySelectorAll('[data-line]')).toHaveLength(demoCircuit.lines.length);
  });

  it('turns the screw in hand by quarters, finely with Shift, and back to as found', () => {
    render(<BenchDrawing onOpen={() => undefined} />);
    fireEvent.focus(slider('P1.maxVolumeStop'));
    expect(store().inHand).toBe('P1.maxVolumeStop');
    fireEvent.keyDown(slider('P1.maxVolumeStop'), { key: 'ArrowUp' });
    expect(stop()).toBeCloseTo(15, 6);
    fireEvent.keyDown(slider('P1.maxVolumeStop'), { key: 'ArrowDown', shiftKey: true });
    expect(stop()).toBeCloseTo(15.125, 6);
    expect(store().past).toHaveLength(2);
    fireEvent.keyDown(slider('P1.maxVolumeStop'), { key: 'Home' });
    expect(stop()).toBeCloseTo(28, 6);
  });

  it('stops at the end of the range and says so', () => {
    render(<BenchDrawing onOpen={() => undefined} />);
    for (let k = 0; k < 20; k += 1) fireEvent.keyDown(slider('P1.maxVolumeStop'), { key: 'ArrowUp' });
    expect(stop()).toBeCloseTo(7, 6);
    expect(screen.getByText(/lower end of its range/)).toBeInTheDocument();
  });

  it('takes a typed value with any unit and refuses one outside the range with the nearest', async () => {
    const user = userEvent.setup();
    render(<BenchDrawing onOpen={() => undefined} />);
    slider('P1.maxVolumeStop').focus();
    await user.keyboard('1.2 in3/rev{Enter}');
    expect(stop()).toBeCloseTo(19.66, 1);
    await user.keyboard('99{Enter}');
    expect(stop()).toBeCloseTo(19.66, 1);
    expect(screen.getByRole('alert')).toHaveTextContent(/28/);
    fireEvent.click(screen.getByRole('button', { name: /^Use/ }));
    await waitFor(() => expect(stop()).toBeCloseTo(28, 6));
  });

  it('asks to loosen the lock nut first', () => {
    render(<BenchDrawing onOpen={() => undefined} />);
    fireEvent.keyDown(slider('V2.setPressure'), { key: 'ArrowUp' });
    expect(relief()).toBeCloseTo(215, 6);
    fireEvent.click(screen.getByRole('button', { name: 'Loosen the nut' }));
    fireEvent.keyDown(slider('V2.setPressure'), { key: 'ArrowUp' });
    expect(relief()).toBeCloseTo(225, 6);
    fireEvent.keyDown(slider('V2.setPressure'), { key: 'l' });
    expect(store().document.components.find((entry) => entry.id === 'V2')?.screws?.setPressure?.locked).toBe(true);
  });

  it('makes the next case when a screw of frozen A is turned, as one step', () => {
    store().setActiveCase('A');
    render(<BenchDrawing onOpen={() => undefined} />);
    const before = store().document.cases.length;
    fireEvent.keyDown(slider('P1.compensatorPressure'), { key: 'ArrowDown' });
    expect(store().document.cases).toHaveLength(before + 1);
    expect(store().activeCase).not.toBe('A');
    store().undo();
    expect(store().document.cases).toHaveLength(before);
  });

  it('opens the nameplate by Enter and by double click on a symbol', () => {
    const open = vi.fn();
    render(<BenchDrawing onOpen={open} />);
    fireEvent.keyDown(slider('P1.maxVolumeStop'), { key: 'Enter' });
    expect(open).toHaveBeenLastCalledWith('P1');
    const valve = document.querySelector('[data-component="V3"]');
    if (valve) fireEvent.doubleClick(valve);
    expect(open).toHaveBeenLastCalledWith('V3');
  });

  it('tells the drawing as a list of parts in flow order', () => {
    render(<BenchDrawing onOpen={() => undefined} />);
    const items = within(screen.getByRole('list', { name: /Parts in flow order/ })).getAllByRole('listitem');
    expect(items.map((item) => item.textContent?.split(',')[0])).toEqual([
      'Motor M1',
      'Pump P1',
      expect.stringContaining('V1'),
      expect.any(String),
      expect.any(String),
      expect.any(String),
      expect.any(String),
      expect.any(String),
    ]);
    expect(items[1]).toHaveTextContent('Max. volume stop 16.0');
  });

  it('says what to do on an empty sheet', () => {
    store().load({
      ...demoCircuit,
      components: [],
      lines: [],
      shafts: [],
      cases: [demoCircuit.cases[0] as (typeof demoCircuit.cases)[number]],
    });
    render(<BenchDrawing onOpen={() => undefined} />);
    expect(screen.getByText(/Nothing is drawn yet/)).toBeInTheDocument();
  });
});
