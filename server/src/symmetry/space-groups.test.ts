import { describe, expect, it } from 'vitest';

import { determinant } from '#common/physics/cell-metric';
import type { SymmetryOperation } from '#common/schemas/symmetry';

import { composed, operationKey } from './operation-key.js';
import {
  findByHallSymbol,
  findByNumber,
  findBySymbol,
  findSetting,
  listSettings,
  matchOperations,
  operationsOf,
  settingsOfNumber,
} from './space-groups.js';
import { symbolKeysOf } from './symbol-names.js';
import { readTabulatedSettings } from './tabulated-settings.js';

const settings = listSettings();

/** Order of the general position of some groups: International Tables for Crystallography, vol. A. */
const generalPositions: readonly [string, number, number][] = [
  ['P 1', 1, 1],
  ['P -1', 2, 2],
  ['P 21/c', 14, 4],
  ['C 2/c', 15, 8],
  ['P n m a', 62, 8],
  ['I 4/m m m', 139, 32],
  ['P 42/m n m', 136, 16],
  ['R -3 m', 166, 36],
  ['R -3 c', 167, 36],
  ['P 63 m c', 186, 12],
  ['P 63/m m c', 194, 24],
  ['P m -3 m', 221, 48],
  ['P n -3 m', 224, 48],
  ['F -4 3 m', 216, 96],
  ['F m -3 m', 225, 192],
  ['F d -3 m', 227, 192],
  ['I a -3 d', 230, 96],
];

/** Orders of the 32 point groups (International Tables A, table 10.1.2), by first and last number. */
const pointGroupOrders: readonly [number, number, number][] = [
  [1, 1, 1],
  [2, 2, 2],
  [3, 5, 2],
  [6, 9, 2],
  [10, 15, 4],
  [16, 24, 4],
  [25, 46, 4],
  [47, 74, 8],
  [75, 80, 4],
  [81, 82, 4],
  [83, 88, 8],
  [89, 98, 8],
  [99, 110, 8],
  [111, 122, 8],
  [123, 142, 16],
  [143, 146, 3],
  [147, 148, 6],
  [149, 155, 6],
  [156, 161, 6],
  [162, 167, 12],
  [168, 173, 6],
  [174, 174, 6],
  [175, 176, 12],
  [177, 182, 12],
  [183, 186, 12],
  [187, 190, 12],
  [191, 194, 24],
  [195, 199, 12],
  [200, 206, 24],
  [207, 214, 24],
  [215, 220, 24],
  [221, 230, 48],
];

describe('the tabulated settings', () => {
  it('are 530 settings of 230 groups, one of each the conventional one', () => {
    expect(settings).toHaveLength(530);
    expect(new Set(settings.map(({ number }) => number)).size).toBe(230);
    expect(settings.filter(({ isStandard }) => isStandard).map(({ number }) => number)).toEqual(
      Array.from({ length: 230 }, (_, index) => index + 1),
    );
  });

  it.each(pointGroupOrders)('groups %i–%i have point groups of order %i', (first, last, order) => {
    for (const { number, hallNumber } of settings) {
      if (number >= first && number <= last) {
        const rotations = new Set(operationsOf(hallNumber).map(({ rotation }) => rotation.join()));
        expect(rotations.size).toBe(order);
      }
    }
  });

  it('have determinants ±1, translations in [0, 1), and the identity among them', () => {
    for (const { hallNumber } of settings) {
      const operations = operationsOf(hallNumber);
      expect(operations.every(({ rotation }) => Math.abs(determinant(rotation)) === 1)).toBe(true);
      expect(operations.every(({ translation }) => translation.every((w) => w >= 0 && w < 1))).toBe(
        true,
      );
      expect(operations.map(operationKey)).toContain('1,0,0,0,1,0,0,0,1|0,0,0');
    }
  });

  it('are groups: every product of two operations is one of them, in all 530', () => {
    const open = settings.filter(({ hallNumber }) => !isClosed(operationsOf(hallNumber)));
    expect(open).toEqual([]);
  });

  it.each(generalPositions)('%s is number %i with %i operations', (symbol, number, count) => {
    const found = findByNumber(number)!;
    expect(found.symbol).toBe(symbol);
    expect(operationsOf(found.hallNumber)).toHaveLength(count);
  });

  it('give rotations row by row', () => {
    // International Tables A, P 3: x,y,z; −y,x−y,z; −x+y,−x,z. Column by column, the second would
    // read as y,−x−y,z, which is no operation of hexagonal axes.
    const p3 = operationsOf(findByNumber(143)!.hallNumber).map(({ rotation }) => rotation);
    expect(p3).toContainEqual([0, -1, 0, 1, -1, 0, 0, 0, 1]);
    expect(p3).toContainEqual([-1, 1, 0, -1, 0, 0, 0, 0, 1]);
  });

  it('keep the metric of their crystal system', () => {
    for (const setting of settings) {
      const metric = metricOf(setting);
      for (const { rotation } of operationsOf(setting.hallNumber)) {
        expect(transformed(metric, rotation)).toEqual(metric);
      }
    }
  });
});

