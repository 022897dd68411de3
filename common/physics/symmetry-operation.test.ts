import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { Problem } from '#common/errors/problem';
import {
  applyOperation,
  formatOperation,
  parseOperation,
} from '#common/physics/symmetry-operation';
import { groups } from '#tests/helpers/group-closure';

function codeOf(text: string): string {
  try {
    parseOperation(text);
    return 'read';
  } catch (error) {
    return error instanceof Problem ? error.code : 'not a problem';
  }
}

describe('parseOperation', () => {
  // One operation in the spellings that files and people use.
  it.each([
    '-x,y+1/2,z',
    '-X, Y+1/2, Z',
    ' -x , 1/2+y , z ',
    "'-x,y+1/2,z'",
    '"-x, y + 1/2, z"',
    '-x,.5+y,z',
    '-x,y+0.5,+z',
    '-1*x,y+0.50000,1*z',
    '-x,y-1/2,z',
    '-x,y+3/2,z',
    '-x,y+1/2,z+1',
  ])('reads %j', (text) => {
    expect(parseOperation(text)).toEqual({
      rotation: [-1, 0, 0, 0, 1, 0, 0, 0, 1],
      translation: [0, 0.5, 0],
    });
  });

  it('reads the rotation row by row', () => {
    expect(parseOperation('-y,x-y,z+2/3').rotation).toEqual([0, -1, 0, 1, -1, 0, 0, 0, 1]);
  });

  it.each([
    ['x,y,z+0.3333', 1 / 3],
    ['x,y,z+.66667', 2 / 3],
    ['x,y,z+0.16667', 1 / 6],
    ['x,y,z-0.3333', 2 / 3],
    ['x,y,z+0.9999999', 0],
    ['x,y,z+0.125', 0.125],
    // Not near a fraction that occurs in space groups: kept as typed.
    ['x,y,z+0.2', 0.2],
    ['x,y,z+0.33', 0.33],
  ])('%s has the shift %d', (text, shift) => {
    expect(parseOperation(text).translation[2]).toBeCloseTo(shift, 12);
  });

  it.each([
    '',
    'x',
    'x,y',
    'x,y,z,x',
    'x,y,',
    'x,y,w',
    'x,y,z+',
    'x,,z',
    'xy,y,z',
    'x+-y,y,z',
    'x,y,z+1/0',
    'x,y,z+1/2/2',
    'x^2,y,z',
    'x,y,0',
    'x,x,z',
    '2x,y,z',
    '0.5x,y,z',
    '1/2x,y,z',
    'x+y,x-y,z',
    'x,y,1/2',
    'x;y;z',
    'constructor,y,z',
    'x,y,z+1e999',
  ])('refuses %j with a problem', (text) => {
    expect(codeOf(text)).toBe('cell.operation');
  });

  it('names the part that can’t be read and an example', () => {
    expect(() => parseOperation('x,q,z')).toThrow(
      '“x,q,z” is not a symmetry operation: “q” can’t be read. Write it like -x, y+1/2, z.',
    );
  });

  it('throws nothing but problems', () => {
    const text = fc
      .array(fc.constantFrom(...'xyzXYZ0123456789+-*/., \'"'), { maxLength: 24 })
      .map((part) => part.join(''));
    fc.assert(
      fc.property(fc.oneof(text, fc.string()), (candidate) => {
        expect(codeOf(candidate)).toMatch(/^(read|cell\.operation)$/);
      }),
      { numRuns: 2000 },
    );
  });
});

describe('formatOperation', () => {
  it.each(['x,y,z', '-x,y+1/2,z', '-y,x-y,z+2/3', '-x+3/4,-y+1/4,z+1/2', 'z+5/6,x,y', 'x,y,z+0.2'])(
    'writes %s back as it is',
    (text) => {
      expect(formatOperation(parseOperation(text))).toBe(text);
    },
  );

  it('is read back as the same operation, for all operations of all groups at hand', () => {
    for (const operation of Object.values(groups).flat()) {
      const again = parseOperation(formatOperation(operation));
      expect(again.rotation.map((entry) => entry + 0)).toEqual(
        operation.rotation.map((entry) => entry + 0),
      );
      again.translation.forEach((shift, k) =>
        expect(shift).toBeCloseTo(operation.translation[k]!, 12),
      );
    }
  });
});

describe('applyOperation', () => {
  it('gives x′ = W x + w', () => {
    const [x, y, z] = applyOperation(parseOperation('-y+1/2,x-y,z+2/3'), [0.1, 0.3, 0.25]);
    expect(x).toBeCloseTo(0.2, 12);
    expect(y).toBeCloseTo(-0.2, 12);
    expect(z).toBeCloseTo(0.25 + 2 / 3, 12);
  });
});
