import type { Member } from '#common/schemas/workspace';
import { initialsOf } from '#server/users/person.presenter';

import type { MemberRow } from './members.repository.js';

export const presentMember = (row: MemberRow): Member => ({
  userId: row.userId,
  name: row.name,
  initials: initialsOf(row.name),
  email: row.email,
  role: row.role,
  joinedAt: row.joinedAt.toISOString(),
});
