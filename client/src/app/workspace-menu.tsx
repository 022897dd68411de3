import { Check, ChevronDown, ScrollText, Settings, Table, Users } from 'lucide-react';
import type { JSX } from 'react';

import { Menu, MenuLink, MenuNote, MenuSeparator } from '#client/components/menu.tsx';
import { useCan, useCurrentUser, useOptionalWorkspace } from '#client/lib/session.ts';

/** Which workspace this is, its pages, and the way to the others. */
export function WorkspaceMenu(): JSX.Element | null {
  const { memberships } = useCurrentUser();
  const workspace = useOptionalWorkspace();
  const can = useCan();
  if (memberships.length === 0) {
    return null;
  }
  const base = `/w/${workspace?.workspaceSlug ?? ''}`;
  return (
    <div className="min-w-0 border-l border-line pl-2 md:pl-3">
      <Menu
        align="start"
        triggerClassName="flex h-9 max-w-full items-center gap-1.5 rounded-control px-2 text-soft hover:bg-wash hover:text-ink"
        trigger={
          <>
            <span className="truncate">{workspace?.workspaceName ?? 'Workspaces'}</span>
            <ChevronDown aria-hidden className="size-4 shrink-0" />
          </>
        }
      >
        {memberships.map((one) => (
          <MenuLink
            key={one.workspaceId}
            to={`/w/${one.workspaceSlug}`}
            isCurrent={one.workspaceId === workspace?.workspaceId}
            icon={
              <Check
                aria-hidden
                className={`size-4 ${one.workspaceId === workspace?.workspaceId ? '' : 'invisible'}`}
              />
            }
          >
            {one.workspaceName}
          </MenuLink>
        ))}
        {workspace !== null && (
          <>
            <MenuSeparator />
            <MenuNote>You are {workspace.role} here</MenuNote>
            <MenuLink to={`${base}/members`} icon={<Users aria-hidden className="size-4" />}>
              Members
            </MenuLink>
            <MenuLink to={`${base}/data`} icon={<Table aria-hidden className="size-4" />}>
              Data values
            </MenuLink>
            {can('workspace.update') && (
              <MenuLink to={`${base}/settings`} icon={<Settings aria-hidden className="size-4" />}>
                Settings
              </MenuLink>
            )}
            {can('audit.read') && (
              <MenuLink to={`${base}/audit`} icon={<ScrollText aria-hidden className="size-4" />}>
                Audit log
              </MenuLink>
            )}
          </>
        )}
      </Menu>
    </div>
  );
}
