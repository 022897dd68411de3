import { useState, type JSX } from 'react';

import { cellLimits, type CellSymmetry } from '#common/schemas/cell';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';
import { Segmented } from '#client/components/segmented.tsx';
import { TextAreaField } from '#client/components/text-area-field.tsx';
import { SpaceGroupField } from '#client/features/cell-editor/components/space-group-field.tsx';
import {
  messageFor,
  type ProblemsByField,
} from '#client/features/cell-editor/model/field-problems.ts';

interface SymmetryFieldsProps {
  symmetry: CellSymmetry;
  setting: SpaceGroupSetting | null;
  /** The operations now in force, as text: a start when they are to be typed. */
  currentOperations: () => string[];
  problems: ProblemsByField;
  isReadOnly: boolean;
  onSetting: (setting: SpaceGroupSetting) => void;
  onOperations: (operations: string[]) => void;
  onUseGroup: () => void;
}

const linesOf = (text: string): string[] =>
  text
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');

/** The lines as typed, so that an empty one may be opened; only those with text count. */
function OperationsField({
  operations,
  error,
  isReadOnly,
  onChange,
}: {
  operations: readonly string[];
  error: string | null;
  isReadOnly: boolean;
  onChange: (operations: string[]) => void;
}): JSX.Element {
  const [typed, setTyped] = useState(operations.join('\n'));
  const isCurrent = linesOf(typed).join('\n') === operations.join('\n');
  const text = isCurrent ? typed : operations.join('\n');
  return (
    <TextAreaField
      className="grow basis-80"
      label="Symmetry operations, one a line"
      rows={Math.min(8, operations.length + 1)}
      value={text}
      readOnly={isReadOnly}
      spellCheck={false}
      error={error}
      hint={`Such as -x, y+1/2, z. At most ${cellLimits.operations}; the identity x, y, z among them.`}
      onChange={(event) => {
        setTyped(event.target.value);
        const lines = linesOf(event.target.value);
        onChange(lines.length === 0 ? ['x, y, z'] : lines);
      }}
    />
  );
}

/** Symmetry: a tabulated space group, or its operations one a line. */
export function SymmetryFields(props: SymmetryFieldsProps): JSX.Element {
  const { symmetry, problems, isReadOnly } = props;
  const error = messageFor(problems, 'symmetry');
  return (
    <div className="flex flex-wrap items-start gap-x-3 gap-y-2">
      {symmetry.kind === 'setting' ? (
        <SpaceGroupField
          setting={props.setting}
          error={error}
          isReadOnly={isReadOnly}
          onChange={props.onSetting}
        />
      ) : (
        <OperationsField
          operations={symmetry.operations}
          error={error}
          isReadOnly={isReadOnly}
          onChange={props.onOperations}
        />
      )}
      {!isReadOnly && (
        <Segmented
          label="How the symmetry is given"
          className="h-9 items-stretch self-start [&>*]:flex [&>*]:items-center sm:mt-[22px]"
          value={symmetry.kind}
          options={[
            { value: 'setting', label: 'space group' },
            { value: 'operations', label: 'operations' },
          ]}
          onChange={(kind) =>
            kind === 'operations'
              ? props.onOperations(props.currentOperations())
              : props.onUseGroup()
          }
        />
      )}
    </div>
  );
}
