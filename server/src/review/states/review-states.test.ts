import { describe, expect, it } from 'vitest';

import { Problem } from '#common/errors/problem';
import { revisionState, type RevisionState } from '#common/schemas/lattice';

import { nextState, type ReviewVerb } from './review-states.js';

/** The whole machine; what is not here is refused. */
const allowed: Record<string, RevisionState> = {
  'draft submit': 'in_review',
  'returned submit': 'in_review',
  'in_review withdraw': 'draft',
  'in_review accept': 'accepted',
  'in_review return': 'returned',
};
const verbs: ReviewVerb[] = ['submit', 'withdraw', 'accept', 'return'];
const table = revisionState.options.flatMap((state) => verbs.map((verb) => [state, verb] as const));

describe('nextState', () => {
  it.each(table)('%s, %s', (state, verb) => {
    const expected = allowed[`${state} ${verb}`];
    if (expected === undefined) {
      expect(() => nextState(state, verb)).toThrow(Problem);
      expect(() => nextState(state, verb)).toThrow(/^The revision is .+, so it can’t be .+\.$/);
    } else {
      expect(nextState(state, verb)).toBe(expected);
    }
  });

  it('never leads out of accepted', () => {
    expect(
      table.filter(([state, verb]) => allowed[`${state} ${verb}`] && state === 'accepted'),
    ).toEqual([]);
  });
});
