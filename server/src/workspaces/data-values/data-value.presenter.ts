import type { OwnDataValue } from '#common/schemas/data-values';
import { initialsOf } from '#server/users/person.presenter';

import type { OwnValueRow } from './data-values.repository.js';

export const presentOwnValue = (row: OwnValueRow): OwnDataValue => ({
  key: row.key,
  value: row.value,
  note: row.note,
  setBy: { id: row.setById, name: row.setByName, initials: initialsOf(row.setByName) },
  setAt: row.setAt.toISOString(),
});
