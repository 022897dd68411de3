import { Inject, Injectable } from '@nestjs/common';
import { and, asc, eq, getTableColumns, inArray, isNull, max } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';

import {
  DATABASE,
  type Database,
  type Executor,
  type Transaction,
} from '#server/database/database';
import { lattices } from '#server/lattices/lattice.table';
import { revisions } from '#server/lattices/revisions/revision.table';
import { users } from '#server/users/user.table';

import {
  annotationReplies,
  annotations,
  type AnnotationReplyRow,
  type AnnotationRow,
} from './annotation.table.js';

interface Person {
  readonly id: string;
  readonly name: string;
}

type ReplyRow = AnnotationReplyRow & { readonly author: Person };

/** A remark with who is behind it and what was answered. */
export type AnnotationFullRow = AnnotationRow & {
  readonly revisionNumber: number;
  readonly author: Person;
  readonly resolvedBy: Person | null;
  readonly replies: readonly ReplyRow[];
};

export type Resolution = Pick<AnnotationRow, 'resolvedAt' | 'resolvedById'>;

const authors = alias(users, 'authors');
const resolvers = alias(users, 'resolvers');

@Injectable()
export class AnnotationsRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** The next free number of a revision; the caller holds the lattice's lock. */
  async nextNumber(workspaceId: string, revisionId: string, tx: Transaction): Promise<number> {
    const [row] = await tx
      .select({ last: max(annotations.number) })
      .from(annotations)
      .where(and(eq(annotations.workspaceId, workspaceId), eq(annotations.revisionId, revisionId)));
    return (row?.last ?? 0) + 1;
  }

  async insert(annotation: typeof annotations.$inferInsert, tx: Transaction): Promise<string> {
    const [row] = await tx.insert(annotations).values(annotation).returning({ id: annotations.id });
    return row!.id;
  }

  async insertReply(reply: typeof annotationReplies.$inferInsert, tx: Transaction): Promise<void> {
    await tx.insert(annotationReplies).values(reply);
  }

  async setResolution(
    workspaceId: string,
    id: string,
    resolution: Resolution,
    tx: Transaction,
  ): Promise<void> {
    await tx
      .update(annotations)
      .set(resolution)
      .where(and(eq(annotations.workspaceId, workspaceId), eq(annotations.id, id)));
  }

  /** Remarks on one revision in the order of their numbers. */
  async list(workspaceId: string, revisionId: string): Promise<AnnotationFullRow[]> {
    const rows = await this.select(this.db)
      .where(and(eq(annotations.workspaceId, workspaceId), eq(annotations.revisionId, revisionId)))
      .orderBy(asc(annotations.number));
    return this.withReplies(rows, this.db);
  }

  /** A remark on any revision of the lattice. */
  async find(
    workspaceId: string,
    latticeId: string,
    id: string,
    executor: Executor = this.db,
  ): Promise<AnnotationFullRow | null> {
    const rows = await this.select(executor).where(
      and(
        eq(annotations.workspaceId, workspaceId),
        eq(revisions.latticeId, latticeId),
        eq(annotations.id, id),
        isNull(lattices.deletedAt),
      ),
    );
    const [row] = await this.withReplies(rows, executor);
    return row ?? null;
  }

  private select(executor: Executor) {
    return executor
      .select({
        ...getTableColumns(annotations),
        revisionNumber: revisions.number,
        author: { id: authors.id, name: authors.name },
        resolvedBy: { id: resolvers.id, name: resolvers.name },
      })
      .from(annotations)
      .innerJoin(revisions, eq(revisions.id, annotations.revisionId))
      .innerJoin(lattices, eq(lattices.id, revisions.latticeId))
      .innerJoin(authors, eq(authors.id, annotations.authorId))
      .leftJoin(resolvers, eq(resolvers.id, annotations.resolvedById))
      .$dynamic();
  }

  private async withReplies(
    rows: readonly Omit<AnnotationFullRow, 'replies'>[],
    executor: Executor,
  ): Promise<AnnotationFullRow[]> {
    const ids = rows.map(({ id }) => id);
    const replies =
      ids.length === 0
        ? []
        : await executor
            .select({
              ...getTableColumns(annotationReplies),
              author: { id: users.id, name: users.name },
            })
            .from(annotationReplies)
            .innerJoin(users, eq(users.id, annotationReplies.authorId))
            .where(inArray(annotationReplies.annotationId, ids))
            .orderBy(asc(annotationReplies.createdAt), asc(annotationReplies.id));
    return rows.map((row) => ({
      ...row,
      replies: replies.filter(({ annotationId }) => annotationId === row.id),
    }));
  }
}
