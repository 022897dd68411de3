import { Plus } from 'lucide-react';
import { useId, type JSX } from 'react';

import { elements } from '#common/chemistry/elements';
import { cellLimits, type CellSite } from '#common/schemas/cell';
import { Button } from '#client/components/button.tsx';
import { FieldErrors } from '#client/features/cell-editor/components/field-errors.tsx';
import {
  SiteRow,
  siteColumns,
  type SiteActions,
} from '#client/features/cell-editor/components/site-row.tsx';
import {
  messageFor,
  type ProblemsByField,
} from '#client/features/cell-editor/model/field-problems.ts';

interface SiteTableEditorProps extends SiteActions {
  sites: readonly CellSite[];
  problems: ProblemsByField;
  pickedLabels: ReadonlySet<string>;
  isReadOnly: boolean;
  onAdd: () => void;
}

function ElementList({ id }: { id: string }): JSX.Element {
  return (
    <datalist id={id}>
      {elements.map((element) => (
        <option key={element.symbol} value={element.symbol}>
          {element.name}
        </option>
      ))}
    </datalist>
  );
}

/** The sites of the asymmetric unit; every field takes a number or an expression. */
export function SiteTableEditor(props: SiteTableEditorProps): JSX.Element {
  const { sites, problems, pickedLabels, isReadOnly, onAdd, ...actions } = props;
  const listId = useId();
  return (
    <section aria-labelledby={`${listId}-title`}>
      <h2 id={`${listId}-title`} className="mb-1 font-bold">
        Sites
      </h2>
      {!isReadOnly && <ElementList id={listId} />}
      <div className="relative -mx-1.5 overflow-x-auto px-1.5 pb-1">
        <table className="w-full border-collapse">
          <thead>
            <tr className="text-small text-soft">
              {siteColumns.map((column) => (
                <th
                  key={column.key}
                  scope="col"
                  title={column.title}
                  className="pb-1 text-left font-normal whitespace-nowrap first:pl-1.5"
                >
                  {column.head}
                </th>
              ))}
              {!isReadOnly && (
                <th scope="col">
                  <span className="sr-only">actions</span>
                </th>
              )}
            </tr>
          </thead>
          <tbody>
            {sites.map((site, index) => (
              <SiteRow
                key={index}
                site={site}
                index={index}
                count={sites.length}
                problems={problems}
                isReadOnly={isReadOnly}
                isPicked={pickedLabels.has(site.label)}
                elementListId={listId}
                {...actions}
              />
            ))}
          </tbody>
        </table>
      </div>
      <FieldErrors id="sites-error" message={messageFor(problems, 'sites')} />
      {sites.length === 0 && messageFor(problems, 'sites') === null && (
        <p className="text-soft">No site yet.</p>
      )}
      {!isReadOnly && (
        <Button
          size="small"
          className="mt-1.5"
          disabled={sites.length >= cellLimits.definedSites}
          onClick={onAdd}
        >
          <Plus aria-hidden className="size-4" /> Add a site
        </Button>
      )}
    </section>
  );
}
