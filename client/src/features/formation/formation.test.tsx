import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState, type JSX } from 'react';
import { describe, expect, it, vi } from 'vitest';

import { noOverrides } from '#common/chemistry/sourced';
import type { ResolvedCell, SiteComponent } from '#common/physics/resolved-cell';
import {
  defaultEnergeticModel,
  type EnergeticModel,
  type FormationChoices,
} from '#common/schemas/energetics';
import { FormationPanel } from '#client/features/formation/components/formation-panel.tsx';
import { energyScales } from '#client/lib/energy-unit.ts';
import { resultOf } from '#client/testing/lattice-factories.ts';

const siteOf = (component: SiteComponent, at: number): ResolvedCell['sites'][number] => ({
  definitionIndex: at,
  label: `${component.element}1`,
  copy: 0,
  fractional: [at / 2, at / 2, at / 2],
  chargeE: component.chargeE,
  element: component.element,
  components: [component],
  speciesKey: `${component.element}${component.chargeE > 0 ? '+' : ''}${component.chargeE}`,
});

/** Sodium chloride in the caesium-chloride arrangement: small enough for a test to follow. */
const cellOf = (sodiumE = 1): ResolvedCell => ({
  lattice: { aA: 3.3, bA: 3.3, cA: 3.3, alphaDeg: 90, betaDeg: 90, gammaDeg: 90 },
  vectorsA: [3.3, 0, 0, 0, 3.3, 0, 0, 0, 3.3],
  volumeA3: 35.937,
  sites: [
    siteOf({ element: 'Na', chargeE: sodiumE, occupancy: 1 }, 0),
    siteOf({ element: 'Cl', chargeE: -sodiumE, occupancy: 1 }, 1),
  ],
  operationCount: 1,
  hasPolarAxis: false,
  parameters: {},
});

const modelOf = (formation: Partial<FormationChoices>): EnergeticModel => ({
  ...defaultEnergeticModel,
  formation: { ...defaultEnergeticModel.formation, ...formation },
});

/** Common practice, no source: 109 + 497 + ½·242 − 364 − 777 = −414. */
const figures = {
  'atomisation:Na': 109,
  'ionisation:Na:1': 497,
  'atomisation:Cl': 121,
  'affinity:Cl:1': -364,
  lattice: -777,
};

function Held({
  formation = { typedKjPerMol: figures },
  onModel,
  sodiumE = 1,
}: {
  formation?: Partial<FormationChoices>;
  onModel?: (model: EnergeticModel) => void;
  sodiumE?: number;
}): JSX.Element {
  const [model, setModel] = useState(modelOf(formation));
  return (
    <FormationPanel
      cell={cellOf(sodiumE)}
      result={resultOf({ formula: 'NaCl' })}
      model={model}
      overrides={noOverrides}
      scale={energyScales['kJ mol⁻¹']}
      onModel={
        onModel === undefined
          ? null
          : (next) => {
              setModel(next);
              onModel(next);
            }
      }
      onCell={() => undefined}
    />
  );
}

const result = (): HTMLElement => screen.getByRole('region', { name: 'Result of the account' });
const row = (name: string): HTMLElement =>
  within(screen.getByRole('table', { name: 'Formation account' })).getByRole('row', {
    name: new RegExp(name, 'i'),
  });

