import { useQuery } from '@tanstack/react-query';
import { useMemo, useState, type JSX } from 'react';
import { useSearchParams } from 'react-router-dom';

import type { OwnDataValue } from '#common/schemas/data-values';
import { Button } from '#client/components/button.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { DataFilters } from '#client/features/data-values/components/data-filters.tsx';
import { DataList } from '#client/features/data-values/components/data-list.tsx';
import {
  AddValueDialog,
  EditValueDialog,
} from '#client/features/data-values/components/value-dialogs.tsx';
import {
  dataRows,
  rowsInView,
  type DataRow,
} from '#client/features/data-values/model/data-rows.ts';
import {
  readDataView,
  writeDataView,
  type DataView,
} from '#client/features/data-values/model/data-view.ts';
import { dataValuesQuery } from '#client/lib/data-overrides.ts';

interface DataValuesProps {
  workspace: string;
  mayEdit: boolean;
}

function useDataView(): [DataView, (change: Partial<DataView>) => void] {
  const [params, setParams] = useSearchParams();
  const view = useMemo(() => readDataView(params), [params]);
  const change = (part: Partial<DataView>): void =>
    setParams(writeDataView({ ...view, page: 1, ...part }), { replace: true });
  return [view, change];
}

function LoadedValues({
  workspace,
  mayEdit,
  own,
}: DataValuesProps & { own: readonly OwnDataValue[] }): JSX.Element {
  const [view, change] = useDataView();
  const [edited, setEdited] = useState<DataRow | 'new' | null>(null);
  const rows = useMemo(() => dataRows(own), [own]);
  const shown = useMemo(() => rowsInView(rows, view), [rows, view]);
  const close = (): void => setEdited(null);
  return (
    <>
      <DataFilters view={view} ownCount={own.length} onChange={change} />
      <div className="mt-4 flex min-h-8 items-center justify-between gap-3">
        <p role="status" className="text-small text-soft">
          {shown.length === rows.length
            ? `${rows.length} values`
            : `${shown.length} of ${rows.length} values`}
        </p>
        {mayEdit && (
          <Button size="small" onClick={() => setEdited('new')}>
            Add a value
          </Button>
        )}
      </div>
      <DataList
        rows={shown}
        view={view}
        onEdit={mayEdit ? setEdited : null}
        onClear={() => change({ search: '', kind: 'all', isOwnOnly: false })}
      />
      {edited === 'new' && <AddValueDialog workspace={workspace} own={own} onClose={close} />}
      {edited !== null && edited !== 'new' && (
        <EditValueDialog workspace={workspace} row={edited} onClose={close} />
      )}
    </>
  );
}

/** Every tabulated value the computations use, and the workspace's own in their place. */
export function DataValues(props: DataValuesProps): JSX.Element {
  const { data, error, isPending, refetch } = useQuery(dataValuesQuery(props.workspace));
  if (isPending) {
    return <SkeletonLines lines={8} label="Loading the values" />;
  }
  if (data === undefined) {
    return <ErrorState error={error} onRetry={() => void refetch()} />;
  }
  return <LoadedValues {...props} own={data.items} />;
}
