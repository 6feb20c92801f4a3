import '@testing-library/jest-dom/vitest';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { QuantityField, type QuantityFieldProps } from './quantity-field.tsx';

function show(patch: Partial<QuantityFieldProps> = {}) {
  const onCommit = vi.fn<QuantityFieldProps['onCommit']>(() => undefined);
  render(
    <QuantityField
      label="Relief"
      value={215e5}
      typed="215 bar"
      quantity="pressure"
      limits={{ min: 20e5, max: 350e5, label: 'Relief' }}
      onCommit={onCommit}
      {...patch}
    />,
  );
  return { onCommit, field: screen.getByLabelText('Relief') as HTMLInputElement };
}

describe('QuantityField', () => {
  it('takes another unit by its suffix and hands back what was typed', async () => {
    const { onCommit, field } = show();
    await userEvent.clear(field);
    await userEvent.type(field, '2000 psi{Enter}');
    expect(onCommit).toHaveBeenCalledTimes(1);
    expect(onCommit.mock.calls[0]?.[0]).toBeCloseTo(13_789_514.6, 0);
    expect(onCommit.mock.calls[0]?.[1]).toBe('2000 psi');
  });
  it('keeps the unit the value was typed in for a bare number', async () => {
    const { onCommit, field } = show({ typed: '3118 psi' });
    await userEvent.clear(field);
    await userEvent.type(field, '3000{Enter}');
    expect(onCommit.mock.calls[0]?.[1]).toBe('3000 psi');
  });
  it('asks an ambiguous number back with both readings as buttons', async () => {
    const { onCommit, field } = show({ limits: { min: 0, max: 1e12 } });
    await userEvent.clear(field);
    await userEvent.type(field, '1,710{Enter}');
    expect(onCommit).not.toHaveBeenCalled();
    expect(screen.getByRole('alert')).toHaveTextContent('can be read in two ways');
    await userEvent.click(screen.getByRole('button', { name: /^1\.710/ }));
    expect(onCommit.mock.calls[0]?.[0]).toBeCloseTo(1.71e5, 6);
  });
  it('refuses a value out of range, strikes it through, offers the nearest and keeps the former one', async () => {
    const { onCommit, field } = show();
    await userEvent.clear(field);
    await userEvent.type(field, '5{Enter}');
    expect(field).toHaveAttribute('data-refused');
    expect(field).toBeInvalid();
    expect(screen.getByRole('alert')).toHaveTextContent('Relief lies between');
    expect(screen.getByRole('button', { name: /^Use 20/ })).toBeVisible();
    await userEvent.click(screen.getByRole('button', { name: 'Keep 215 bar' }));
    expect(field).toHaveValue('215 bar');
    expect(onCommit).not.toHaveBeenCalled();
  });
  it('shows why the circuit refused a value that the field allowed', async () => {
    const { field } = show({ onCommit: () => ({ message: 'must be at least 20 bar', nearest: 20e5 }) });
    await userEvent.clear(field);
    await userEvent.type(field, '30{Enter}');
    expect(screen.getByRole('alert')).toHaveTextContent('must be at least 20 bar');
  });
  it('gives the former value back on Escape and commits nothing when it is left unchanged', async () => {
    const { onCommit, field } = show();
    await userEvent.type(field, '9{Escape}');
    expect(field).toHaveValue('215 bar');
    await userEvent.tab();
    expect(onCommit).not.toHaveBeenCalled();
  });
  it('refuses text with the name of the field', async () => {
    const { field } = show();
    await userEvent.clear(field);
    await userEvent.type(field, '<b>much</b>{Enter}');
    expect(screen.getByRole('alert')).toHaveTextContent('Relief: "<b>much</b>" is not a number');
  });
  it('clears only where the field may be empty', async () => {
    const onClear = vi.fn();
    const { field } = show({ onClear });
    await userEvent.clear(field);
    await userEvent.keyboard('{Enter}');
    expect(onClear).toHaveBeenCalled();
  });
});
