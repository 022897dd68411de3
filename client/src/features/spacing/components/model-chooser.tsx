import type { JSX } from 'react';

import {
  energeticsLimits,
  type EnergeticModel,
  type ExponentChoice,
  type PairPotential,
  type RepulsionModel,
} from '#common/schemas/energetics';
import { Segmented } from '#client/components/segmented.tsx';
import { SelectField } from '#client/components/select-field.tsx';
import { PairTable } from '#client/features/spacing/components/pair-table.tsx';
import { RangeField } from '#client/features/spacing/components/range-field.tsx';
import {
  repulsionOfKind,
  repulsionWords,
} from '#client/features/spacing/model/repulsion-choices.ts';

export type ChangeModel = (model: EnergeticModel, field: string | null) => void;

interface ModelChooserProps {
  model: EnergeticModel;
  onModel: ChangeModel | null;
  speciesKeys: readonly string[];
  /** Pairs the present model stands for, to start a table from. */
  fitted: readonly PairPotential[];
}

const exponentOptions = [
  {
    value: 'ions',
    label: 'from the ions',
    title: 'Mean of Pauling’s exponents over the ion kinds.',
  },
  { value: 'typed', label: 'typed', title: 'A number or a range of your own.' },
  {
    value: 'bulk_modulus',
    label: 'from bulk modulus',
    title: 'Fitted to the measured bulk modulus: n = 1 + 9 K V/A.',
  },
] as const;

function exponentOf(from: ExponentChoice['from']): ExponentChoice {
  return from === 'typed' ? { from, exponent: { low: 8, high: 8 } } : { from };
}

const exponentLimits = { name: 'the exponent', ...energeticsLimits.exponent, unit: '' };
const hardnessLimits = { name: 'the hardness', ...energeticsLimits.hardnessA, unit: 'Å' };

function ExponentFields({
  exponent,
  onExponent,
}: {
  exponent: ExponentChoice;
  onExponent: ((exponent: ExponentChoice, field: string | null) => void) | null;
}): JSX.Element {
  return (
    <>
      <div>
        <p className="mb-1 text-small font-medium">Exponent n</p>
        <Segmented
          label="Where the exponent comes from"
          options={exponentOptions}
          value={exponent.from}
          onChange={(from) => onExponent?.(exponentOf(from), null)}
          disabled={onExponent === null}
          className="h-9 items-center"
        />
      </div>
      {exponent.from === 'typed' && (
        <RangeField
          label="n, or a range"
          limits={exponentLimits}
          value={exponent.exponent}
          onChange={
            onExponent &&
            ((range) => range && onExponent({ from: 'typed', exponent: range }, 'spacing.exponent'))
          }
          className="w-36"
        />
      )}
    </>
  );
}

const hugginsOptions = [
  {
    value: 'fitted',
    label: 'fitted',
    title: 'Usual prefactor; the hardness puts the cell at rest.',
  },
  { value: 'typed', label: 'typed', title: 'Your hardness; the prefactor puts the cell at rest.' },
] as const;

function HugginsFields({
  hardnessA,
  onHardness,
}: {
  hardnessA: number | null;
  onHardness: ((hardnessA: number | null, field: string | null) => void) | null;
}): JSX.Element {
  return (
    <>
      <div>
        <p className="mb-1 text-small font-medium">Hardness ρ</p>
        <Segmented
          label="Where the hardness comes from"
          options={hugginsOptions}
          value={hardnessA === null ? 'fitted' : 'typed'}
          onChange={(from) => onHardness?.(from === 'fitted' ? null : 0.33, null)}
          disabled={onHardness === null}
          className="h-9 items-center"
        />
      </div>
      {hardnessA !== null && (
        <RangeField
          label="ρ"
          limits={hardnessLimits}
          value={{ low: hardnessA, high: hardnessA }}
          onChange={onHardness && ((range) => range && onHardness(range.low, 'spacing.hardness'))}
          className="w-36"
        />
      )}
    </>
  );
}

/** Which law keeps the ions apart, and its numbers. */
export function ModelChooser({
  model,
  onModel,
  speciesKeys,
  fitted,
}: ModelChooserProps): JSX.Element {
  const { repulsion } = model;
  const change =
    onModel &&
    ((next: RepulsionModel, field: string | null) => onModel({ ...model, repulsion: next }, field));
  const kinds = Object.keys(repulsionWords) as RepulsionModel['kind'][];
  return (
    <div className="flex flex-wrap items-start gap-x-5 gap-y-3">
      <SelectField
        label="Repulsion"
        options={kinds.map((value) => ({ value, ...repulsionWords[value] }))}
        value={repulsion.kind}
        onChange={(kind) => change?.(repulsionOfKind(kind, speciesKeys, fitted), null)}
        disabled={change === null}
        className="w-56"
      />
      {repulsion.kind === 'born_lande' && (
        <ExponentFields
          exponent={repulsion.exponent}
          onExponent={change && ((exponent, field) => change({ ...repulsion, exponent }, field))}
        />
      )}
      {repulsion.kind === 'born_mayer' && (
        <RangeField
          label="Hardness ρ, or a range"
          limits={hardnessLimits}
          value={repulsion.hardnessA}
          onChange={
            change &&
            ((range) => range && change({ ...repulsion, hardnessA: range }, 'spacing.hardness'))
          }
          className="w-44"
        />
      )}
      {repulsion.kind === 'born_mayer_huggins' && (
        <HugginsFields
          hardnessA={repulsion.hardnessA}
          onHardness={change && ((hardnessA, field) => change({ ...repulsion, hardnessA }, field))}
        />
      )}
      {repulsion.kind === 'pair_table' && (
        <PairTable table={repulsion} speciesKeys={speciesKeys} onTable={change} />
      )}
    </div>
  );
}
