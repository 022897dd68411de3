import type { JSX } from 'react';

import type { FormationLedger } from '#common/physics/energetics/formation-ledger';
import type { FormationChoices } from '#common/schemas/energetics';
import { EnergyUnitSwitch } from '#client/components/energy-unit-switch.tsx';
import { Segmented } from '#client/components/segmented.tsx';
import { SelectField } from '#client/components/select-field.tsx';
import { capitalised } from '#client/features/formation/model/words.ts';

const latticeOptions = [
  { value: 'model', label: 'model', title: 'The lattice energy of the repulsion model.' },
  {
    value: 'measured',
    label: 'measured',
    title: 'The measured lattice enthalpy that is kept with the model.',
  },
] as const;

/** Which line closes the account, and where the lattice line comes from. */
export function FormationControls({
  ledger,
  choices,
  onSolveFor,
  onLattice,
}: {
  ledger: FormationLedger;
  choices: FormationChoices;
  /** Null where the account may only be read. */
  onSolveFor: ((key: string) => void) | null;
  onLattice: ((lattice: FormationChoices['lattice']) => void) | null;
}): JSX.Element {
  const solvable = [ledger.formation, ...ledger.lines.filter(({ mayType }) => mayType)];
  const isLatticeSolved = ledger.solveFor === 'lattice';
  return (
    <div className="mb-4 flex flex-wrap items-end gap-x-5 gap-y-3">
      <SelectField
        label="Solve for"
        className="w-52 max-w-full"
        options={solvable.map(({ key, name }) => ({
          value: key,
          // Solved, the lattice line is always an enthalpy, whatever it is now.
          label: key === 'lattice' ? 'Lattice enthalpy' : capitalised(name),
        }))}
        value={ledger.solveFor}
        onChange={(key) => onSolveFor?.(key)}
        disabled={onSolveFor === null}
      />
      <div>
        <p className="mb-1 text-small font-medium">Lattice line from</p>
        <Segmented
          label="Lattice line from"
          options={latticeOptions}
          value={choices.lattice}
          onChange={(lattice) => onLattice?.(lattice)}
          disabled={onLattice === null || isLatticeSolved}
          className="h-9 items-center"
        />
      </div>
      <div className="ml-auto">
        <EnergyUnitSwitch />
      </div>
    </div>
  );
}
