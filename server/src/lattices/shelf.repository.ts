import { Inject, Injectable } from '@nestjs/common';
import {
  and,
  asc,
  count,
  desc,
  eq,
  isNotNull,
  isNull,
  or,
  sql,
  type AnyColumn,
  type SQL,
} from 'drizzle-orm';

import type { ShelfQuery } from '#common/schemas/lattice';
import { DATABASE, type Database } from '#server/database/database';
import { users } from '#server/users/user.table';

import { lattices } from './lattice.table.js';
import { shelfColumns, type ShelfRow } from './lattices.repository.js';
import { searchWords } from './search-words.js';

const inLowerCase = (column: AnyColumn): SQL => sql`lower(${column})`;

const sortKeys: Record<ShelfQuery['sort'], SQL | AnyColumn> = {
  name: inLowerCase(lattices.name),
  formula: inLowerCase(lattices.formula),
  spaceGroup: lattices.spaceGroupNumber,
  madelung: lattices.madelungReduced,
  energy: lattices.energyEvPerFormulaUnit,
  state: lattices.state,
  author: inLowerCase(users.name),
  updated: lattices.updatedAt,
};

/** Whether a word stands in the name, the formula, a tag, the space group or the author's name. */
function has(word: string): SQL | undefined {
  const stands = (text: SQL | AnyColumn) => sql`position(${word} in lower(${text})) > 0`;
  return or(
    stands(lattices.name),
    stands(lattices.formula),
    stands(sql`array_to_string(${lattices.tags}, ' ')`),
    stands(sql`replace(${lattices.spaceGroupSymbol}, ' ', '')`),
    sql`${lattices.spaceGroupNumber}::text = ${word}`,
    stands(users.name),
  );
}

@Injectable()
export class ShelfRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** A page of the workspace's lattices, and how many fit the question. */
  async page(workspaceId: string, query: ShelfQuery): Promise<{ rows: ShelfRow[]; total: number }> {
    const { page, pageSize, search, sort, order, state, deleted } = query;
    const fits = and(
      eq(lattices.workspaceId, workspaceId),
      deleted ? isNotNull(lattices.deletedAt) : isNull(lattices.deletedAt),
      state === undefined ? undefined : eq(lattices.state, state),
      ...searchWords(search).map(has),
    );
    const direction = order === 'asc' ? asc : desc;
    const rows = await this.db
      .select(shelfColumns)
      .from(lattices)
      .innerJoin(users, eq(users.id, lattices.authorId))
      .where(fits)
      .orderBy(sql`${direction(sortKeys[sort])} nulls last`, direction(lattices.id))
      .offset((page - 1) * pageSize)
      .limit(pageSize);
    const [counted] = await this.db
      .select({ total: count() })
      .from(lattices)
      .innerJoin(users, eq(users.id, lattices.authorId))
      .where(fits);
    return { rows, total: counted?.total ?? 0 };
  }
}
