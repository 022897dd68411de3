import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { decompositions, type IonCounts } from '#common/physics/rivals/decompositions';

const spinel = { 'Mg+2': 1, 'Al+3': 2, 'O-2': 4 };
const periclase = { 'Mg+2': 1, 'O-2': 1 };
const corundum = { 'Al+3': 2, 'O-2': 3 };

describe('decompositions', () => {
  it('makes spinel of one periclase and one corundum', () => {
    expect(decompositions(spinel, [periclase, { 'Na+1': 1, 'Cl-1': 1 }, corundum])).toEqual([
      {
        parts: [
          { salt: 0, numerator: 1, denominator: 1 },
          { salt: 2, numerator: 1, denominator: 1 },
        ],
      },
    ]);
  });

  it('finds fractions exactly, and nothing where nothing balances', () => {
    expect(decompositions(periclase, [{ 'Mg+2': 3, 'O-2': 3 }])).toEqual([
      { parts: [{ salt: 0, numerator: 1, denominator: 3 }] },
    ]);
    expect(decompositions(spinel, [periclase])).toEqual([]);
    expect(decompositions(periclase, [{ 'Mg+2': 2, 'O-2': 1 }])).toEqual([]);
  });

  it('refuses counts that are not whole', () => {
    expect(() => decompositions({ 'Mg+2': 0.5 }, [])).toThrow(RangeError);
    expect(() => decompositions({}, [periclase])).toThrow(RangeError);
  });

  const salt = fc.record({
    a: fc.nat({ max: 5 }),
    b: fc.nat({ max: 5 }),
    c: fc.nat({ max: 5 }),
  });

  it('keeps every ion of whatever balances', () => {
    fc.assert(
      fc.property(salt, fc.array(salt, { maxLength: 5 }), (target, salts) => {
        fc.pre(target.a + target.b + target.c > 0);
        for (const { parts } of decompositions(target, salts)) {
          const common = parts.reduce((product, { denominator }) => product * denominator, 1);
          for (const kind of ['a', 'b', 'c'] as const) {
            const sum = parts.reduce(
              (total, { salt: index, numerator, denominator }) =>
                total + (common / denominator) * numerator * salts[index]![kind],
              0,
            );
            expect(sum).toBe(target[kind] * common);
          }
        }
      }),
    );
  });

  it('finds a mixture that was put together from independent salts', () => {
    const amount = fc.integer({ min: 1, max: 9 });
    fc.assert(
      fc.property(salt, salt, amount, amount, (one, two, x, y) => {
        const crosses = [
          one.a * two.b - one.b * two.a,
          one.b * two.c - one.c * two.b,
          one.a * two.c - one.c * two.a,
        ];
        fc.pre(crosses.some((cross) => cross !== 0));
        const target: IonCounts = {
          a: x * one.a + y * two.a,
          b: x * one.b + y * two.b,
          c: x * one.c + y * two.c,
        };
        expect(decompositions(target, [one, two])).toContainEqual({
          parts: [
            { salt: 0, numerator: x, denominator: 1 },
            { salt: 1, numerator: y, denominator: 1 },
          ],
        });
      }),
    );
  });
});
