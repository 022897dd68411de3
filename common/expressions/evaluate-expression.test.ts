import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { evaluateExpression } from '#common/expressions/evaluate-expression';
import { cellLimits } from '#common/schemas/cell';

const scope = { u: 0.3053, x: 0.25, long_name2: -2, e: 0.1, i: 0.2 };

function valueOf(text: string): number {
  const result = evaluateExpression(text, scope);
  if (!result.ok) {
    throw new Error(`${text}: ${result.message}`);
  }
  return result.value;
}

function faultOf(text: string): string {
  const result = evaluateExpression(text, scope);
  return result.ok ? `no fault, value ${result.value}` : result.message;
}

describe('evaluateExpression', () => {
  it.each([
    ['0', 0],
    ['-0', 0],
    ['.5', 0.5],
    ['5.', 5],
    ['+2', 2],
    ['−2', -2],
    [' 1.25e-1 ', 0.125],
    ['1/3', 1 / 3],
    ['u', 0.3053],
    ['1/2 - u', 0.5 - 0.3053],
    ['-u', -0.3053],
    ['-2^2', -4],
    ['2^-1', 0.5],
    ['2^3^2', 512],
    ['1 - 2 - 3', -4],
    ['8/4/2', 1],
    ['2*(x + 1)', 2.5],
    ['--1', 1],
    ['sqrt(3)/2', Math.sqrt(3) / 2],
    ['cbrt(-27)', -3],
    ['abs(long_name2)', 2],
    ['cos(60*deg)', Math.cos(Math.PI / 3)],
    ['atan(1)*4', Math.PI],
    ['pi', Math.PI],
    // Letters that stand for something in other trades are free names here.
    ['e + i', 0.1 + 0.2],
  ])('reads %s', (text, value) => {
    expect(valueOf(text)).toBe(value);
  });

  it('gives +0, never −0, so that equal cells have equal text', () => {
    expect(Object.is(valueOf('-0'), 0)).toBe(true);
    expect(Object.is(valueOf('0*-1'), 0)).toBe(true);
  });

  it.each([
    ['q', 'Unknown name q: add it as a parameter or write a number.'],
    ['', 'Write a number or an expression such as 1/3.'],
    ['0,25', 'Use a point, not a comma, in a decimal number.'],
    ['2u', 'Write the product out: 2*u, not 2u.'],
    ['sqrt', 'sqrt is a function: write sqrt(…).'],
    ['sqrt(1, 2)', 'sqrt takes one number: write sqrt(…).'],
    ['u$', '“$” is not understood here: use numbers, parameters and + − * / ^.'],
    [
      '1/(1/0)',
      'This has no finite value: look for a division by zero or a root of a negative number.',
    ],
    ['1 +', '“1 +” can’t be read: look for a missing number, sign or parenthesis.'],
    ['0x10', 'Write the number in decimal digits.'],
    ['1'.repeat(121), `Use at most ${cellLimits.expressionLength} characters.`],
    ['1+'.repeat(59) + '1', 'This is too long: put a part of it into a parameter.'],
  ])('names the fix for %s', (text, message) => {
    expect(faultOf(text)).toBe(message);
  });

  it('says that a parameter is at fault rather than unknown', () => {
    const result = evaluateExpression('1 - w', {}, new Set(['w']));
    expect(result).toEqual({
      ok: false,
      message: 'w has no value yet: mend that parameter first.',
    });
  });
});

