import type { JSX } from 'react';

import type { EnergeticModel, MeasuredValues } from '#common/schemas/energetics';
import { TextField } from '#client/components/text-field.tsx';
import type { ChangeModel } from '#client/features/spacing/components/model-chooser.tsx';
import { RangeField } from '#client/features/spacing/components/range-field.tsx';

const energyLimits = { name: 'the lattice energy', low: -100_000, high: 0, unit: 'kJ/mol' };
const stiffnessLimits = { name: 'the bulk modulus', low: 0.01, high: 2_000, unit: 'GPa' };

/** What somebody measured, to fit to and to compare with. */
export function MeasuredFields({
  model,
  onModel,
}: {
  model: EnergeticModel;
  onModel: ChangeModel | null;
}): JSX.Element {
  const { measured } = model;
  const put =
    onModel &&
    ((change: Partial<MeasuredValues>, field: string) =>
      onModel({ ...model, measured: { ...measured, ...change } }, `measured.${field}`));
  return (
    <fieldset className="mt-5 flex flex-wrap items-start gap-x-5 gap-y-3 border-t border-line pt-4">
      <legend className="sr-only">Measured values</legend>
      <RangeField
        label="Measured lattice energy"
        limits={energyLimits}
        value={measured.latticeEnergyKjPerMol}
        isOptional
        hint="Negative: gas ions to crystal."
        onChange={put && ((latticeEnergyKjPerMol) => put({ latticeEnergyKjPerMol }, 'lattice'))}
        className="w-52"
      />
      <RangeField
        label="Measured bulk modulus"
        limits={stiffnessLimits}
        value={measured.bulkModulusGpa}
        isOptional
        onChange={put && ((bulkModulusGpa) => put({ bulkModulusGpa }, 'modulus'))}
        className="w-44"
      />
      <TextField
        label="Their source"
        value={measured.source}
        maxLength={200}
        readOnly={put === null}
        onChange={(event) => put?.({ source: event.target.value }, 'source')}
        className="min-w-44 flex-1"
      />
    </fieldset>
  );
}
