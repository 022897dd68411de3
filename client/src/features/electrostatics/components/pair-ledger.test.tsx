import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState, type JSX } from 'react';
import { describe, expect, it, vi } from 'vitest';

import type { PairLedger as Ledger } from '#common/schemas/evaluation';
import { EnergyFigures } from '#client/features/electrostatics/components/energy-figures.tsx';
import { PairLedger } from '#client/features/electrostatics/components/pair-ledger.tsx';
import { ToastProvider } from '#client/components/toast.tsx';
import { ledgerOf, resultOf } from '#client/testing/lattice-factories.ts';

function Held({
  ledger,
  onSelect,
}: {
  ledger: Ledger;
  onSelect?: (key: string | null) => void;
}): JSX.Element {
  const [key, setKey] = useState<string | null>(null);
  return (
    <PairLedger
      ledger={ledger}
      selectedKey={key}
      onSelect={(next) => {
        setKey(next);
        onSelect?.(next);
      }}
      touchedKeys={new Set()}
      remarksByKey={new Map([['Cs+1|Cl-1|3.568', [2]]])}
      totalDecimals={8}
      isBehind={false}
    />
  );
}

const rowsOf = (): HTMLElement[] => within(screen.getByRole('grid')).getAllByRole('row');

describe('PairLedger', () => {
  it('reads as an account: pairs, what lies beyond, total', () => {
    render(<Held ledger={ledgerOf()} />);
    const texts = rowsOf().map((row) => row.textContent);
    expect(texts[1]).toContain('Cs+ – Cl−');
    expect(texts[1]).toContain('3.568');
    expect(texts[1]).toContain('−32.286');
    expect(texts[2]).toContain('+10.485');
    expect(texts[3]).toContain('beyond reach');
    expect(texts[3]).toContain('+14.688');
    expect(texts[4]).toContain('−7.1130 eV');
  });

  it('draws binding rows to the left and opposing rows to the right of the axis', () => {
    render(<Held ledger={ledgerOf()} />);
    const senses = rowsOf()
      .slice(1, 4)
      .map((row) => row.querySelector('[data-sense]'));
    expect(senses.map((one) => one?.getAttribute('data-sense'))).toEqual([
      'binds',
      'opposes',
      'opposes',
    ]);
    const bars = senses.map((one) => one?.querySelector<HTMLElement>('[style]')?.style.left);
    expect(Number.parseFloat(bars[0] ?? '')).toBeLessThan(50);
    expect(Number.parseFloat(bars[1] ?? '')).toBe(50);
  });

  it('is gone through with the keyboard and let go with Escape', async () => {
    const user = userEvent.setup();
    const onSelect = vi.fn();
    render(<Held ledger={ledgerOf()} onSelect={onSelect} />);
    await user.tab();
    await user.keyboard('{ArrowDown}');
    expect(onSelect).toHaveBeenLastCalledWith('Cs+1|Cl-1|3.568');
    await user.keyboard('{ArrowDown}');
    expect(onSelect).toHaveBeenLastCalledWith('Cs+1|Cs+1|4.120');
    expect(rowsOf()[2]).toHaveAttribute('aria-selected', 'true');
    await user.keyboard('{Escape}');
    expect(onSelect).toHaveBeenLastCalledWith(null);
  });

  it('selects with a click and lets go with a second one', async () => {
    const user = userEvent.setup();
    const onSelect = vi.fn();
    render(<Held ledger={ledgerOf()} onSelect={onSelect} />);
    await user.click(rowsOf()[2]!);
    await user.click(rowsOf()[2]!);
    expect(onSelect.mock.calls).toEqual([['Cs+1|Cs+1|4.120'], [null]]);
  });

  it('shows the remarks pinned to a row, and the self row when neutralised', () => {
    render(<Held ledger={ledgerOf({ view: 'neutralised', selfEv: -2.5 })} />);
    expect(rowsOf()[1]).toHaveTextContent('remark 2');
    expect(rowsOf()[3]).toHaveTextContent('own neutral sphere');
    expect(rowsOf()[3]).toHaveTextContent('−2.500');
  });
});

describe('EnergyFigures', () => {
  it('ends the energy where k_e ends it, and says why a constant is missing', () => {
    render(
      <ToastProvider>
        <EnergyFigures result={resultOf()} />
      </ToastProvider>,
    );
    expect(
      screen.getByRole('button', { name: /^−7\.113\s?106\s?12 eV per formula unit$/ }),
    ).toBeInTheDocument();
    expect(
      screen.getByRole('button', { name: 'not defined: More than two kinds of ion.' }),
    ).toBeInTheDocument();
    expect(screen.getByText(/certain to ± 2 × 10⁻⁹ eV · conducting boundary/)).toBeInTheDocument();
  });

  it('does not hide that the two evaluations disagree', () => {
    const { certificate } = resultOf();
    render(
      <ToastProvider>
        <EnergyFigures result={resultOf({ certificate: { ...certificate, agrees: false } })} />
      </ToastProvider>,
    );
    expect(screen.getByRole('alert')).toHaveTextContent('doubtful');
  });
});
