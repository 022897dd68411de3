import { CircleAlert } from 'lucide-react';
import { useMemo, type JSX, type ReactNode } from 'react';

import { formatOperation } from '#common/physics/symmetry-operation';
import type { FieldProblem } from '#common/errors/problem';
import { useQueryClient } from '@tanstack/react-query';
import { spaceGroupQuery } from '#client/features/cell-editor/api/space-groups.ts';
import { LatticeFields } from '#client/features/cell-editor/components/lattice-fields.tsx';
import { LiveNumbers } from '#client/features/cell-editor/components/live-numbers.tsx';
import { MethodSettings } from '#client/features/cell-editor/components/method-settings.tsx';
import { ParameterTable } from '#client/features/cell-editor/components/parameter-table.tsx';
import { SiteTableEditor } from '#client/features/cell-editor/components/site-table-editor.tsx';
import { SymmetryFields } from '#client/features/cell-editor/components/symmetry-fields.tsx';
import type { ResolvedState } from '#client/features/cell-editor/hooks/use-resolved-cell.ts';
import * as edits from '#client/features/cell-editor/model/cell-edits.ts';
import type { EditorContent } from '#client/features/cell-editor/model/editor-history.ts';
import {
  problemsByField,
  problemsOutside,
} from '#client/features/cell-editor/model/field-problems.ts';

/** One change to the content; `field` merges the letters of a word into one step of undo. */
type Edit = (change: Partial<EditorContent>, field: string | null) => void;

interface CellFormProps {
  content: EditorContent;
  resolved: ResolvedState;
  /** What the server found when it evaluated the cell. */
  serverProblems: readonly FieldProblem[];
  pickedLabels: ReadonlySet<string>;
  /** The energy of the cell, beside what else follows from it. */
  energy?: ReactNode;
  /** Null shows the cell without letting it be changed. */
  edit: Edit | null;
}

const formFields =
  /^(lattice(\.\w+)?|symmetry|sites(\.\d+(\.(label|element|charge|x|y|z|occupancy))?)?|parameters\.\d+\.(name|expression))$/;

function OtherProblems({ problems }: { problems: readonly FieldProblem[] }): JSX.Element | null {
  return problems.length === 0 ? null : (
    <ul role="alert" className="grid gap-1 border-l-3 border-fails bg-wash px-3 py-2 text-small">
      {problems.map((problem) => (
        <li key={`${problem.field}${problem.code}`} className="flex gap-2">
          <CircleAlert aria-hidden className="mt-0.5 size-4 shrink-0 text-fails" />
          {problem.message}
        </li>
      ))}
    </ul>
  );
}

const ignore: Edit = () => undefined;

/** What a cell is made of, each field with its own errors beside it. */
export function CellForm(props: CellFormProps): JSX.Element {
  const { content, resolved, serverProblems } = props;
  const { cell } = content;
  const { setting } = resolved;
  const isReadOnly = props.edit === null;
  const edit = props.edit ?? ignore;
  const client = useQueryClient();
  const problems = useMemo(
    () => problemsByField(resolved.problems, serverProblems),
    [resolved.problems, serverProblems],
  );
  const setCell = (next: typeof cell, field: string | null): void => edit({ cell: next }, field);
  const currentOperations = (): string[] => {
    const { symmetry } = cell;
    return symmetry.kind === 'operations'
      ? symmetry.operations
      : (client
          .getQueryData(spaceGroupQuery(symmetry.hallNumber).queryKey)
          ?.operations.map(formatOperation) ?? ['x, y, z']);
  };
  return (
    <div className="grid grid-cols-1 gap-6">
      <LiveNumbers cell={resolved.shown} isStale={resolved.cell === null} energy={props.energy} />
      <OtherProblems problems={problemsOutside(problems, (field) => formFields.test(field))} />
      <SymmetryFields
        symmetry={cell.symmetry}
        setting={setting}
        currentOperations={currentOperations}
        problems={problems}
        isReadOnly={isReadOnly}
        onSetting={(next) => setCell(edits.setSpaceGroup(cell, next), null)}
        onOperations={(operations) => setCell(edits.setOperations(cell, operations), 'symmetry')}
        onUseGroup={() => setCell({ ...cell, symmetry: { kind: 'setting', hallNumber: 1 } }, null)}
      />
      <LatticeFields
        lattice={cell.lattice}
        setting={setting}
        problems={problems}
        isReadOnly={isReadOnly}
        onChange={(name, text) =>
          setCell(edits.setLatticeParameter(cell, name, text, setting), `lattice.${name}`)
        }
      />
      <SiteTableEditor
        sites={cell.sites}
        problems={problems}
        pickedLabels={props.pickedLabels}
        isReadOnly={isReadOnly}
        onAdd={() => setCell(edits.addSite(cell), null)}
        onChange={(index, change) =>
          setCell(
            edits.setSite(cell, index, change),
            `sites.${index}.${Object.keys(change).join()}`,
          )
        }
        onDuplicate={(index) => setCell(edits.duplicateSite(cell, index), null)}
        onRemove={(index) => setCell(edits.removeSite(cell, index), null)}
        onMove={(index, by) => setCell(edits.moveSite(cell, index, by), null)}
      />
      <ParameterTable
        parameters={cell.parameters}
        values={resolved.cell?.parameters ?? {}}
        problems={problems}
        isReadOnly={isReadOnly}
        onAdd={() => setCell(edits.addParameter(cell), null)}
        onChange={(index, change) =>
          setCell(
            edits.setParameter(cell, index, change),
            `parameters.${index}.${Object.keys(change).join()}`,
          )
        }
        onRemove={(index) => setCell(edits.removeParameter(cell, index), null)}
      />
      <MethodSettings
        method={content.method}
        isReadOnly={isReadOnly}
        onChange={(method) => edit({ method }, null)}
      />
    </div>
  );
}
