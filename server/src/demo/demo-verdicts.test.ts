import { describe, expect, it } from 'vitest';

import { noOverrides } from '#common/chemistry/sourced';
import { judge } from '#common/physics/checks/judge';
import { resolveCell } from '#common/physics/resolve-cell';
import { defaultEvaluationMethod } from '#common/schemas/cell';
import { defaultEnergeticModel } from '#common/schemas/energetics';
import { evaluateCell } from '#server/electrostatics/evaluate-cell';
import { readPrototypes } from '#server/prototypes/prototypes';
import { symmetryOf } from '#server/symmetry/space-groups';

import { demoCell, demoLattices } from './demo-lattices.js';

/** What the checks say of a demo lattice, and which of them do not hold. */
function judgedDemo(name: string) {
  const lattice = demoLattices.find((one) => one.name === name)!;
  const definition = demoCell(lattice, readPrototypes());
  const { cell } = resolveCell(definition, symmetryOf(definition.symmetry));
  const isCharged = Math.abs(cell!.sites.reduce((sum, { chargeE }) => sum + chargeE, 0)) > 1e-6;
  const result = isCharged
    ? null
    : evaluateCell(cell!, defaultEvaluationMethod, {
        spaceGroupNumber: null,
        spaceGroupSymbol: null,
      });
  const { checks, verdict } = judge(cell!, result, defaultEnergeticModel, noOverrides);
  const troubled = checks.filter(({ word }) => word === 'doubtful' || word === 'fails');
  return { word: verdict.word, troubled: troubled.map(({ key }) => key) };
}

// Sound, well-known salts hold; those that strain a rule of thumb say which; the broken one fails.
describe('the verdict of the demo’s lattices', () => {
  it.each([
    ['Periclase, trial 3', 'holds', []],
    ['Lithium fluoride', 'holds', []],
    ['Fluorite', 'holds', []],
    ['Sphalerite', 'holds', []],
    ['Wurtzite', 'holds', []],
    ['Caesium chloride, for comparison', 'holds', []],
    ['Corundum', 'doubtful', ['radius_ratio']],
    ['Fluorite, charges to mend', 'fails', ['charge_balance']],
  ])('%s: %s', (name, word, troubled) => {
    expect(judgedDemo(name)).toEqual({ word, troubled });
  });
});
