import { Problem } from '#common/errors/problem';
import type { RevisionState } from '#common/schemas/lattice';

/** What can happen to a revision in review. */
export type ReviewVerb = 'submit' | 'withdraw' | 'accept' | 'return';

const steps: Record<ReviewVerb, { from: readonly RevisionState[]; to: RevisionState }> = {
  submit: { from: ['draft', 'returned'], to: 'in_review' },
  withdraw: { from: ['in_review'], to: 'draft' },
  accept: { from: ['in_review'], to: 'accepted' },
  return: { from: ['in_review'], to: 'returned' },
};

const stateWords: Record<RevisionState, string> = {
  draft: 'not in review',
  in_review: 'in review',
  accepted: 'accepted',
  returned: 'returned',
};

const verbWords: Record<ReviewVerb, string> = {
  submit: 'submitted',
  withdraw: 'withdrawn',
  accept: 'accepted',
  return: 'returned',
};

/**
 * The state a step leads to.
 * @throws {Problem} `revision.wrong_state`, saying which state it is in
 */
export function nextState(state: RevisionState, verb: ReviewVerb): RevisionState {
  const { from, to } = steps[verb];
  if (!from.includes(state)) {
    throw new Problem(
      'revision.wrong_state',
      `The revision is ${stateWords[state]}, so it can’t be ${verbWords[verb]}.`,
    );
  }
  return to;
}
