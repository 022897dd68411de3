import {
  Combobox,
  ComboboxButton,
  ComboboxInput,
  ComboboxOption,
  ComboboxOptions,
} from '@headlessui/react';
import { useQuery } from '@tanstack/react-query';
import { ChevronDown } from 'lucide-react';
import { useId, useMemo, useState, type JSX } from 'react';

import type { SpaceGroupSetting } from '#common/schemas/symmetry';
import { SpaceGroupText } from '#client/components/chem/space-group-text.tsx';
import { FieldFrame, describedBy, fieldLook } from '#client/components/field-frame.tsx';
import { spaceGroupsQuery } from '#client/features/cell-editor/api/space-groups.ts';
import {
  searchSpaceGroups,
  settingWords,
} from '#client/features/cell-editor/model/space-group-search.ts';
import { classNames } from '#client/lib/class-names.ts';
import { messageOf } from '#client/lib/api-error.ts';

const listed = 60;

function describe(setting: SpaceGroupSetting | null): string {
  if (setting === null) {
    return '';
  }
  const words = settingWords(setting);
  return `${setting.symbol} · ${setting.number}${words === '' ? '' : ` · ${words}`}`;
}

function Option({ setting }: { setting: SpaceGroupSetting }): JSX.Element {
  const words = settingWords(setting);
  return (
    <ComboboxOption
      value={setting}
      className="flex cursor-pointer items-baseline gap-3 rounded-control px-2.5 py-1.5 data-focus:bg-wash data-selected:font-medium"
    >
      <span className="w-9 shrink-0 text-right text-small text-soft">{setting.number}</span>
      <SpaceGroupText symbol={setting.symbol} />
      <span className="ml-auto text-small whitespace-nowrap text-soft">
        {words === '' ? setting.crystalSystem : words}
      </span>
    </ComboboxOption>
  );
}

function Options({ typed }: { typed: string }): JSX.Element {
  const { data, error } = useQuery(spaceGroupsQuery);
  const found = useMemo(() => searchSpaceGroups(data ?? [], typed), [data, typed]);
  return (
    <ComboboxOptions
      anchor={{ to: 'bottom start', gap: 4 }}
      className="z-50 max-h-80! w-(--input-width) min-w-72 overflow-y-auto rounded-control border border-line bg-raised p-1 shadow-sheet empty:hidden"
    >
      {error !== null && <p className="px-2.5 py-1.5 text-fails">{messageOf(error)}</p>}
      {error === null && data === undefined && (
        <p className="px-2.5 py-1.5 text-soft">Fetching the tables …</p>
      )}
      {data !== undefined && found.length === 0 && (
        <p className="px-2.5 py-1.5 text-soft">
          No group fits. Type a number from 1 to 230 or a symbol such as F m -3 m.
        </p>
      )}
      {found.slice(0, listed).map((setting) => (
        <Option key={setting.hallNumber} setting={setting} />
      ))}
      {found.length > listed && (
        <p className="px-2.5 py-1.5 text-small text-soft">
          {found.length - listed} more: type on to narrow them down.
        </p>
      )}
    </ComboboxOptions>
  );
}

interface SpaceGroupFieldProps {
  setting: SpaceGroupSetting | null;
  error: string | null;
  isReadOnly: boolean;
  onChange: (setting: SpaceGroupSetting) => void;
}

/** The space group, found by its number or its symbol. */
export function SpaceGroupField(props: SpaceGroupFieldProps): JSX.Element {
  const { setting, error } = props;
  const id = useId();
  const [typed, setTyped] = useState('');
  return (
    <Combobox
      value={setting}
      by="hallNumber"
      immediate
      disabled={props.isReadOnly}
      onChange={(next: SpaceGroupSetting | null) => next !== null && props.onChange(next)}
      onClose={() => setTyped('')}
    >
      <FieldFrame id={id} label="Space group" error={error} className="grow">
        <span className="relative block">
          <ComboboxInput
            id={id}
            autoComplete="off"
            spellCheck={false}
            placeholder="Number or symbol"
            aria-invalid={error === null ? undefined : true}
            aria-describedby={describedBy(id, error, null)}
            displayValue={describe}
            onFocus={(event) => event.target.select()}
            onChange={(event) => setTyped(event.target.value)}
            className={classNames(fieldLook, 'h-9 pr-9 pl-3')}
          />
          <ComboboxButton
            aria-label="Show space groups"
            className="absolute inset-y-0 right-0 px-2.5"
          >
            <ChevronDown aria-hidden className="size-4 text-soft" />
          </ComboboxButton>
        </span>
      </FieldFrame>
      <Options typed={typed} />
    </Combobox>
  );
}
