import { Plus, Trash2 } from 'lucide-react';
import type { JSX } from 'react';

import { cellLimits, type CellParameter } from '#common/schemas/cell';
import { formatTidy } from '#common/units/format';
import { Button, IconButton } from '#client/components/button.tsx';
import { CellInput } from '#client/features/cell-editor/components/cell-input.tsx';
import { FieldErrors } from '#client/features/cell-editor/components/field-errors.tsx';
import {
  messageFor,
  type ProblemsByField,
} from '#client/features/cell-editor/model/field-problems.ts';

interface ParameterTableProps {
  parameters: readonly CellParameter[];
  values: Readonly<Record<string, number>>;
  problems: ProblemsByField;
  isReadOnly: boolean;
  onChange: (index: number, change: Partial<CellParameter>) => void;
  onAdd: () => void;
  onRemove: (index: number) => void;
}

function Row({
  parameter,
  index,
  ...props
}: ParameterTableProps & { parameter: CellParameter; index: number }): JSX.Element {
  const nameError = messageFor(props.problems, `parameters.${index}.name`);
  const valueError = messageFor(props.problems, `parameters.${index}.expression`);
  const id = `parameter-${index}`;
  const value = props.values[parameter.name];
  return (
    <li>
      <div className="flex items-center gap-2">
        <CellInput
          label={`Name of parameter ${index + 1}`}
          value={parameter.name}
          readOnly={props.isReadOnly}
          errorId={nameError === null ? null : `${id}-name`}
          onText={(name) => props.onChange(index, { name })}
          className="w-20!"
        />
        <span aria-hidden>=</span>
        <CellInput
          label={`Value of ${parameter.name}`}
          value={parameter.expression}
          readOnly={props.isReadOnly}
          errorId={valueError === null ? null : `${id}-value`}
          onText={(expression) => props.onChange(index, { expression })}
          className="grow"
        />
        <span className="w-24 text-right text-small text-soft">
          {value === undefined ? '' : formatTidy(value, 6)}
        </span>
        {!props.isReadOnly && (
          <IconButton
            label={`Remove parameter ${parameter.name}`}
            icon={<Trash2 aria-hidden className="size-4" />}
            onClick={() => props.onRemove(index)}
          />
        )}
      </div>
      <FieldErrors id={`${id}-name`} message={nameError} />
      <FieldErrors id={`${id}-value`} message={valueError} />
    </li>
  );
}

/** Named numbers that coordinates, edges and other parameters may use. */
export function ParameterTable(props: ParameterTableProps): JSX.Element | null {
  const { parameters, isReadOnly } = props;
  if (isReadOnly && parameters.length === 0) {
    return null;
  }
  return (
    <section aria-labelledby="parameters-title">
      <h2 id="parameters-title" className="font-bold">
        Parameters
      </h2>
      <p className="mb-2 text-small text-soft">
        A name for a number, to be used in any field: u, then 1/2 - u for a coordinate.
      </p>
      <ul className="grid gap-1.5">
        {parameters.map((parameter, index) => (
          <Row key={index} {...props} parameter={parameter} index={index} />
        ))}
      </ul>
      {!isReadOnly && (
        <Button
          size="small"
          className="mt-2"
          disabled={parameters.length >= cellLimits.parameters}
          onClick={props.onAdd}
        >
          <Plus aria-hidden className="size-4" /> Add a parameter
        </Button>
      )}
    </section>
  );
}
