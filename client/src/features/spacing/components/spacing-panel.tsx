import { useMemo, useState, type JSX } from 'react';

import type { DataOverrides } from '#common/chemistry/sourced';
import {
  energeticsOf,
  type EnergeticsAccount,
} from '#common/physics/energetics/energetics-account';
import { pairPotentialsOf } from '#common/physics/energetics/pair-potentials';
import {
  shownSpacingsA,
  spacingCurve,
  spacingPoint,
} from '#common/physics/energetics/spacing-curve';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EnergeticModel } from '#common/schemas/energetics';
import type { EvaluationResult } from '#common/schemas/evaluation';
import { EV_IN_KJ_PER_MOL } from '#common/units/constants';
import { formatFixed, formatSigned } from '#common/units/format';
import { EmptyState } from '#client/components/empty-state.tsx';
import { MeasuredFields } from '#client/features/spacing/components/measured-fields.tsx';
import {
  ModelChooser,
  type ChangeModel,
} from '#client/features/spacing/components/model-chooser.tsx';
import { SpacingFigures } from '#client/features/spacing/components/spacing-figures.tsx';
import { SpacingPlot } from '#client/features/spacing/components/spacing-plot.tsx';
import { useEnergyScale, type EnergyScale } from '#client/lib/energy-unit.ts';
import { useWidth } from '#client/lib/use-width.ts';

interface SpacingPanelProps {
  cell: ResolvedCell;
  result: EvaluationResult;
  model: EnergeticModel;
  overrides: DataOverrides;
  /** One step that can be undone; null where the model may only be read. */
  onModel: ChangeModel | null;
}

function Readout({
  point,
  scale,
}: {
  point: ReturnType<typeof spacingPoint>;
  scale: EnergyScale;
}): JSX.Element {
  const energy = (ev: number) =>
    formatSigned((ev * EV_IN_KJ_PER_MOL) / scale.kjPerMol, scale.decimals);
  const parts = [
    { name: 'attraction', text: energy(point.attractionEv), mark: 'bg-bind' },
    { name: 'repulsion', text: energy(point.repulsionEv), mark: 'bg-oppose' },
    { name: 'net', text: energy(point.netEv), mark: 'bg-ink' },
    { name: 'force, eV/Å', text: formatSigned(point.forceEvPerA, 3), mark: null },
  ];
  return (
    <dl className="grid grid-cols-2 gap-x-5 gap-y-1 sm:grid-cols-4">
      {parts.map(({ name, text, mark }) => (
        <div key={name}>
          <dt className="flex items-center gap-1.5 text-small text-soft">
            {mark !== null && <span aria-hidden className={`h-0.5 w-4 ${mark}`} />}
            {name}
          </dt>
          <dd className="font-medium tabular-nums">{text}</dd>
        </div>
      ))}
    </dl>
  );
}

function Curve({ account }: { account: EnergeticsAccount }): JSX.Element {
  const scale = useEnergyScale();
  const [frame, width] = useWidth(560);
  const { laws, spacingA, equilibriumSpacingA } = account;
  const shown = useMemo(() => shownSpacingsA(laws, spacingA), [laws, spacingA]);
  const curves = useMemo(
    () => laws.map((law) => spacingCurve(law, spacingA, shown)),
    [laws, spacingA, shown],
  );
  const [moved, setMoved] = useState<number | null>(null);
  const rest = equilibriumSpacingA!;
  const at = Math.min(shown.toA, Math.max(shown.fromA, moved ?? rest.low));
  const point = spacingPoint(laws[0]!, spacingA, at);
  return (
    <section aria-labelledby="spacing-curve" className="mt-6">
      <h2 id="spacing-curve" className="mb-2 font-bold">
        Energy against spacing{' '}
        <span className="text-small font-normal text-soft">{scale.unit} per formula unit</span>
      </h2>
      <div ref={frame}>
        {/* Chromium may keep the old clip after a change of width: drawn anew instead. */}
        <SpacingPlot
          key={width}
          width={width}
          curves={curves}
          marker={point}
          equilibriumSpacingA={rest}
          givenSpacingA={spacingA}
          scale={scale}
          onMove={setMoved}
        />
      </div>
      <label className="mt-1 mb-3 flex items-center gap-3 text-small">
        <span className="text-soft">Spacing</span>
        <input
          type="range"
          min={shown.fromA}
          max={shown.toA}
          step={0.005}
          value={at}
          onChange={(event) => setMoved(Number(event.target.value))}
          className="min-w-0 flex-1 accent-ink"
        />
        <output className="w-20 text-right font-medium tabular-nums">{formatFixed(at, 3)} Å</output>
      </label>
      <Readout point={point} scale={scale} />
      <p className="mt-3 text-small text-soft">
        All distances scale with the shortest cation–anion distance r. Green: at rest; dashed: the
        cell as it is
        {laws.length > 1
          ? '; shaded: between the ends of the range, readings at its first end'
          : ''}
        . The force is −dE/dr: positive pushes the ions apart.
      </p>
    </section>
  );
}

/** What keeps the ions apart, and what follows: lattice energy, spacing at rest, stiffness. */
export function SpacingPanel(props: SpacingPanelProps): JSX.Element {
  const { cell, result, model, overrides, onModel } = props;
  const scale = useEnergyScale();
  const account = useMemo(
    () => energeticsOf(cell, result, model, overrides),
    [cell, result, model, overrides],
  );
  const fitted = useMemo(() => {
    const found = pairPotentialsOf(cell, result, model, overrides);
    return 'pairs' in found ? found.pairs : [];
  }, [cell, result, model, overrides]);
  return (
    <>
      {account.reason === null ? (
        <SpacingFigures account={account} model={model} scale={scale} />
      ) : (
        <EmptyState title="No lattice energy">{account.reason}</EmptyState>
      )}
      <ModelChooser
        model={model}
        onModel={onModel}
        speciesKeys={result.species.map(({ key }) => key)}
        fitted={fitted}
      />
      {[...account.warnings, ...(account.derivation === null ? [] : [account.derivation])].map(
        (text) => (
          <p key={text} className="mt-3 text-small text-soft">
            {text}
          </p>
        ),
      )}
      {account.reason === null && <Curve account={account} />}
      <MeasuredFields model={model} onModel={onModel} />
    </>
  );
}
