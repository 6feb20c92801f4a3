import { configure, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { checkDocument } from '#shared/circuit/check-document.ts';
import { addCase } from '#shared/circuit/edit/cases.ts';
import { emptyCircuit } from '#shared/circuit/edit/empty-circuit.ts';
import { builtPress } from '#shared/circuit/edit/test-circuits.ts';
import { setValue } from '#shared/circuit/edit/values.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useNameplate } from '#src/stores/nameplate-store.ts';
import { DrawStage } from './draw-stage.tsx';

// Roles are worked out from the whole page, which takes its time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });
configure({ asyncUtilTimeout: 10_000 });

const present = () => useDocument.getState().document;
const kindsOnSheet = () => present().components.map((component) => component.kind);

function show(document = builtPress()) {
  useDocument.getState().load(document);
  return render(<DrawStage />);
}

/** The ring at a port, reached as a keyboard reaches it. */
const ring = (address: string) => globalThis.document.querySelector<HTMLElement>(`[data-ring="${address}"]`) as HTMLElement;

beforeEach(() => useNameplate.getState().close());

describe('the Draw stage', () => {
  it('offers an empty sheet a motor, a pump and three circuits, and opens the strip at the pump outlet', async () => {
    const user = userEvent.setup();
    show(emptyCircuit());
    expect(screen.getAllByRole('button', { name: /compensated pump|test stand|lift/i }).length).toBeGreaterThanOrEqual(3);
    await user.click(screen.getByRole('button', { name: /begin with a motor and a pump/i }));
    expect(kindsOnSheet()).toEqual(['compensated-pump', 'electric-motor']);
    expect(await screen.findByRole('menu', { name: 'What follows the pump line?' })).toBeTruthy();
  });

  it('grows a circuit by keys alone: Enter on a ring, arrows, Enter', async () => {
    const user = userEvent.setup();
    show(emptyCircuit());
    await user.click(screen.getByRole('button', { name: /begin with a motor/i }));
    const strip = await screen.findByRole('menu');
    await waitFor(() => expect(within(strip).getByRole('menuitem', { name: 'relief, likeliest' })).toBe(globalThis.document.activeElement));
    await user.keyboard('{Enter}');
    expect(kindsOnSheet()).toContain('relief-valve');
    await waitFor(() => expect(ring('v1.T')).toBe(globalThis.document.activeElement));
    await user.keyboard('{Enter}');
    await waitFor(() => expect(screen.getByRole('menuitem', { name: 'tank, likeliest' })).toBe(globalThis.document.activeElement));
    await user.keyboard('{ArrowLeft}{Escape}');
    await waitFor(() => expect(ring('v1.T')).toBe(globalThis.document.activeElement));
    expect(kindsOnSheet()).not.toContain('tank');
    await user.keyboard('{Enter}');
    await waitFor(() => expect(screen.getByRole('menuitem', { name: 'tank, likeliest' })).toBe(globalThis.document.activeElement));
    await user.keyboard('{Enter}');
    expect(kindsOnSheet()).toContain('tank');
    expect(checkDocument(present()).ok).toBe(true);
  });

  it('joins two rings from the list, and says why unlike ones are not in it', async () => {
    const user = userEvent.setup();
    show();
    ring('p1.drain').focus();
    await user.keyboard('{Enter}');
    await user.click(await screen.findByRole('menuitem', { name: 'join to…' }));
    const list = await screen.findByRole('menu', { name: /^Join P1 case drain to/ });
    expect(within(list).queryByRole('menuitem', { name: /shaft/ })).toBeNull();
    const before = present().lines.length;
    await user.click(within(list).getByRole('menuitem', { name: /^V2 tank port/ }));
    expect(present().lines.length).toBeGreaterThan(before);
    expect(checkDocument(present()).ok).toBe(true);
  });

  it('moves, turns, mirrors, duplicates and deletes what has the focus, each one step to undo', async () => {
    const user = userEvent.setup();
    show();
    const relief = await screen.findByRole('button', { name: 'relief V2' });
    relief.focus();
    const at = () => present().components.find((component) => component.id === 'v2');
    const start = at();
    await user.keyboard('{ArrowRight>3/}');
    expect(at()?.at.x).toBe((start?.at.x ?? 0) + 3);
    await user.keyboard('{Control>}z{/Control}');
    expect(at()).toBe(start);
    await user.keyboard('r');
    expect(at()?.turn).toBe(1);
    await user.keyboard('x');
    expect(at()?.mirror).toBe(true);
    await user.keyboard('d');
    expect(kindsOnSheet().filter((kind) => kind === 'relief-valve')).toHaveLength(2);
    await user.keyboard('{Control>}z{/Control}{Control>}z{/Control}{Control>}z{/Control}');
    expect(at()).toBe(start);
    useDocument.getState().select(['v2']);
    (await screen.findByRole('button', { name: 'relief V2' })).focus();
    await user.keyboard('{Delete}');
    expect(at()).toBeUndefined();
    expect(screen.getAllByText(/relief V2 deleted, with the line/).length).toBeGreaterThan(0);
  });

  it('names what goes along before a deletion that takes more than lines', async () => {
    const user = userEvent.setup();
    const made = addCase(builtPress(), 'a', 'Float centre');
    show(setValue(made.document, 'b', 'v1', 'centre', 'float').document);
    (await screen.findByRole('button', { name: '4/3 valve V1' })).focus();
    await user.keyboard('{Delete}');
    const question = await screen.findByRole('alertdialog', { name: 'Delete 4/3 valve V1' });
    expect(within(question).getByText('1 change in case Float centre')).toBeTruthy();
    expect(within(question).getByText("the command 'Solenoid a on'")).toBeTruthy();
    await user.click(within(question).getByRole('button', { name: 'Keep' }));
    expect(kindsOnSheet()).toContain('directional-valve-4-3');
  });

  it('says what is missing at its place and in the line above, and the cure cures it', async () => {
    const user = userEvent.setup();
    show(emptyCircuit());
    await user.click(screen.getByRole('button', { name: 'Place Compensated pump' }));
    fireEvent.keyDown(screen.getByRole('region', { name: 'The sheet' }), { key: 'Escape' });
    fireEvent.click(screen.getByRole('button', { name: 'Place Compensated pump' }), { detail: 0 });
    expect(kindsOnSheet()).toEqual(['compensated-pump']);
    const cure = await screen.findByRole('button', { name: 'Add a motor' });
    await user.click(cure);
    expect(kindsOnSheet()).toContain('electric-motor');
    expect(present().shafts).toHaveLength(1);
  });

  it('selects all, copies and pastes', async () => {
    const user = userEvent.setup();
    show();
    (await screen.findByRole('button', { name: 'relief V2' })).focus();
    await user.keyboard('{Control>}a{/Control}{Control>}c{/Control}{Control>}v{/Control}');
    expect(present().components).toHaveLength(2 * builtPress().components.length);
    expect(present().shafts).toHaveLength(2);
  });

  it('opens the nameplate on Enter and leaves letters typed in a note alone', async () => {
    const user = userEvent.setup();
    show();
    (await screen.findByRole('button', { name: 'relief V2' })).focus();
    await user.keyboard('{Enter}');
    expect(useNameplate.getState().target).toBe('v2');
    await user.click(screen.getByRole('button', { name: 'Note' }));
    const field = await screen.findByRole('textbox');
    await user.type(field, 'drx<b>{Enter}');
    expect(present().notes[0]?.text).toBe('drx<b>');
    expect(kindsOnSheet()).toHaveLength(builtPress().components.length);
  });
});
