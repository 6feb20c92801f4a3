import '@testing-library/jest-dom/vitest';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';
import { CaseRow } from './case-row.tsx';

beforeEach(() => {
  useDocument.getState().load(demoCircuit);
  useRuns.setState({ byCase: {}, remedies: {} });
});

describe('CaseRow', () => {
  it('has a card for each case, A first, and says which one is on the drawing', () => {
    render(<CaseRow form="cards" />);
    expect(screen.getByRole('button', { name: 'Case A, As found: on the drawing' })).toHaveAttribute('aria-pressed', 'true');
    expect(screen.getByRole('button', { name: /^Case B, .*: put on the drawing$/ })).toBeVisible();
  });
  it('puts a case on the drawing and overlays another', async () => {
    render(<CaseRow form="cards" />);
    await userEvent.click(screen.getByRole('button', { name: /^Case B/ }));
    await userEvent.click(screen.getByRole('button', { name: 'overlay: case A' }));
    const { document, activeCase, overlays } = useDocument.getState();
    expect([activeCase, ...overlays]).toEqual([document.cases[1]?.id, document.cases[0]?.id]);
    expect(screen.getByRole('button', { name: 'overlaid: case A' })).toHaveAttribute('aria-pressed', 'true');
  });
  it('makes a new case from the one on the drawing, in one step of undo', async () => {
    render(<CaseRow form="cards" />);
    await userEvent.click(screen.getByRole('button', { name: /^Case B/ }));
    await userEvent.click(screen.getByRole('button', { name: 'New case from B' }));
    const { document, undo } = useDocument.getState();
    expect(document.cases).toHaveLength(4);
    expect(document.cases[3]?.changes).toEqual(document.cases[1]?.changes);
    undo();
    expect(useDocument.getState().document).toBe(demoCircuit);
  });
  it('renames in place; Escape leaves the old name; markup stays text', async () => {
    render(<CaseRow form="cards" />);
    screen.getByRole('button', { name: /^Case A/ }).focus();
    await userEvent.keyboard('{F2}');
    await userEvent.keyboard('gone{Escape}');
    expect(useDocument.getState().document).toBe(demoCircuit);
    screen.getByRole('button', { name: /^Case A/ }).focus();
    await userEvent.keyboard('{F2}');
    await userEvent.clear(screen.getByLabelText('Name of case A'));
    await userEvent.keyboard('<i>Old</i>{Enter}');
    expect(useDocument.getState().document.cases[0]?.name).toBe('<i>Old</i>');
    expect(screen.getByText('<i>Old</i>')).toBeVisible();
  });
  it('shows the trace’s dash instead of the sparkline with three or more on the screen', async () => {
    const { container } = render(<CaseRow form="cards" />);
    expect(container.querySelectorAll('.case-foot > svg')).toHaveLength(0);
    await userEvent.click(screen.getByRole('button', { name: 'overlay: case B' }));
    await userEvent.click(screen.getByRole('button', { name: 'overlay: case C' }));
    expect(container.querySelectorAll('.case-foot > svg')).toHaveLength(3);
  });
});
