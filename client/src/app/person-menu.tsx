import { useMutation } from '@tanstack/react-query';
import { BookOpen, LogOut, Monitor, Moon, Sun, UserRound, Users } from 'lucide-react';
import type { JSX } from 'react';

import { done } from '#common/schemas/shared';
import { Menu, MenuItem, MenuLink, MenuNote, MenuSeparator } from '#client/components/menu.tsx';
import { PersonBadge } from '#client/components/person-badge.tsx';
import { useToast } from '#client/components/toast.tsx';
import { api } from '#client/lib/api-client.ts';
import { messageOf } from '#client/lib/api-error.ts';
import { useCurrentUser, useOptionalWorkspace } from '#client/lib/session.ts';
import { setThemePreference, useThemePreference } from '#client/lib/theme.ts';

const themes = [
  { value: 'light', label: 'Light', Icon: Sun },
  { value: 'dark', label: 'Dark', Icon: Moon },
  { value: 'system', label: 'As the system', Icon: Monitor },
] as const;

function useSignOut(): () => void {
  const show = useToast();
  const { mutate } = useMutation({
    mutationFn: () => api.delete('/session', { schema: done }),
    // A full load: nothing that one person saw stays in memory for the next one.
    onSuccess: () => window.location.assign('/sign-in'),
    onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
  });
  return mutate;
}

/** The person's own menu: account, theme, sign out. */
export function PersonMenu(): JSX.Element {
  const user = useCurrentUser();
  const workspace = useOptionalWorkspace();
  const preference = useThemePreference();
  const signOut = useSignOut();
  return (
    <Menu
      label={`${user.name}: account and theme`}
      triggerClassName="shrink-0 rounded-full"
      trigger={<PersonBadge name={user.name} initials={user.initials} tone="ink" />}
    >
      <MenuNote>
        <span className="block text-body font-medium text-ink">{user.name}</span>
        {user.email}
      </MenuNote>
      <MenuSeparator />
      <MenuLink to="/me" icon={<UserRound aria-hidden className="size-4" />}>
        Account
      </MenuLink>
      <MenuLink to="/methods" icon={<BookOpen aria-hidden className="size-4" />}>
        Methods
      </MenuLink>
      {workspace !== null && (
        <MenuLink
          to={`/w/${workspace.workspaceSlug}/members`}
          icon={<Users aria-hidden className="size-4" />}
        >
          Members
        </MenuLink>
      )}
      <MenuSeparator />
      <MenuNote>Theme</MenuNote>
      {themes.map(({ value, label, Icon }) => (
        <MenuItem
          key={value}
          icon={<Icon aria-hidden className="size-4" />}
          isCurrent={preference === value}
          onSelect={() => setThemePreference(value)}
        >
          {label}
        </MenuItem>
      ))}
      <MenuSeparator />
      <MenuItem icon={<LogOut aria-hidden className="size-4" />} onSelect={signOut}>
        Sign out
      </MenuItem>
    </Menu>
  );
}