/** Texts that reach for more than arithmetic; each must be refused, none may run. */
const hostile = [
  'constructor',
  '__proto__',
  'toString',
  'hasOwnProperty',
  'u.constructor',
  'constructor.constructor("return process")()',
  'u["constructor"]',
  'cos.constructor("return 1")()',
  'this',
  'process.exit(1)',
  'globalThis',
  'require("fs")',
  'import("node:fs")',
  'eval("1")',
  'evaluate("1+1")',
  'parse("1")',
  'simplify("x+x")',
  'derivative("x^2", "x")',
  'createUnit("foo")',
  'config({})',
  'typed("f", {})',
  'f(x) = x^2',
  'u = 5',
  'u == 1',
  'x := 3',
  '1; 2',
  '1\n2',
  '[1, 2, 3]',
  '[1:1e9]',
  '1:1000000000',
  'ones(1e9)',
  'range(0, 1e9)',
  '1e9!',
  'factorial(170)',
  '5 cm',
  '5 cm to inch',
  '3 mod 2',
  '7 % 3',
  'not 1',
  'true',
  'null',
  'NaN',
  'Infinity',
  '1/Infinity',
  '1 ? 2 : 3',
  'u and x',
  '1 | 2',
  '1 << 40',
  "u'",
  '{a: 1}',
  '{}.constructor',
  '"text"',
  '`${u}`',
  'sqrt(-1)',
  '1e999',
  '9^9^9^9',
  'tan',
  'sin cos',
  '((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((',
  '0b11',
  '0xFFFFFFFF',
  '1_000',
  'x\u0000',
  'ｕ',
  '<img src=x>',
  '$(id)',
  '../../etc/passwd',
  '=cmd()',
];

describe('hostile texts', () => {
  it.each(hostile)('refuses %j with a message', (text) => {
    const result = evaluateExpression(text, scope);
    expect(result.ok).toBe(false);
    expect(result.ok ? '' : result.message).toMatch(/[.…)]$/);
  });

  it('refuses names of the object prototype in an empty scope', () => {
    for (const name of Object.getOwnPropertyNames(Object.prototype)) {
      expect(evaluateExpression(name, {}).ok).toBe(false);
    }
  });
});

interface Sum {
  readonly text: string;
  readonly value: number;
}

const operators: Readonly<Record<string, (a: number, b: number) => number>> = {
  '+': (a, b) => a + b,
  '-': (a, b) => a - b,
  '*': (a, b) => a * b,
  '/': (a, b) => a / b,
};

/** Fully bracketed sums with the value that JavaScript's own arithmetic gives. */
const { sum } = fc.letrec<{ sum: Sum }>((tie) => ({
  sum: fc.oneof(
    { depthSize: 'small', maxDepth: 3 },
    fc.integer({ min: 0, max: 99 }).map((n) => ({ text: String(n), value: n })),
    fc
      .double({ min: 0, max: 10, noNaN: true })
      .map((n) => Number(n.toFixed(3)))
      .map((n) => ({ text: String(n), value: n })),
    fc
      .record({ a: tie('sum'), b: tie('sum'), op: fc.constantFrom(...Object.keys(operators)) })
      .map(({ a, b, op }) => ({
        text: `(${a.text} ${op} ${b.text})`,
        value: operators[op]!(a.value, b.value),
      })),
  ),
}));

describe('properties', () => {
  it('agrees with direct evaluation', () => {
    fc.assert(
      fc.property(sum, ({ text, value }) => {
        fc.pre(text.length <= cellLimits.expressionLength);
        const result = evaluateExpression(text, {});
        if (result.ok) {
          expect(result.value).toBe(value === 0 ? 0 : value);
        } else {
          // Only a division by zero somewhere inside, or too many parts.
          expect(result.message).toMatch(/no finite value|too long/);
          expect(text).toMatch(/\//);
        }
      }),
      { numRuns: 1000 },
    );
  });

  it('never throws and never gives a value that is not finite', () => {
    const alphabet = [...'0123456789.+-*/^()eEuxpi ,_sqrtcodeg'];
    const noise = fc.oneof(
      fc.string({ maxLength: 140 }),
      fc.string({ unit: 'binary', maxLength: 40 }),
      fc.array(fc.constantFrom(...alphabet), { maxLength: 60 }).map((part) => part.join('')),
    );
    fc.assert(
      fc.property(noise, (text) => {
        const result = evaluateExpression(text, scope);
        expect(result.ok ? Number.isFinite(result.value) : result.message.length > 0).toBe(true);
      }),
      { numRuns: 3000 },
    );
  });

  it('reads every double back as it was', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        expect(valueOf(String(value))).toBe(value === 0 ? 0 : value);
      }),
    );
  });
});
