import { describe, expect, it } from 'vitest';

import { formulaLine, formulaParts } from '#client/features/methods/model/formula-parts.ts';

describe('formulas', () => {
  it('reads what is raised, lowered and divided', () => {
    expect(formulaParts('k_e s^{−n}')).toEqual([
      { kind: 'text', text: 'k' },
      { kind: 'lowered', parts: [{ kind: 'text', text: 'e' }] },
      { kind: 'text', text: ' s' },
      { kind: 'raised', parts: [{ kind: 'text', text: '−n' }] },
    ]);
    expect(formulaParts('[q_i¦V]')).toEqual([
      {
        kind: 'fraction',
        above: [
          { kind: 'text', text: 'q' },
          { kind: 'lowered', parts: [{ kind: 'text', text: 'i' }] },
        ],
        below: [{ kind: 'text', text: 'V' }],
      },
    ]);
  });

  it('reads aloud on one line', () => {
    expect(formulaLine(formulaParts('E = [A¦s^2]'))).toBe('E = (A) over (s to the power 2)');
  });
});
