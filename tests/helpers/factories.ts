import type { Role } from '#common/schemas/auth';
import type { Database } from '#server/database/database';
import { PasswordHasher } from '#server/users/password-hasher';
import { users, type UserRow } from '#server/users/user.table';
import { memberships } from '#server/workspaces/membership.table';
import { workspaces, type WorkspaceRow } from '#server/workspaces/workspace.table';

/** The password of every account the factories make. */
export const testPassword = 'vermilion kettle orbit';

// Hashed once: the cost of argon2id is the point of it.
const passwordHash = new PasswordHasher().hash(testPassword);

let made = 0;

/** An account with {@link testPassword}. */
export async function makeUser(
  db: Database,
  given: { name?: string; email?: string } = {},
): Promise<UserRow> {
  made += 1;
  const [row] = await db
    .insert(users)
    .values({
      name: given.name ?? `Person ${made}`,
      email: given.email ?? `person-${made}@kiln.example`,
      passwordHash: await passwordHash,
    })
    .returning();
  return row!;
}

/** A workspace with nobody in it. */
export async function makeWorkspace(
  db: Database,
  given: Partial<typeof workspaces.$inferInsert> = {},
): Promise<WorkspaceRow> {
  made += 1;
  const [row] = await db
    .insert(workspaces)
    .values({ name: `Workspace ${made}`, slug: `workspace-${made}`, ...given })
    .returning();
  return row!;
}

/** Gives the person a place in the workspace. */
export async function join(
  db: Database,
  workspace: { id: string },
  user: { id: string },
  role: Role,
): Promise<void> {
  await db.insert(memberships).values({ workspaceId: workspace.id, userId: user.id, role });
}

/** A new person with this role in the workspace. */
export async function makeMember(
  db: Database,
  workspace: { id: string },
  role: Role,
  given: { name?: string; email?: string } = {},
): Promise<UserRow> {
  const user = await makeUser(db, given);
  await join(db, workspace, user, role);
  return user;
}
