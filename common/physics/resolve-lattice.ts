import type { FieldProblem } from '#common/errors/problem';
import { evaluateExpression, type ParameterValues } from '#common/expressions/evaluate-expression';
import { cellVectors, cellVolumeA3 } from '#common/physics/cell-metric';
import { latticeConstraints, latticeParameterNames } from '#common/physics/crystal-system';
import type { LatticeParameters } from '#common/physics/resolved-cell';
import type { LatticeParameterName, LatticeParameterTexts } from '#common/schemas/cell';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';

const symbols: Readonly<Record<LatticeParameterName, string>> = {
  a: 'a',
  b: 'b',
  c: 'c',
  alpha: 'α',
  beta: 'β',
  gamma: 'γ',
};
const edges: readonly LatticeParameterName[] = ['a', 'b', 'c'];

/** How far a typed parameter may stray from what symmetry asks, relative. */
const constraintTolerance = 1e-6;

/** Volume of the flattest cell taken, relative to a·b·c. */
const leastVolume = 1e-4;

type Values = Partial<Record<LatticeParameterName, number>>;

function readValues(
  texts: LatticeParameterTexts,
  parameters: Pick<ParameterValues, 'values' | 'broken'>,
  problems: FieldProblem[],
): Values {
  const values: Values = {};
  for (const name of latticeParameterNames) {
    const field = `lattice.${name}`;
    const result = evaluateExpression(texts[name], parameters.values, parameters.broken);
    if (!result.ok) {
      problems.push({ code: 'cell.expression', field, message: result.message });
    } else if (edges.includes(name) && !(result.value > 0 && result.value < 1e9)) {
      const message = `${symbols[name]} is ${result.value} Å: write a length above zero.`;
      problems.push({ code: 'cell.length', field, message });
    } else if (!edges.includes(name) && !(result.value > 0 && result.value < 180)) {
      const message = `${symbols[name]} is ${result.value}°: write an angle between 0 and 180.`;
      problems.push({ code: 'cell.angle', field, message });
    } else {
      values[name] = result.value;
    }
  }
  return values;
}

function checkConstraints(
  values: Values,
  setting: SpaceGroupSetting | null,
  problems: FieldProblem[],
): void {
  const constraints = latticeConstraints(setting);
  for (const name of latticeParameterNames) {
    const constraint = constraints[name];
    const value = values[name];
    if (constraint.kind === 'free' || value === undefined) {
      continue;
    }
    const wanted = constraint.kind === 'fixed' ? constraint.value : values[constraint.other];
    if (wanted !== undefined && Math.abs(value - wanted) > constraintTolerance * wanted) {
      const asked = constraint.kind === 'fixed' ? `${wanted}°` : symbols[constraint.other];
      problems.push({
        code: 'cell.system_constraint',
        field: `lattice.${name}`,
        message:
          `${setting?.symbol} is ${setting?.crystalSystem}: ${symbols[name]} must equal ${asked}. ` +
          'Change it, or choose another space group.',
      });
    }
  }
}

function checkAngles(lattice: LatticeParameters, problems: FieldProblem[]): void {
  const { alphaDeg: alpha, betaDeg: beta, gammaDeg: gamma } = lattice;
  const sum = alpha + beta + gamma;
  const closes = sum < 360 && alpha + beta > gamma && beta + gamma > alpha && gamma + alpha > beta;
  if (!closes) {
    const why =
      sum >= 360
        ? `they add up to ${Number(sum.toFixed(6))}°, and must stay below 360°`
        : 'the largest must be smaller than the sum of the other two';
    problems.push({
      code: 'cell.angle_sum',
      field: 'lattice.alpha',
      message: `These angles can’t close a cell: ${why}.`,
    });
  }
}

/** The lattice parameters in numbers with the cell vectors, or the problems field by field. */
export function resolveLattice(
  texts: LatticeParameterTexts,
  parameters: Pick<ParameterValues, 'values' | 'broken'>,
  setting: SpaceGroupSetting | null,
): { lattice: LatticeParameters; vectorsA: number[]; volumeA3: number } | FieldProblem[] {
  const problems: FieldProblem[] = [];
  const values = readValues(texts, parameters, problems);
  checkConstraints(values, setting, problems);
  if (latticeParameterNames.some((name) => values[name] === undefined)) {
    return problems;
  }
  const lattice: LatticeParameters = {
    aA: values.a!,
    bA: values.b!,
    cA: values.c!,
    alphaDeg: values.alpha!,
    betaDeg: values.beta!,
    gammaDeg: values.gamma!,
  };
  checkAngles(lattice, problems);
  if (problems.length > 0) {
    return problems;
  }
  const vectorsA = cellVectors(lattice);
  const volumeA3 = cellVolumeA3(vectorsA);
  if (!(volumeA3 > leastVolume * lattice.aA * lattice.bA * lattice.cA)) {
    const message = 'The cell is flat, it has no volume: change an angle.';
    return [{ code: 'cell.zero_volume', field: 'lattice.alpha', message }];
  }
  return { lattice, vectorsA, volumeA3 };
}
