import { fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState, type JSX } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { noOverrides } from '#common/chemistry/sourced';
import { defaultEnergeticModel, type EnergeticModel } from '#common/schemas/energetics';
import { ToastProvider } from '#client/components/toast.tsx';
import { SpacingPanel } from '#client/features/spacing/components/spacing-panel.tsx';
import { setEnergyUnit } from '#client/lib/energy-unit.ts';
import {
  caesiumChlorideCell,
  caesiumChlorideResult,
} from '#client/testing/energetics-factories.ts';

const cell = caesiumChlorideCell();
const result = caesiumChlorideResult();

function Held({
  start = {},
  onModel,
}: {
  start?: Partial<EnergeticModel>;
  onModel?: (model: EnergeticModel, field: string | null) => void;
}): JSX.Element {
  const [model, setModel] = useState<EnergeticModel>({ ...defaultEnergeticModel, ...start });
  const change = (next: EnergeticModel, field: string | null): void => {
    setModel(next);
    onModel?.(next, field);
  };
  return (
    <ToastProvider>
      <SpacingPanel
        {...{ cell, result, model }}
        overrides={noOverrides}
        onModel={onModel === undefined ? null : change}
      />
    </ToastProvider>
  );
}

afterEach(() => setEnergyUnit('kJ mol⁻¹'));

describe('the spacing section', () => {
  it('shows the lattice energy −A(1 − 1/n) with n of the ions, (12 + 9)/2 for Cs⁺ and Cl⁻', () => {
    render(<Held />);
    const expected = (-7.11310612345 * (1 - 1 / 10.5) * 96.48533212).toFixed(1).replace('-', '−');
    expect(screen.getAllByText(new RegExp(expected)).length).toBeGreaterThan(0);
    expect(screen.getByText(/model value at 0 K/)).toBeInTheDocument();
    expect(screen.getByText('10.50')).toBeInTheDocument();
  });

  it('changes its unit everywhere at once', async () => {
    const user = userEvent.setup();
    render(<Held />);
    await user.click(screen.getByRole('radio', { name: 'eV' }));
    const expected = (-7.11310612345 * (1 - 1 / 10.5)).toFixed(3).replace('-', '−');
    expect(screen.getAllByText(new RegExp(expected)).length).toBeGreaterThan(0);
  });

  it('takes a typed exponent, as a range too, and says beside the field what is wrong', async () => {
    const user = userEvent.setup();
    const onModel = vi.fn();
    render(<Held onModel={onModel} />);
    await user.click(screen.getByRole('radio', { name: 'typed' }));
    const field = screen.getByRole('textbox', { name: 'n, or a range' });
    await user.clear(field);
    expect(screen.getByText('Write the exponent.')).toBeInTheDocument();
    await user.type(field, '9 to 11');
    expect(onModel.mock.lastCall?.[0].repulsion).toEqual({
      kind: 'born_lande',
      exponent: { from: 'typed', exponent: { low: 9, high: 11 } },
    });
    await user.clear(field);
    await user.type(field, '99');
    expect(screen.getByText('Write the exponent between 2 and 30.')).toBeInTheDocument();
  });

  it('says what a fit to the bulk modulus needs, and fits once it is there', async () => {
    const user = userEvent.setup();
    const onModel = vi.fn();
    render(<Held onModel={onModel} />);
    await user.click(screen.getByRole('radio', { name: 'from bulk modulus' }));
    expect(screen.getByText(/Type the measured bulk modulus/)).toBeInTheDocument();
    await user.type(screen.getByRole('textbox', { name: 'Measured bulk modulus' }), '17');
    expect(screen.getByText(/the model is .?0\.0 % off/)).toBeInTheDocument();
  });

  it('starts a pair table from the fitted pairs and lets rows go and come back', async () => {
    const user = userEvent.setup();
    const onModel = vi.fn();
    render(<Held onModel={onModel} />);
    await user.click(screen.getByRole('button', { name: /^Repulsion/ }));
    await user.click(screen.getByRole('option', { name: /Pair table/ }));
    expect(onModel.mock.lastCall?.[0].repulsion.pairs).toHaveLength(3);
    await user.click(screen.getByRole('button', { name: 'Remove Cl⁻ – Cl⁻' }));
    expect(onModel.mock.lastCall?.[0].repulsion.pairs).toHaveLength(2);
    await user.click(screen.getByRole('button', { name: 'Add Cl⁻ – Cl⁻' }));
    expect(onModel.mock.lastCall?.[0].repulsion.pairs).toHaveLength(3);
  });

  it('reads the curve where the marker stands, by keyboard too', () => {
    render(<Held />);
    expect(
      screen.getByRole('img', { name: /Energy against spacing.*least at 3\.568 Å/ }),
    ).toBeVisible();
    fireEvent.change(screen.getByRole('slider', { name: /Spacing/ }), { target: { value: '3.3' } });
    expect(screen.getByText('3.300 Å')).toBeInTheDocument();
    expect(screen.getByText(/^\+\d+\.\d{3}$/)).toBeInTheDocument();
  });

  it('may only be read where the model may only be read', () => {
    render(<Held />);
    expect(screen.getByRole('button', { name: /^Repulsion/ })).toBeDisabled();
    expect(screen.getByRole('textbox', { name: 'Measured bulk modulus' })).toHaveAttribute(
      'readonly',
    );
  });
});
