import type { JSX } from 'react';

import { dataKinds } from '#common/chemistry/data-key';
import { Segmented } from '#client/components/segmented.tsx';
import { SelectField } from '#client/components/select-field.tsx';
import { TextField } from '#client/components/text-field.tsx';
import type { DataView } from '#client/features/data-values/model/data-view.ts';

const kindOptions = [
  { value: 'all' as const, label: 'All quantities' },
  ...dataKinds.map(({ kind, name }) => ({ value: kind, label: name })),
];

/** Search, quantity, and whether only the workspace's own are shown. */
export function DataFilters({
  view,
  ownCount,
  onChange,
}: {
  view: DataView;
  ownCount: number;
  onChange: (change: Partial<DataView>) => void;
}): JSX.Element {
  return (
    <div className="mt-5 grid gap-3 sm:grid-cols-[minmax(0,1fr)_15rem] lg:grid-cols-[minmax(0,1fr)_17rem_auto] lg:items-end">
      <TextField
        label="Find"
        type="search"
        placeholder="Na, oxygen, Fe+2, from memory …"
        value={view.search}
        onChange={(event) => onChange({ search: event.target.value })}
      />
      <SelectField
        label="Quantity"
        options={kindOptions}
        value={view.kind}
        onChange={(kind) => onChange({ kind })}
      />
      <Segmented
        label="Which values"
        className="h-9 w-max items-center [&>*]:flex [&>*]:h-full [&>*]:items-center"
        options={[
          { value: 'all', label: 'All' },
          { value: 'ours', label: `Ours (${ownCount})` },
        ]}
        value={view.isOwnOnly ? 'ours' : 'all'}
        onChange={(shown) => onChange({ isOwnOnly: shown === 'ours' })}
      />
    </div>
  );
}
