import { parseOperation } from '#common/physics/symmetry-operation';
import type { SymmetryOperation } from '#common/schemas/symmetry';

function multiply(a: SymmetryOperation, b: SymmetryOperation): SymmetryOperation {
  const entry = (i: number, j: number) =>
    [0, 1, 2].reduce((sum, k) => sum + a.rotation[3 * i + k]! * b.rotation[3 * k + j]!, 0);
  const shift = (i: number) =>
    [0, 1, 2].reduce(
      (sum, k) => sum + a.rotation[3 * i + k]! * b.translation[k]!,
      a.translation[i]!,
    );
  return {
    rotation: Array.from({ length: 9 }, (_, n) => entry(Math.floor(n / 3), n % 3)),
    // All shifts here are multiples of 1/24; rounding to them keeps sums exact.
    translation: [0, 1, 2].map((i) => (((Math.round(shift(i) * 24) % 24) + 24) % 24) / 24),
  };
}

const keyOf = ({ rotation, translation }: SymmetryOperation) =>
  [...rotation, ...translation.map((value) => Math.round(value * 24))].join(',');

/** All products of the generators, modulo lattice translations; the identity comes first. */
export function groupOf(...generators: readonly string[]): SymmetryOperation[] {
  const steps = generators.map(parseOperation);
  const group = [parseOperation('x,y,z')];
  const known = new Set(group.map(keyOf));
  for (const element of group) {
    for (const step of steps) {
      const next = multiply(step, element);
      if (!known.has(keyOf(next))) {
        known.add(keyOf(next));
        group.push(next);
      }
    }
  }
  return group;
}

/** Generators as International Tables for Crystallography Vol. A lists them (from memory). */
export const groups = {
  P1: groupOf(),
  'P-1': groupOf('-x,-y,-z'),
  P2: groupOf('-x,y,-z'),
  Pm: groupOf('x,-y,z'),
  P222: groupOf('-x,-y,z', '-x,y,-z'),
  'P42/mnm': groupOf('-x,-y,z', '-y+1/2,x+1/2,z+1/2', '-x+1/2,y+1/2,-z+1/2', '-x,-y,-z'),
  'R-3c:H': groupOf('x+2/3,y+1/3,z+1/3', '-y,x-y,z', 'y,x,-z+1/2', '-x,-y,-z'),
  P63mc: groupOf('-y,x-y,z', '-x,-y,z+1/2', '-y,-x,z'),
  'P-43m': groupOf('-x,-y,z', '-x,y,-z', 'z,x,y', 'y,x,z'),
  'Pm-3m': groupOf('-x,-y,z', '-x,y,-z', 'z,x,y', 'y,x,-z', '-x,-y,-z'),
  'Fm-3m': groupOf(
    'x,y+1/2,z+1/2',
    'x+1/2,y,z+1/2',
    '-x,-y,z',
    '-x,y,-z',
    'z,x,y',
    'y,x,-z',
    '-x,-y,-z',
  ),
  'Fd-3m:2': groupOf(
    'x,y+1/2,z+1/2',
    'x+1/2,y,z+1/2',
    '-x+3/4,-y+1/4,z+1/2',
    '-x+1/4,y+1/2,-z+3/4',
    'z,x,y',
    'y+3/4,x+1/4,-z+1/2',
    '-x,-y,-z',
  ),
} as const;