/** A metric tensor with the freedom of the crystal system, in whole numbers. */
function metricOf(setting: (typeof settings)[number]): number[] {
  switch (setting.crystalSystem) {
    case 'triclinic':
      return [4, 1, 2, 1, 9, 3, 2, 3, 16];
    case 'monoclinic':
      return {
        a: [4, 0, 0, 0, 9, 3, 0, 3, 16],
        b: [4, 0, 2, 0, 9, 0, 2, 0, 16],
        c: [4, 1, 0, 1, 9, 0, 0, 0, 16],
      }[setting.uniqueAxis!];
    case 'orthorhombic':
      return [4, 0, 0, 0, 9, 0, 0, 0, 16];
    case 'tetragonal':
      return [4, 0, 0, 0, 4, 0, 0, 0, 9];
    case 'trigonal':
    case 'hexagonal':
      return setting.hexagonalAxes ? [4, -2, 0, -2, 4, 0, 0, 0, 9] : [4, 1, 1, 1, 4, 1, 1, 1, 4];
    case 'cubic':
      return [4, 0, 0, 0, 4, 0, 0, 0, 4];
  }
}

/** Wᵀ G W. */
function transformed(g: number[], w: number[]): number[] {
  const result = Array.from({ length: 9 }, () => 0);
  for (let i = 0; i < 3; i += 1) {
    for (let j = 0; j < 3; j += 1) {
      for (let k = 0; k < 3; k += 1) {
        for (let l = 0; l < 3; l += 1) {
          result[3 * i + j]! += w[3 * k + i]! * g[3 * k + l]! * w[3 * l + j]!;
        }
      }
    }
  }
  return result;
}

function isClosed(operations: readonly SymmetryOperation[]): boolean {
  const keys = new Set(operations.map(operationKey));
  return operations.every((a) => operations.every((b) => keys.has(operationKey(composed(a, b)))));
}

describe('looking a group up', () => {
  it.each([
    ['F m -3 m', 523],
    ['Fm-3m', 523],
    ['F m 3 m', 523],
    ['Fm3m', 523],
    ['F 4/m -3 2/m', 523],
    ['f m -3 m', 523],
    ['F m −3 m', 523],
    ['Fd-3m:1', 525],
    ['F d -3 m :2', 526],
    ['F d -3 m S', 525],
    ['F d -3 m Z', 526],
    ['P n -3 m :1', 521],
    ['R -3 m', 458],
    ['R -3 m H', 458],
    ['R -3 m :R', 459],
    ['R-3mR', 459],
    ['H -3 m', 458],
    ['P 21/c', 81],
    ['P 1 21/c 1', 81],
    ['P 2(1)/c', 81],
    ['P 2~1~/c', 81],
    ['P 2_1/c', 81],
    ['P 21/n', 82],
    ['P 42/m n m', 419],
    ['C m c a', 304],
    ['C m c e', 304],
    ['P 63 m c', 480],
    ['P 63/m m c', 488],
    ['I a 3 d', 530],
  ])('%s is Hall number %i', (symbol, hallNumber) => {
    expect(findBySymbol(symbol)[0]?.hallNumber).toBe(hallNumber);
  });

  it('offers every setting an unmarked symbol may mean', () => {
    expect(findBySymbol('F d -3 m').map(({ setting }) => setting)).toEqual(['2', '1']);
    expect(findBySymbol('P 21/n').map(({ uniqueAxis }) => uniqueAxis)).toEqual(['b', 'c', 'a']);
  });

  it('knows each setting by its own symbols, and no symbol stands for two groups', () => {
    const numbers = new Map<string, number>();
    for (const tabulated of readTabulatedSettings()) {
      for (const key of symbolKeysOf(tabulated)) {
        expect([key, numbers.get(key) ?? tabulated.setting.number]).toEqual([
          key,
          tabulated.setting.number,
        ]);
        numbers.set(key, tabulated.setting.number);
      }
      expect(findBySymbol(tabulated.setting.symbol)).toContainEqual(tabulated.setting);
    }
    expect(numbers.size).toBeGreaterThan(530);
  });

  it('finds nothing for what is no symbol, number or Hall number', () => {
    expect(findBySymbol('Q m -3 m')).toEqual([]);
    expect(findBySymbol('')).toEqual([]);
    expect(findByNumber(0)).toBeNull();
    expect(findByNumber(231)).toBeNull();
    expect(findSetting(531)).toBeNull();
    expect(findSetting(1.5)).toBeNull();
    expect(() => operationsOf(0)).toThrow(expect.objectContaining({ code: 'cell.space_group' }));
  });

  it('finds Hall symbols', () => {
    expect(findByHallSymbol('-F 4 2 3')?.hallNumber).toBe(523);
    expect(findByHallSymbol(' -P  2ybc ')?.hallNumber).toBe(81);
    expect(findByHallSymbol('-R 3 2"')?.hallNumber).toBe(458);
  });

  it('lists the settings of a number, the conventional one first', () => {
    expect(settingsOfNumber(227).map(({ hallNumber }) => hallNumber)).toEqual([526, 525]);
    expect(settingsOfNumber(167).map(({ setting }) => setting)).toEqual(['H', 'R']);
  });
});

describe('matching operations', () => {
  it('recognises every setting by its operations, in any order', () => {
    for (const { hallNumber, number } of settings) {
      const found = matchOperations([...operationsOf(hallNumber)].reverse());
      expect(found?.number).toBe(number);
    }
  });

  it('takes 0.3333 for 1/3 and a negative shift for its remainder', () => {
    const blurred = operationsOf(458).map(({ rotation, translation }) => ({
      rotation,
      translation: translation.map((w) => Number((w - 1).toFixed(4))),
    }));
    expect(matchOperations(blurred)?.hallNumber).toBe(458);
  });

  it('knows when a set is no tabulated setting', () => {
    const operations = operationsOf(523);
    expect(matchOperations(operations.slice(1))).toBeNull();
    expect(
      matchOperations([{ rotation: [1, 0, 0, 0, 1, 0, 0, 0, 1], translation: [0.01, 0, 0] }]),
    ).toBeNull();
  });
});