describe('the formation account', () => {
  it('shows every line, which way it pulls, and the sum in large figures', () => {
    render(<Held onModel={vi.fn()} />);
    expect(result()).toHaveTextContent('−414.0');
    expect(row('ionisation of sodium')).toHaveTextContent('+497.0');
    expect(row('atomisation of chlorine')).toHaveTextContent('½ D of Cl₂');
    const senses = [
      'atomisation of sodium',
      'electron affinity of chlorine',
      'lattice enthalpy',
    ].map((name) => row(name).querySelector('[data-sense]')?.getAttribute('data-sense'));
    expect(senses).toEqual(['opposes', 'binds', 'binds']);
    expect(screen.getByRole('img', { name: /elements 0\.0.*crystal −414\.0/ })).toBeInTheDocument();
  });

  it('takes a value typed in its place and gives the old one back', async () => {
    const onModel = vi.fn<(model: EnergeticModel) => void>();
    const user = userEvent.setup();
    render(<Held formation={{ typedKjPerMol: { lattice: -787.2 } }} onModel={onModel} />);
    const field = screen.getByLabelText('first electron affinity of chlorine, kJ mol⁻¹');
    const before = result().textContent;
    await user.click(field);
    await user.keyboard('−350{Enter}');
    expect(onModel.mock.lastCall?.[0].formation.typedKjPerMol['affinity:Cl:1']).toBe(-350);
    expect(row('electron affinity of chlorine')).toHaveTextContent('yours');
    expect(result().textContent).not.toBe(before);
    await user.click(
      screen.getByRole('button', { name: 'Restore the first electron affinity of chlorine' }),
    );
    expect(onModel.mock.lastCall?.[0].formation.typedKjPerMol).toEqual({ lattice: -787.2 });
    expect(result().textContent).toBe(before);
  });

  it('keeps what is no number out and says what to type', async () => {
    const onModel = vi.fn();
    const user = userEvent.setup();
    render(<Held onModel={onModel} />);
    const field = screen.getByLabelText('atomisation of sodium, kJ mol⁻¹');
    await user.click(field);
    await user.keyboard('about 100{Enter}');
    expect(field).toHaveAttribute('aria-invalid', 'true');
    expect(field).toHaveAccessibleDescription(/Type one number in kJ mol⁻¹/);
    expect(onModel).not.toHaveBeenCalled();
    await user.keyboard('{Escape}');
    expect(field).toHaveValue('109');
    expect(field).not.toHaveAttribute('aria-invalid');
  });

  it('cautions where a sign does not fit the direction of the line', async () => {
    const user = userEvent.setup();
    render(<Held onModel={vi.fn()} />);
    await user.click(screen.getByLabelText('lattice enthalpy, kJ mol⁻¹'));
    await user.keyboard('777{Enter}');
    expect(row('lattice enthalpy')).toHaveTextContent('the value is negative');
  });

  it('leaves a line out and says that the account is partial', async () => {
    const onModel = vi.fn<(model: EnergeticModel) => void>();
    const user = userEvent.setup();
    render(<Held onModel={onModel} />);
    await user.click(screen.getByLabelText('Count the first electron affinity of chlorine'));
    expect(onModel.mock.lastCall?.[0].formation.excluded).toEqual(['affinity:Cl:1']);
    expect(result()).toHaveTextContent('−50.0');
    expect(result()).toHaveTextContent('not a whole account');
  });

  it('solves for another line', async () => {
    const onModel = vi.fn<(model: EnergeticModel) => void>();
    const user = userEvent.setup();
    const { lattice: _, ...rest } = figures;
    render(<Held formation={{ typedKjPerMol: { ...rest, formation: -414 } }} onModel={onModel} />);
    await user.click(screen.getByRole('button', { name: /^Solve for: / }));
    await user.click(screen.getByRole('option', { name: 'Lattice enthalpy' }));
    expect(onModel.mock.lastCall?.[0].formation.solveFor).toBe('lattice');
    expect(result()).toHaveTextContent('−777.0');
  });

  it('tells the source of a value on focus', async () => {
    render(<Held formation={{ typedKjPerMol: { lattice: -787.2 } }} onModel={vi.fn()} />);
    screen.getByRole('button', { name: 'table: source of first ionisation of sodium' }).focus();
    expect(await screen.findByRole('tooltip')).toHaveTextContent('Energy at 0 K.');
  });

  it('says what must be given where the account is open', async () => {
    const onModel = vi.fn<(model: EnergeticModel) => void>();
    const user = userEvent.setup();
    render(<Held formation={{ lattice: 'measured' }} onModel={onModel} />);
    const notice = screen.getByRole('status');
    expect(notice).toHaveTextContent('The account does not close yet');
    expect(notice).toHaveTextContent('No measured lattice enthalpy is given');
    expect(screen.queryByRole('img', { name: /^Levels/ })).not.toBeInTheDocument();
    await user.click(
      within(notice).getByRole('button', { name: 'Solve for the lattice enthalpy' }),
    );
    expect(onModel.mock.lastCall?.[0].formation.solveFor).toBe('lattice');
    expect(result()).toHaveTextContent(/−787\.\d/);
  });

  it('may only be read where the model may only be read', () => {
    render(<Held />);
    expect(screen.queryByRole('textbox')).not.toBeInTheDocument();
    expect(screen.getByLabelText('Count the lattice enthalpy')).toBeDisabled();
    expect(screen.getByRole('button', { name: /^Solve for: / })).toBeDisabled();
    expect(result()).toHaveTextContent('−414.0');
  });

  it('has no account for charges that are no whole numbers', () => {
    render(<Held sodiumE={0.9} onModel={vi.fn()} />);
    expect(screen.getByText(/Na1: Na carries a charge of 0.9/)).toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'To the cell' })).toBeInTheDocument();
  });
});
