import {
  Menu as MenuRoot,
  MenuButton,
  MenuItem as RootItem,
  MenuItems,
  MenuSeparator as RootSeparator,
} from '@headlessui/react';
import { Check } from 'lucide-react';
import type { ComponentProps, JSX, ReactNode } from 'react';
import { Link } from 'react-router-dom';

import { classNames } from '#client/lib/class-names.ts';

interface MenuProps {
  /** What is in the button; with an icon only, give `label` too. */
  trigger: ReactNode;
  label?: string;
  triggerClassName?: string;
  align?: 'start' | 'end';
  children: ReactNode;
}

/** A button that opens a list of commands. */
export function Menu({
  trigger,
  label,
  triggerClassName,
  align = 'end',
  children,
}: MenuProps): JSX.Element {
  return (
    <MenuRoot>
      <MenuButton aria-label={label} title={label} className={triggerClassName}>
        {trigger}
      </MenuButton>
      <MenuItems
        modal={false}
        anchor={{ to: `bottom ${align}`, gap: 6, padding: 8 }}
        className="z-50 min-w-52 rounded-control border border-line bg-raised p-1 shadow-sheet focus:outline-none"
      >
        {children}
      </MenuItems>
    </MenuRoot>
  );
}

const itemLook =
  'flex w-full items-center gap-2.5 rounded-control px-2.5 py-1.5 text-left data-disabled:opacity-55 data-focus:bg-wash';

interface MenuItemProps {
  icon?: ReactNode;
  children: ReactNode;
  onSelect: () => void;
  disabled?: boolean;
  isDangerous?: boolean;
  /** Marked with a tick: the choice that holds now. */
  isCurrent?: boolean;
}

/** A command of a {@link Menu}. */
export function MenuItem({
  icon,
  children,
  onSelect,
  disabled = false,
  isDangerous = false,
  isCurrent = false,
}: MenuItemProps): JSX.Element {
  return (
    <RootItem disabled={disabled}>
      <button
        type="button"
        onClick={onSelect}
        className={classNames(itemLook, isDangerous && 'text-fails')}
      >
        {icon}
        <span className="grow">{children}</span>
        {isCurrent && <Check aria-label="chosen" className="size-4" />}
      </button>
    </RootItem>
  );
}

interface MenuLinkProps {
  icon?: ReactNode;
  children: ReactNode;
  to: ComponentProps<typeof Link>['to'];
  isCurrent?: boolean;
}

/** An entry of a {@link Menu} that leads somewhere. */
export function MenuLink({ icon, children, to, isCurrent = false }: MenuLinkProps): JSX.Element {
  return (
    <RootItem>
      <Link
        to={to}
        aria-current={isCurrent ? 'true' : undefined}
        className={classNames(itemLook, isCurrent && 'font-medium')}
      >
        {icon}
        {children}
      </Link>
    </RootItem>
  );
}

/** A line between groups of a {@link Menu}. */
export function MenuSeparator(): JSX.Element {
  return <RootSeparator className="my-1 h-px bg-line" />;
}

/** Text in a {@link Menu} that is no command: who one is, say. */
export function MenuNote({ children }: { children: ReactNode }): JSX.Element {
  return <div className="px-2.5 py-1.5 text-small text-soft">{children}</div>;
}
