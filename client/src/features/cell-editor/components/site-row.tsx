import { ArrowDown, ArrowUp, Copy, Ellipsis, Trash2 } from 'lucide-react';
import type { JSX, KeyboardEvent } from 'react';

import type { CellSite } from '#common/schemas/cell';
import { Menu, MenuItem, MenuSeparator } from '#client/components/menu.tsx';
import { CellInput } from '#client/features/cell-editor/components/cell-input.tsx';
import {
  messageFor,
  type ProblemsByField,
} from '#client/features/cell-editor/model/field-problems.ts';

export interface SiteActions {
  onChange: (index: number, change: Partial<CellSite>) => void;
  onDuplicate: (index: number) => void;
  onRemove: (index: number) => void;
  onMove: (index: number, by: -1 | 1) => void;
}

export const siteColumns: readonly {
  key: keyof CellSite;
  head: string;
  title: string;
  width: string;
}[] = [
  { key: 'label', head: 'label', title: 'Name of the site', width: 'min-w-16' },
  {
    key: 'element',
    head: 'element',
    title: 'Chemical symbol',
    width: 'min-w-16 [&::-webkit-calendar-picker-indicator]:hidden!',
  },
  {
    key: 'charge',
    head: 'charge',
    title: 'Charge of the ion, elementary charges',
    width: 'min-w-14',
  },
  { key: 'x', head: 'x', title: 'Fractional coordinate along a', width: 'min-w-18' },
  { key: 'y', head: 'y', title: 'Fractional coordinate along b', width: 'min-w-18' },
  { key: 'z', head: 'z', title: 'Fractional coordinate along c', width: 'min-w-18' },
  {
    key: 'occupancy',
    head: 'occ.',
    title: 'Fraction of the places that hold this ion',
    width: 'min-w-14',
  },
];

interface SiteRowProps extends SiteActions {
  site: CellSite;
  index: number;
  count: number;
  problems: ProblemsByField;
  isReadOnly: boolean;
  isPicked: boolean;
  elementListId: string;
}

function RowMenu({
  site,
  index,
  count,
  ...actions
}: Pick<
  SiteRowProps,
  'site' | 'index' | 'count' | 'onDuplicate' | 'onMove' | 'onRemove'
>): JSX.Element {
  const icon = 'size-4';
  return (
    <Menu
      label={`Site ${site.label}: duplicate, move, remove`}
      trigger={<Ellipsis aria-hidden className="size-4" />}
      triggerClassName="grid size-8 place-items-center rounded-control text-soft hover:bg-wash hover:text-ink"
    >
      <MenuItem
        icon={<Copy aria-hidden className={icon} />}
        onSelect={() => actions.onDuplicate(index)}
      >
        Duplicate
      </MenuItem>
      <MenuItem
        icon={<ArrowUp aria-hidden className={icon} />}
        disabled={index === 0}
        onSelect={() => actions.onMove(index, -1)}
      >
        Move up
      </MenuItem>
      <MenuItem
        icon={<ArrowDown aria-hidden className={icon} />}
        disabled={index === count - 1}
        onSelect={() => actions.onMove(index, 1)}
      >
        Move down
      </MenuItem>
      <MenuSeparator />
      <MenuItem
        icon={<Trash2 aria-hidden className={icon} />}
        isDangerous
        onSelect={() => actions.onRemove(index)}
      >
        Remove
      </MenuItem>
    </Menu>
  );
}

function Errors({ props, colSpan }: { props: SiteRowProps; colSpan: number }): JSX.Element | null {
  const { problems, index, site } = props;
  const found = ['', ...siteColumns.map(({ key }) => `.${key}`)].flatMap((tail) => {
    const field = `sites.${index}${tail}`;
    const message = messageFor(problems, field);
    return message === null ? [] : [{ field, message, name: tail.slice(1) }];
  });
  if (found.length === 0) {
    return null;
  }
  return (
    <tr>
      <td colSpan={colSpan} className="pb-1.5 text-small text-fails">
        {found.map(({ field, message, name }) => (
          <p key={field} id={`error-${field}`}>
            <strong className="font-medium">
              {site.label} {name}:
            </strong>{' '}
            {message}
          </p>
        ))}
      </td>
    </tr>
  );
}

/** Return goes down a column, Alt with an arrow moves the row. */
function useSiteKeys(props: SiteRowProps): (event: KeyboardEvent<HTMLInputElement>) => void {
  return (event) => {
    if (event.altKey && (event.key === 'ArrowUp' || event.key === 'ArrowDown')) {
      event.preventDefault();
      props.onMove(props.index, event.key === 'ArrowUp' ? -1 : 1);
      return;
    }
    if (event.key === 'Enter') {
      event.preventDefault();
      const name = event.currentTarget.name.replace(/^sites\.\d+/, `sites.${props.index + 1}`);
      event.currentTarget
        .closest('table')
        ?.querySelector<HTMLInputElement>(`[name="${name}"]`)
        ?.focus();
    }
  };
}

/** One row of the site table; what is wrong with it stands below. */
export function SiteRow(props: SiteRowProps): JSX.Element {
  const { site, index, problems, isReadOnly } = props;
  const onKeyDown = useSiteKeys(props);
  return (
    <>
      <tr className={props.isPicked ? 'bg-raised shadow-[inset_3px_0_0_var(--ink)]' : undefined}>
        {siteColumns.map(({ key, title, width }) => {
          const field = `sites.${index}.${key}`;
          return (
            <td key={key} className="py-0.5 pr-1 first:pl-1.5">
              <CellInput
                name={field}
                label={`${site.label} ${key}`}
                title={title}
                value={site[key]}
                readOnly={isReadOnly}
                list={key === 'element' && !isReadOnly ? props.elementListId : undefined}
                errorId={messageFor(problems, field) === null ? null : `error-${field}`}
                onText={(text) => props.onChange(index, { [key]: text })}
                onKeyDown={onKeyDown}
                className={width}
              />
            </td>
          );
        })}
        {!isReadOnly && (
          <td className="w-8">
            <RowMenu {...props} />
          </td>
        )}
      </tr>
      <Errors props={props} colSpan={siteColumns.length + 1} />
    </>
  );
}
