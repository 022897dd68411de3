import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';

import { CertainNumber } from '#client/components/chem/certain-number.tsx';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { IonText } from '#client/components/chem/ion-text.tsx';
import { SpaceGroupText } from '#client/components/chem/space-group-text.tsx';
import { parseSpeciesKey, speciesText } from '#client/components/chem/species-key.ts';
import { ToastProvider } from '#client/components/toast.tsx';

describe('formulas and ions', () => {
  it('sets counts low and charges high', () => {
    const { container } = render(<FormulaText formula="Al2O3" />);
    expect([...container.querySelectorAll('sub')].map((one) => one.textContent)).toEqual([
      '2',
      '3',
    ]);
    const ion = render(<IonText speciesKey="Mg+2" />);
    expect(ion.container.querySelector('sup')).toHaveTextContent('2+');
    expect(ion.container).toHaveTextContent('Mg2+');
  });

  it('leaves a leading number of a formula on the line', () => {
    const { container } = render(<FormulaText formula="MgAl2O4" />);
    expect(container).toHaveTextContent('MgAl2O4');
    expect(container.querySelectorAll('sub')).toHaveLength(2);
  });

  it('reads mixed species with their shares', () => {
    expect(parseSpeciesKey('Mg+2:0.75/Fe+2:0.25')).toEqual([
      { element: 'Mg', charge: 2, occupancy: 0.75 },
      { element: 'Fe', charge: 2, occupancy: 0.25 },
    ]);
    expect(speciesText('O-2')).toBe('O²⁻');
    expect(speciesText('Na+1')).toBe('Na⁺');
    expect(speciesText('Ar0')).toBe('Ar');
  });
});

describe('SpaceGroupText', () => {
  it('overlines inversion axes and lowers screw axes', () => {
    const { container } = render(<SpaceGroupText symbol="F m -3 m" />);
    expect(container.querySelector('.overline')).toHaveTextContent('3');
    const screw = render(<SpaceGroupText symbol="P 42/m n m" />);
    expect(screw.container.querySelector('sub')).toHaveTextContent('2');
    expect(screw.container.querySelector('[aria-hidden]')).toHaveTextContent('P 42/m n m');
  });
});

describe('CertainNumber', () => {
  it('ends where certainty ends, says why, and copies with its unit', async () => {
    vi.stubGlobal('isSecureContext', true);
    const user = userEvent.setup();
    render(
      <ToastProvider>
        <CertainNumber
          value={-47.7954617216}
          bound={8e-9}
          unit="eV"
          convention="Electrostatic energy of one formula unit."
        />
      </ToastProvider>,
    );
    const number = screen.getByRole('button', { name: /−47\.795\s?461\s?7 eV/ });
    await user.hover(number);
    expect(screen.getByRole('tooltip')).toHaveTextContent('certain to ± 8 × 10⁻⁹ eV');
    await user.click(number);
    expect(await screen.findByText('Copied -47.7954617 eV')).toBeInTheDocument();
  });
});
