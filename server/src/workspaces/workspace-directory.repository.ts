import { Inject, Injectable } from '@nestjs/common';
import { and, eq } from 'drizzle-orm';

import { DATABASE, type Database } from '#server/database/database';
import { AccessDirectory, type Membership } from '#server/http/access-directory';
import type { ContextUser } from '#server/http/request-context';
import { users } from '#server/users/user.table';

import { memberships } from './membership.table.js';
import { workspaces } from './workspace.table.js';

/** Answers the access guard from the tables. */
@Injectable()
export class WorkspaceDirectoryRepository extends AccessDirectory {
  constructor(@Inject(DATABASE) private readonly db: Database) {
    super();
  }

  async findUser(userId: string): Promise<ContextUser | null> {
    const [row] = await this.db
      .select({ id: users.id, name: users.name, email: users.email })
      .from(users)
      .where(eq(users.id, userId));
    return row ?? null;
  }

  async findMembership(userId: string, workspaceSlug: string): Promise<Membership | null> {
    const [row] = await this.db
      .select({
        role: memberships.role,
        workspace: {
          id: workspaces.id,
          slug: workspaces.slug,
          name: workspaces.name,
          requiresSecondPerson: workspaces.requiresSecondPerson,
          readersMayComment: workspaces.readersMayComment,
        },
      })
      .from(memberships)
      .innerJoin(workspaces, eq(workspaces.id, memberships.workspaceId))
      .where(and(eq(memberships.userId, userId), eq(workspaces.slug, workspaceSlug)));
    return row ?? null;
  }
}
