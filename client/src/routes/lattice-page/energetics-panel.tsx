import type { JSX } from 'react';

import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { CellDefinition, EvaluationMethod } from '#common/schemas/cell';
import type { EnergeticModel } from '#common/schemas/energetics';
import type { EvaluationResult } from '#common/schemas/evaluation';
import { ChecksPanel } from '#client/features/checks/components/checks-panel.tsx';
import { FormationPanel } from '#client/features/formation/components/formation-panel.tsx';
import type {
  LatticeAddress,
  SectionKey,
} from '#client/features/lattices/hooks/use-lattice-address.ts';
import { SpacingPanel } from '#client/features/spacing/components/spacing-panel.tsx';
import { useDataOverrides } from '#client/lib/data-overrides.ts';
import { useEnergyScale } from '#client/lib/energy-unit.ts';

/** What the sections about energetics work from, beside the cell in numbers and its evaluation. */
export interface EnergeticsInput {
  /** Slug of the workspace; null for a link holder, who belongs to none. */
  readonly workspace: string | null;
  readonly content: {
    readonly cell: CellDefinition;
    readonly method: EvaluationMethod;
    readonly model: EnergeticModel;
  };
  /** Changes the model as one step that can be undone; null where it may only be read. */
  readonly onModel: ((model: EnergeticModel, field: string | null) => void) | null;
}

export interface EnergeticsPanelProps {
  readonly section: SectionKey;
  readonly cell: ResolvedCell;
  readonly result: EvaluationResult;
  readonly energetics: EnergeticsInput;
  readonly address: LatticeAddress;
  readonly update: (change: Partial<LatticeAddress>) => void;
}

function Spacing({ cell, result, energetics }: EnergeticsPanelProps): JSX.Element {
  const overrides = useDataOverrides(energetics.workspace);
  const { content, onModel } = energetics;
  return <SpacingPanel {...{ cell, result, overrides, onModel }} model={content.model} />;
}

function Formation({ cell, result, energetics, update }: EnergeticsPanelProps): JSX.Element {
  const overrides = useDataOverrides(energetics.workspace);
  const scale = useEnergyScale();
  const { content, onModel } = energetics;
  return (
    <FormationPanel
      {...{ cell, result, overrides, scale, onModel }}
      model={content.model}
      onCell={() => update({ section: 'cell' })}
    />
  );
}

/** The checks; they need no evaluation to say something. */
export function Checks({
  cell,
  result,
  problem,
  energetics,
}: {
  cell: ResolvedCell;
  result: EvaluationResult | null;
  problem: string | null;
  energetics: EnergeticsInput;
}): JSX.Element {
  const overrides = useDataOverrides(energetics.workspace);
  return <ChecksPanel {...{ cell, result, problem, overrides }} model={energetics.content.model} />;
}

/** The section's panel, or null when the section is not about energetics. */
export function energeticsPanel(props: EnergeticsPanelProps): JSX.Element | null {
  switch (props.section) {
    case 'spacing':
      return <Spacing {...props} />;
    case 'formation':
      return <Formation {...props} />;
    default:
      return null;
  }
}
