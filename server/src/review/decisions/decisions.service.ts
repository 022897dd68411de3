import { Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import { can } from '#common/policies/workspace-policy';
import { assertCan, type RequestContext } from '#server/http/request-context';
import {
  policySubjectOf,
  RevisionsService,
  type RevisionRead,
  type ReviewStep,
} from '#server/lattices/revisions/revisions.service';

import { nextState } from '../states/review-states.js';

const nobody = { submittedById: null, submittedAt: null } as const;
const undecided = { decidedById: null, decidedAt: null, decisionReason: null } as const;

/** The way of a revision through review. */
@Injectable()
export class DecisionsService {
  constructor(private readonly revisions: RevisionsService) {}

  /** @throws {Problem} `revision.wrong_state`, also when there is a newer revision */
  submit(context: RequestContext, lattice: string, number: string): Promise<RevisionRead> {
    return this.step(context, lattice, number, {
      action: 'revision.submit',
      decide: (revision, headRevision, now) => {
        if (revision.number !== headRevision) {
          throw new Problem(
            'revision.wrong_state',
            `Revision ${headRevision} is newer: submit that one.`,
          );
        }
        const state = nextState(revision.state, 'submit');
        return { state, submittedById: context.user.id, submittedAt: now, ...undecided };
      },
    });
  }

  /** @throws {Problem} `revision.wrong_state` */
  withdraw(context: RequestContext, lattice: string, number: string): Promise<RevisionRead> {
    return this.step(context, lattice, number, {
      action: 'revision.withdraw',
      decide: (revision) => ({
        state: nextState(revision.state, 'withdraw'),
        ...nobody,
        ...undecided,
      }),
    });
  }

  /** @throws {Problem} `revision.wrong_state`; `revision.own` for one’s own work */
  accept(
    context: RequestContext,
    lattice: string,
    number: string,
    reason: string,
  ): Promise<RevisionRead> {
    return this.decide(context, lattice, number, 'accept', reason);
  }

  /** @throws {Problem} `revision.wrong_state` */
  return(
    context: RequestContext,
    lattice: string,
    number: string,
    reason: string,
  ): Promise<RevisionRead> {
    return this.decide(context, lattice, number, 'return', reason);
  }

  private decide(
    context: RequestContext,
    lattice: string,
    number: string,
    verb: 'accept' | 'return',
    reason: string,
  ): Promise<RevisionRead> {
    const action = `revision.${verb}` as const;
    return this.step(context, lattice, number, {
      action,
      decide: (revision, _headRevision, now) => {
        const state = nextState(revision.state, verb);
        if (!can(context.actor, action, policySubjectOf(revision))) {
          throw new Problem('revision.own');
        }
        const { submittedById, submittedAt } = revision;
        const decision = { decidedById: context.user.id, decidedAt: now };
        return { state, submittedById, submittedAt, ...decision, decisionReason: reason || null };
      },
    });
  }

  private step(
    context: RequestContext,
    lattice: string,
    number: string,
    step: ReviewStep,
  ): Promise<RevisionRead> {
    assertCan(context, step.action);
    return this.revisions.review(context, lattice, number, step);
  }
}
