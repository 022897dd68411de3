import { useMemo, useState, type JSX } from 'react';

import type { DataOverrides } from '#common/chemistry/sourced';
import { energeticsOf } from '#common/physics/energetics/energetics-account';
import {
  formationComposition,
  type FormationComposition,
} from '#common/physics/energetics/formation-composition';
import { formationLedger } from '#common/physics/energetics/formation-ledger';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EnergeticModel, FormationChoices } from '#common/schemas/energetics';
import type { EvaluationResult } from '#common/schemas/evaluation';
import { Button } from '#client/components/button.tsx';
import { EmptyState } from '#client/components/empty-state.tsx';
import { AccountNotes } from '#client/features/formation/components/account-notes.tsx';
import { FormationControls } from '#client/features/formation/components/formation-controls.tsx';
import { FormationFigures } from '#client/features/formation/components/formation-figures.tsx';
import { FormationTable } from '#client/features/formation/components/formation-table.tsx';
import type { LineActions } from '#client/features/formation/components/ledger-row.tsx';
import { LevelDiagram } from '#client/features/formation/components/level-diagram.tsx';
import type { EnergyScale } from '#client/lib/energy-unit.ts';
import {
  restoreValue,
  setExcluded,
  solveFor,
  typeValue,
} from '#client/features/formation/model/formation-choices.ts';

interface FormationPanelProps {
  cell: ResolvedCell;
  result: EvaluationResult;
  model: EnergeticModel;
  overrides: DataOverrides;
  scale: EnergyScale;
  /** One step that can be undone; null where the account may only be read. */
  onModel: ((model: EnergeticModel, field: string | null) => void) | null;
  onCell: () => void;
}

interface AccountProps extends Omit<FormationPanelProps, 'onCell'> {
  composition: FormationComposition;
}

type Change = (formation: FormationChoices, field: string | null) => void;

function actionsOf(choices: FormationChoices, change: Change): LineActions {
  return {
    type: (key, value) => change(typeValue(choices, key, value), `formation.${key}`),
    restore: (key) => change(restoreValue(choices, key), null),
    exclude: (key, isExcluded) => change(setExcluded(choices, key, isExcluded), null),
    solveFor: (key) => change(solveFor(choices, key), null),
  };
}

function Account({ composition, ...props }: AccountProps): JSX.Element {
  const { cell, result, model, overrides, scale, onModel } = props;
  const [lit, setLit] = useState<string | null>(null);
  const account = useMemo(
    () => energeticsOf(cell, result, model, overrides),
    [cell, result, model, overrides],
  );
  const ledger = useMemo(
    () => formationLedger(composition, model, account, overrides),
    [composition, model, account, overrides],
  );
  const choices = model.formation;
  const change: Change | null =
    onModel && ((formation, field) => onModel({ ...model, formation }, field));
  const actions = change && actionsOf(choices, change);
  const onLattice =
    change && ((lattice: FormationChoices['lattice']) => change({ ...choices, lattice }, null));
  return (
    <>
      <FormationFigures ledger={ledger} scale={scale} onSolveFor={actions?.solveFor ?? null} />
      <FormationControls
        ledger={ledger}
        choices={choices}
        onSolveFor={actions?.solveFor ?? null}
        onLattice={onLattice}
      />
      <FormationTable ledger={ledger} scale={scale} actions={actions} lit={lit} onLight={setLit} />
      <LevelDiagram ledger={ledger} scale={scale} lit={lit} onLight={setLit} />
      <AccountNotes ledger={ledger} scale={scale} />
    </>
  );
}

/** The Born–Haber account of a cell: from the elements to the crystal, line by line. */
export function FormationPanel({ onCell, ...props }: FormationPanelProps): JSX.Element {
  const { cell } = props;
  const composition = useMemo(() => formationComposition(cell), [cell]);
  return 'reason' in composition ? (
    <EmptyState
      title="No account of formation"
      action={<Button onClick={onCell}>To the cell</Button>}
    >
      {composition.reason}
    </EmptyState>
  ) : (
    <Account composition={composition} {...props} />
  );
}
