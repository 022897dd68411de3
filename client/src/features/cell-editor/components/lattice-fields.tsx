import { useId, type JSX } from 'react';

import { latticeConstraints } from '#common/physics/crystal-system';
import type { LatticeParameterName, LatticeParameterTexts } from '#common/schemas/cell';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';
import { CellInput } from '#client/features/cell-editor/components/cell-input.tsx';
import { FieldErrors } from '#client/features/cell-editor/components/field-errors.tsx';
import {
  messageFor,
  type ProblemsByField,
} from '#client/features/cell-editor/model/field-problems.ts';

interface LatticeFieldsProps {
  lattice: LatticeParameterTexts;
  setting: SpaceGroupSetting | null;
  problems: ProblemsByField;
  isReadOnly: boolean;
  onChange: (name: LatticeParameterName, text: string) => void;
}

const fields: readonly { name: LatticeParameterName; symbol: string; unit: string }[] = [
  { name: 'a', symbol: 'a', unit: 'Å' },
  { name: 'b', symbol: 'b', unit: 'Å' },
  { name: 'c', symbol: 'c', unit: 'Å' },
  { name: 'alpha', symbol: 'α', unit: '°' },
  { name: 'beta', symbol: 'β', unit: '°' },
  { name: 'gamma', symbol: 'γ', unit: '°' },
];
const symbolOf = (name: LatticeParameterName): string =>
  fields.find((field) => field.name === name)?.symbol ?? name;

/** Why a field can't be typed into: `= a, cubic`; null where it can. */
function tieOf(name: LatticeParameterName, setting: SpaceGroupSetting | null): string | null {
  const constraint = latticeConstraints(setting)[name];
  if (setting === null || constraint.kind === 'free') {
    return null;
  }
  const tie = constraint.kind === 'equals' ? symbolOf(constraint.other) : String(constraint.value);
  return `= ${tie}, ${setting.crystalSystem}`;
}

function Field({
  field,
  text,
  tie,
  error,
  isReadOnly,
  onText,
}: {
  field: (typeof fields)[number];
  text: string;
  tie: string | null;
  error: string | null;
  isReadOnly: boolean;
  onText: (text: string) => void;
}): JSX.Element {
  const id = useId();
  return (
    <div className="min-w-0">
      <div className="mb-1 flex items-baseline justify-between gap-2 text-small">
        <span aria-hidden className="font-medium italic">
          {field.symbol}
        </span>
        <span id={`${id}-tie`} className="truncate text-soft">
          {tie ?? field.unit}
        </span>
      </div>
      <CellInput
        label={`${field.symbol}, ${field.unit === 'Å' ? 'ångström' : 'degrees'}${tie === null ? '' : `, ${tie}`}`}
        value={text}
        readOnly={isReadOnly || tie !== null}
        title={tie === null ? undefined : `Follows from the crystal system: ${tie}.`}
        errorId={error === null ? null : `${id}-error`}
        onText={onText}
      />
      <FieldErrors id={`${id}-error`} message={error} />
    </div>
  );
}

/** Edges and angles; what the crystal system ties together is locked and says why. */
export function LatticeFields(props: LatticeFieldsProps): JSX.Element {
  const { lattice, setting, problems } = props;
  return (
    <fieldset>
      <legend className="mb-2 font-bold">Edges and angles</legend>
      <div className="grid grid-cols-2 gap-x-3 gap-y-2.5 sm:grid-cols-3">
        {fields.map((field) => (
          <Field
            key={field.name}
            field={field}
            text={lattice[field.name]}
            tie={tieOf(field.name, setting)}
            error={messageFor(problems, `lattice.${field.name}`)}
            isReadOnly={props.isReadOnly}
            onText={(text) => props.onChange(field.name, text)}
          />
        ))}
      </div>
      <FieldErrors id="lattice-error" message={messageFor(problems, 'lattice')} />
    </fieldset>
  );
}
