import { describe, expect, it } from 'vitest';

import { cellVectors } from '#common/physics/cell-metric';
import { findMetricFault, groupFault } from '#common/physics/operation-checks';
import { parseOperation } from '#common/physics/symmetry-operation';
import { groups } from '#tests/helpers/group-closure';

const read = (...texts: readonly string[]) => texts.map(parseOperation);

const vectors = (aA: number, bA: number, cA: number, alphaDeg = 90, betaDeg = 90, gammaDeg = 90) =>
  cellVectors({ aA, bA, cA, alphaDeg, betaDeg, gammaDeg });

describe('groupFault', () => {
  it.each(Object.entries(groups))('finds none in %s', (_, operations) => {
    expect(groupFault(operations)).toBeNull();
  });

  it('allows thirds to three digits', () => {
    const shifts = ['x,y,z', 'x+0.667,y+0.333,z+0.333', 'x+0.333,y+0.667,z+0.667'];
    expect(groupFault(read(...shifts))).toBeNull();
  });

  it('lets repeats pass', () => {
    expect(groupFault(read('x,y,z', '-x,-y,-z', '-x,-y,-z'))).toBeNull();
  });

  it('asks for the identity', () => {
    expect(groupFault(read('-x,-y,-z'))).toBe(
      'The identity x,y,z is missing among the operations: add it.',
    );
    expect(groupFault([])).toContain('identity');
  });

  it('names the product that is missing', () => {
    expect(groupFault(read('x,y,z', '-x,y,-z', '-x,-y,-z'))).toBe(
      'These operations are not complete: -x,-y,-z followed by -x,y,-z gives x,-y,z, which is ' +
        'missing. Add it, or correct one of the two.',
    );
  });

  it('sees a shift that never closes', () => {
    expect(groupFault(read('x,y,z', 'x,y,z+0.3'))).toContain('gives x,y,z+0.6');
  });

  it('sees one operation left out of 192', () => {
    const [, ...rest] = groups['Fm-3m'].toReversed();
    expect(groupFault(rest)).toContain('which is missing');
  });
});

describe('findMetricFault', () => {
  it.each([
    ['Fm-3m', vectors(4.212, 4.212, 4.212)],
    ['P42/mnm', vectors(4.594, 4.594, 2.959)],
    ['R-3c:H', vectors(4.76, 4.76, 12.99, 90, 90, 120)],
    ['P2', vectors(5, 6, 7, 90, 103, 90)],
    ['P-1', vectors(5, 6, 7, 80, 103, 95)],
  ] as const)('finds none where %s has its own axes', (name, axes) => {
    expect(findMetricFault(groups[name], axes)).toBeNull();
  });

  it.each([
    ['Fm-3m', vectors(4.2, 4.2, 4.3)],
    ['P42/mnm', vectors(4.594, 2.959, 4.594)],
    ['R-3c:H', vectors(4.76, 4.76, 12.99)],
    ['P2', vectors(5, 6, 7, 103, 90, 90)],
  ] as const)('finds that %s does not fit other axes', (name, axes) => {
    expect(findMetricFault(groups[name], axes)).toMatch(/ does not map this cell onto itself/);
  });

  it('allows the rounding of measured cells', () => {
    expect(findMetricFault(groups['Fm-3m'], vectors(4.2121, 4.2123, 4.2122))).toBeNull();
  });
});
