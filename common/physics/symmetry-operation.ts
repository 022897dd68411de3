import { Problem } from '#common/errors/problem';
import { determinant } from '#common/physics/cell-metric';
import type { SymmetryOperation } from '#common/schemas/symmetry';

const axes = ['x', 'y', 'z'] as const;

/** Fractions that occur in space groups: multiples of 1/24 cover all tabulated settings. */
const fractionDenominator = 24;
const snapTolerance = 1e-4;

function unreadable(text: string, why: string): Problem {
  return new Problem(
    'cell.operation',
    `“${text}” is not a symmetry operation: ${why}. Write it like -x, y+1/2, z.`,
  );
}

/** A translation in [0, 1), snapped to a crystallographic fraction where it is within 10⁻⁴ of one. */
function normaliseTranslation(value: number): number {
  const snapped = Math.round(value * fractionDenominator) / fractionDenominator;
  const kept = Math.abs(value - snapped) < snapTolerance ? snapped : value;
  const wrapped = kept - Math.floor(kept);
  return wrapped >= 1 ? 0 : wrapped;
}

interface Component {
  readonly row: [number, number, number];
  readonly shift: number;
}

const termPattern = /([+-]?)(?:(\d+(?:\.\d*)?|\.\d+)(?:\/(\d+(?:\.\d*)?))?)?\*?([xyz])?/gy;

/** One component such as `-y+1/2`, `.5+x` or `x-y`. */
function parseComponent(component: string, whole: string): Component {
  const text = component.replace(/\s+/g, '').toLowerCase();
  const row: [number, number, number] = [0, 0, 0];
  let shift = 0;
  let position = 0;
  while (position < text.length) {
    termPattern.lastIndex = position;
    const match = termPattern.exec(text);
    if (match === null || match[0].length === 0 || (!match[2] && !match[4])) {
      throw unreadable(whole, `“${component.trim()}” can’t be read`);
    }
    if (position > 0 && match[1] === '') {
      throw unreadable(whole, `a sign is missing in “${component.trim()}”`);
    }
    const size = match[2] ? Number(match[2]) / (match[3] ? Number(match[3]) : 1) : 1;
    const signed = match[1] === '-' ? -size : size;
    if (match[4]) {
      row[axes.indexOf(match[4] as 'x' | 'y' | 'z')]! += signed;
    } else {
      shift += signed;
    }
    position = termPattern.lastIndex;
  }
  if (text.length === 0 || !Number.isFinite(shift)) {
    throw unreadable(whole, 'a part is empty');
  }
  return { row, shift };
}

/**
 * Reads a coordinate triplet, in any of the usual spellings: `x,y,z`, `-X+1/2, y, Z`, `.5+x, y, z`.
 * @throws Problem `cell.operation` if it is not one, or its rotation part has not determinant ±1
 */
export function parseOperation(text: string): SymmetryOperation {
  const parts = text.replace(/^['"]|['"]$/g, '').split(',');
  if (parts.length !== 3) {
    throw unreadable(text, 'it needs three parts with commas between');
  }
  const components = parts.map((part) => parseComponent(part, text));
  const rotation = components.flatMap(({ row }) => row);
  if (!rotation.every(Number.isInteger) || Math.abs(determinant(rotation)) !== 1) {
    throw unreadable(text, 'its rotation part does not map the lattice onto itself');
  }
  return { rotation, translation: components.map(({ shift }) => normaliseTranslation(shift)) };
}

/** A translation as the fraction it is (`1/2`, `5/6`), else as a decimal. */
function formatShift(value: number): string {
  for (const denominator of [2, 3, 4, 6, 8, 12, 24]) {
    const numerator = Math.round(value * denominator);
    if (Math.abs(value * denominator - numerator) < 1e-9) {
      return `${numerator}/${denominator}`;
    }
  }
  return String(value);
}

/** The triplet of an operation: `-x,y+1/2,z`. */
export function formatOperation(operation: SymmetryOperation): string {
  return [0, 1, 2]
    .map((i) => {
      const terms = axes
        .map((axis, j) => {
          const factor = operation.rotation[3 * i + j]!;
          if (factor === 0) {
            return '';
          }
          return `${factor < 0 ? '-' : '+'}${Math.abs(factor) === 1 ? '' : Math.abs(factor)}${axis}`;
        })
        .join('');
      const shift = operation.translation[i]!;
      return `${terms}${shift === 0 ? '' : `+${formatShift(shift)}`}`.replace(/^\+/, '');
    })
    .join(',');
}

/** x′ = W x + w for fractional coordinates; not reduced to the cell. */
export function applyOperation(
  operation: SymmetryOperation,
  fractional: readonly number[],
): [number, number, number] {
  const { rotation: w, translation: t } = operation;
  const [x, y, z] = fractional as [number, number, number];
  return [
    w[0]! * x + w[1]! * y + w[2]! * z + t[0]!,
    w[3]! * x + w[4]! * y + w[5]! * z + t[1]!,
    w[6]! * x + w[7]! * y + w[8]! * z + t[2]!,
  ];
}
