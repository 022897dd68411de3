import { Inject, Injectable } from '@nestjs/common';
import { and, desc, eq, getTableColumns, isNull } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';

import {
  DATABASE,
  type Database,
  type Executor,
  type Transaction,
} from '#server/database/database';
import { users } from '#server/users/user.table';

import { lattices } from '../lattice.table.js';
import { revisions, type RevisionRow } from './revision.table.js';

interface Person {
  readonly id: string;
  readonly name: string;
}

interface People {
  readonly author: Person;
  readonly submittedBy: Person | null;
  readonly decidedBy: Person | null;
}

/** A revision as a list shows it: without what makes it large. */
export type RevisionListRow = Omit<RevisionRow, 'cell' | 'method' | 'model' | 'evaluationProblem'> &
  People;

/** A revision with everything that it is. */
export type RevisionFullRow = RevisionRow &
  People & {
    readonly latticeName: string;
    readonly prototype: string | null;
  };

/** What review may change. */
export type ReviewChange = Pick<
  RevisionRow,
  'state' | 'submittedById' | 'submittedAt' | 'decidedById' | 'decidedAt' | 'decisionReason'
>;

const authors = alias(users, 'authors');
const submitters = alias(users, 'submitters');
const deciders = alias(users, 'deciders');

const people = {
  author: { id: authors.id, name: authors.name },
  submittedBy: { id: submitters.id, name: submitters.name },
  decidedBy: { id: deciders.id, name: deciders.name },
};

const {
  cell: _cell,
  method: _method,
  model: _model,
  evaluationProblem: _problem,
  ...listed
} = getTableColumns(revisions);

const ofLattice = (workspaceId: string, latticeId: string) =>
  and(
    eq(revisions.workspaceId, workspaceId),
    eq(revisions.latticeId, latticeId),
    isNull(lattices.deletedAt),
  );

@Injectable()
export class RevisionsRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  async insert(revision: typeof revisions.$inferInsert, tx: Transaction): Promise<void> {
    await tx.insert(revisions).values(revision);
  }

  /** Every revision of a lattice that is not deleted, the newest first. */
  async list(workspaceId: string, latticeId: string): Promise<RevisionListRow[]> {
    return this.db
      .select({ ...listed, ...people })
      .from(revisions)
      .innerJoin(lattices, eq(lattices.id, revisions.latticeId))
      .innerJoin(authors, eq(authors.id, revisions.authorId))
      .leftJoin(submitters, eq(submitters.id, revisions.submittedById))
      .leftJoin(deciders, eq(deciders.id, revisions.decidedById))
      .where(ofLattice(workspaceId, latticeId))
      .orderBy(desc(revisions.number));
  }

  async find(
    workspaceId: string,
    latticeId: string,
    number: number,
    executor: Executor = this.db,
  ): Promise<RevisionFullRow | null> {
    const [row] = await this.full(executor).where(
      and(ofLattice(workspaceId, latticeId), eq(revisions.number, number)),
    );
    return row ?? null;
  }

  /** A revision by its id, for what names it; null when its lattice is deleted. */
  async findById(workspaceId: string, id: string): Promise<RevisionFullRow | null> {
    const [row] = await this.full(this.db).where(
      and(eq(revisions.workspaceId, workspaceId), eq(revisions.id, id), isNull(lattices.deletedAt)),
    );
    return row ?? null;
  }

  async review(
    workspaceId: string,
    id: string,
    change: ReviewChange,
    tx: Transaction,
  ): Promise<void> {
    await tx
      .update(revisions)
      .set(change)
      .where(and(eq(revisions.workspaceId, workspaceId), eq(revisions.id, id)));
  }

  private full(executor: Executor) {
    return executor
      .select({
        ...getTableColumns(revisions),
        ...people,
        latticeName: lattices.name,
        prototype: lattices.prototype,
      })
      .from(revisions)
      .innerJoin(lattices, eq(lattices.id, revisions.latticeId))
      .innerJoin(authors, eq(authors.id, revisions.authorId))
      .leftJoin(submitters, eq(submitters.id, revisions.submittedById))
      .leftJoin(deciders, eq(deciders.id, revisions.decidedById))
      .$dynamic();
  }
}
