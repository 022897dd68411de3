import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { evaluateParameters } from '#common/expressions/evaluate-expression';

const parameters = (...pairs: readonly (readonly [string, string])[]) =>
  pairs.map(([name, expression]) => ({ name, expression }));

describe('evaluateParameters', () => {
  it('lets parameters refer to each other in any order', () => {
    const { values, problems } = evaluateParameters(
      parameters(['w', '1/2 - v'], ['v', 'u/2'], ['u', '0.3']),
    );
    expect(problems).toEqual([]);
    expect(values).toEqual({ u: 0.3, v: 0.15, w: 0.35 });
  });

  it('names a circle by its members, at each of them, and says what hangs on it', () => {
    const { values, problems } = evaluateParameters(
      parameters(['t', 'a + 1'], ['a', 'b'], ['b', 'c'], ['c', 'a'], ['free', '2']),
    );
    expect(values).toEqual({ free: 2 });
    const circle = 'Parameters refer to each other in a circle (a → b → c → a): give one a number.';
    expect(problems).toEqual([
      ...[1, 2, 3].map((index) => ({
        code: 'cell.parameter_cycle',
        field: `parameters.${index}.expression`,
        message: circle,
      })),
      {
        code: 'cell.expression',
        field: 'parameters.0.expression',
        message: 'a has no value yet: mend that parameter first.',
      },
    ]);
  });

  it('finds a parameter that refers to itself', () => {
    const { problems } = evaluateParameters(parameters(['u', 'u + 1']));
    expect(problems.map(({ message }) => message)).toEqual([
      'Parameters refer to each other in a circle (u → u): give one a number.',
    ]);
  });

  it.each([
    ['1u', 'Start the name with a letter; letters, digits and _ may follow.'],
    ['', 'Start the name with a letter; letters, digits and _ may follow.'],
    ['δ', 'Start the name with a letter; letters, digits and _ may follow.'],
    ['__proto__', 'Start the name with a letter; letters, digits and _ may follow.'],
    ['sqrt', 'sqrt has a meaning of its own: choose another name.'],
    ['deg', 'deg has a meaning of its own: choose another name.'],
    ['Infinity', 'Infinity has a meaning of its own: choose another name.'],
    ['mod', 'mod has a meaning of its own: choose another name.'],
  ])('refuses the name %j', (name, message) => {
    expect(evaluateParameters(parameters([name, '1']))).toMatchObject({
      values: {},
      problems: [{ code: 'cell.parameter_name', field: 'parameters.0.name', message }],
    });
  });

  it('keeps the first of two parameters with one name', () => {
    expect(evaluateParameters(parameters(['u', '1'], ['u', '2']))).toMatchObject({
      values: { u: 1 },
      problems: [
        { field: 'parameters.1.name', message: 'There are two parameters called u: rename one.' },
      ],
    });
  });

  it('can use every name it accepts', () => {
    const name = fc
      .tuple(
        fc.constantFrom(...'abcdefghijklmnopqrstuvwxyzABCXYZ'),
        fc.array(fc.constantFrom(...'abnotinmdxreul019_'), { maxLength: 4 }),
      )
      .map(([head, tail]) => head + tail.join(''));
    fc.assert(
      fc.property(name, (candidate) => {
        const { values, problems } = evaluateParameters(
          parameters([candidate, '0.5'], ['zzz', `2*${candidate}`]),
        );
        // A refused name is said to be one, at its own field; any other works in a formula.
        if (problems.some(({ code }) => code === 'cell.parameter_name')) {
          expect(problems[0]!.field).toBe('parameters.0.name');
          expect(Object.hasOwn(values, candidate)).toBe(false);
        } else {
          expect(values.zzz).toBe(1);
        }
      }),
      { numRuns: 500 },
    );
  });

  it('takes names of object members as the plain names they are', () => {
    const { values, problems } = evaluateParameters(
      parameters(['constructor', '0.5'], ['toString', 'constructor/2']),
    );
    expect(problems).toEqual([]);
    expect(values.toString).toBe(0.25);
  });
});
