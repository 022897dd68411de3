import type { MathNode } from 'mathjs/number';

import type { FieldProblem } from '#common/errors/problem';
import { parseArithmetic } from '#common/expressions/arithmetic';
import { cellLimits, type CellParameter } from '#common/schemas/cell';

/** A value, or what is wrong and how to mend it. */
export type ExpressionResult =
  { readonly ok: true; readonly value: number } | { readonly ok: false; readonly message: string };

const nodeLimit = 60;
const characters = /^[A-Za-z0-9_.+\-*/^(), \t]$/;
const plainNumber = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;
const otherBases = /(^|[^A-Za-z0-9_.])0[xXoObB]/;

const functions: Readonly<Record<string, (value: number) => number>> = {
  sqrt: Math.sqrt,
  cbrt: Math.cbrt,
  abs: Math.abs,
  sin: Math.sin,
  cos: Math.cos,
  tan: Math.tan,
  asin: Math.asin,
  acos: Math.acos,
  atan: Math.atan,
};

/** Names with a meaning of their own: π, and one degree in radians (`cos(30*deg)`). */
const constants: Readonly<Record<string, number>> = { pi: Math.PI, deg: Math.PI / 180 };

const binary: Readonly<Record<string, (a: number, b: number) => number>> = {
  '+': (a, b) => a + b,
  '-': (a, b) => a - b,
  '*': (a, b) => a * b,
  '/': (a, b) => a / b,
  '^': (a, b) => a ** b,
};

/** Words the parser reads as something else than a name. */
const parserWords = 'true false null undefined NaN Infinity mod to in and or xor not end'.split(
  ' ',
);

/** Names that a parameter can't take. */
const reservedNames: ReadonlySet<string> = new Set([
  ...Object.keys(functions),
  ...Object.keys(constants),
  ...parserWords,
]);

/** What went wrong in a text, worded for the person who typed it. */
class ExpressionFault extends Error {}

type Values = Readonly<Record<string, number>>;

/** What names stand for while an expression is worked out. */
interface Scope {
  readonly values: Values;
  /** Parameters that exist but have no value, because something is wrong with them. */
  readonly broken: ReadonlySet<string>;
}

const none: ReadonlySet<string> = new Set();

/** The parts of mathjs's nodes we look at, after their type has been checked. */
interface Looked {
  readonly type: string;
  readonly value?: unknown;
  readonly name?: string;
  readonly op?: string;
  readonly implicit?: boolean;
  readonly content?: MathNode;
  readonly args?: readonly MathNode[];
  readonly fn?: { readonly name?: string; readonly type?: string };
}

/** Refuses infinity on the way too, or 1/(1/0) would pass for 0. */
function finite(value: number): number {
  if (!Number.isFinite(value)) {
    throw new ExpressionFault(
      'This has no finite value: look for a division by zero or a root of a negative number.',
    );
  }
  return value;
}

function valueOfName(name: string, scope: Scope): number {
  if (Object.hasOwn(scope.values, name)) {
    return scope.values[name]!;
  }
  if (scope.broken.has(name)) {
    throw new ExpressionFault(`${name} has no value yet: mend that parameter first.`);
  }
  if (Object.hasOwn(constants, name)) {
    return constants[name]!;
  }
  if (Object.hasOwn(functions, name)) {
    throw new ExpressionFault(`${name} is a function: write ${name}(…).`);
  }
  throw new ExpressionFault(`Unknown name ${name}: add it as a parameter or write a number.`);
}

function valueOfCall(node: Looked, scope: Scope): number {
  const name = node.fn?.type === 'SymbolNode' ? (node.fn.name ?? '') : '';
  if (!Object.hasOwn(functions, name)) {
    throw new ExpressionFault(
      `There is no function ${name || 'like this'}: use ${Object.keys(functions).join(', ')}.`,
    );
  }
  if (node.args?.length !== 1) {
    throw new ExpressionFault(`${name} takes one number: write ${name}(…).`);
  }
  return finite(functions[name]!(valueOf(node.args[0]!, scope)));
}

function valueOfOperator(node: Looked, scope: Scope): number {
  if (node.implicit) {
    throw new ExpressionFault('Write the product out: 2*u, not 2u.');
  }
  const args = node.args ?? [];
  if (args.length === 1 && (node.op === '-' || node.op === '+')) {
    const value = valueOf(args[0]!, scope);
    return node.op === '-' ? -value : value;
  }
  const apply = Object.hasOwn(binary, node.op ?? '') ? binary[node.op!] : undefined;
  if (apply === undefined || args.length !== 2) {
    throw new ExpressionFault('Use only + − * / ^ and parentheses.');
  }
  return finite(apply(valueOf(args[0]!, scope), valueOf(args[1]!, scope)));
}

/** Walks the parsed tree; every kind of node that is not listed here is refused. */
function valueOf(mathNode: MathNode, scope: Scope): number {
  const node = mathNode as unknown as Looked;
  switch (node.type) {
    case 'ConstantNode':
      if (typeof node.value !== 'number') {
        throw new ExpressionFault('Only numbers, parameters and + − * / ^ are understood here.');
      }
      return finite(node.value);
    case 'ParenthesisNode':
      return valueOf(node.content!, scope);
    case 'SymbolNode':
      return valueOfName(node.name ?? '', scope);
    case 'OperatorNode':
      return valueOfOperator(node, scope);
    case 'FunctionNode':
      return valueOfCall(node, scope);
    default:
      throw new ExpressionFault('Only numbers, parameters and + − * / ^ are understood here.');
  }
}

/** The text in plain characters, if it keeps the limits. */
function readable(text: string): string {
  if (text.length > cellLimits.expressionLength) {
    throw new ExpressionFault(`Use at most ${cellLimits.expressionLength} characters.`);
  }
  const plain = text.replaceAll('−', '-').trim();
  if (plain === '') {
    throw new ExpressionFault('Write a number or an expression such as 1/3.');
  }
  if (/^[+-]?\d+,\d+$/.test(plain)) {
    throw new ExpressionFault('Use a point, not a comma, in a decimal number.');
  }
  const stranger = [...plain].find((character) => !characters.test(character));
  if (stranger !== undefined) {
    throw new ExpressionFault(
      `“${stranger}” is not understood here: use numbers, parameters and + − * / ^.`,
    );
  }
  if (otherBases.test(plain)) {
    throw new ExpressionFault('Write the number in decimal digits.');
  }
  return plain;
}

/** The parsed tree of a text that keeps the limits. */
function parse(plain: string): MathNode {
  let tree: MathNode;
  try {
    tree = parseArithmetic(plain);
  } catch {
    throw new ExpressionFault(
      `“${plain}” can’t be read: look for a missing number, sign or parenthesis.`,
    );
  }
  let nodes = 0;
  tree.traverse(() => {
    nodes += 1;
  });
  if (nodes > nodeLimit) {
    throw new ExpressionFault('This is too long: put a part of it into a parameter.');
  }
  return tree;
}

function evaluate(text: string, scope: Scope): number {
  const plain = readable(text);
  // Most cells hold plain numbers; they need no tree.
  return plainNumber.test(plain) ? finite(Number(plain)) : valueOf(parse(plain), scope);
}

/**
 * The value of a number or formula as typed: `1/3`, `u`, `1/2 - u`, `sqrt(3)/2`.
 * Angles in radians (`cos(30*deg)` for degrees). Never throws and never gives a value that is not finite.
 *
 * @param text what the person typed
 * @param values values of the cell's parameters by name
 * @param broken names of parameters that have no value because they are at fault themselves
 */
export function evaluateExpression(
  text: string,
  values: Values,
  broken: ReadonlySet<string> = none,
): ExpressionResult {
  try {
    const value = evaluate(text, { values, broken });
    return { ok: true, value: value === 0 ? 0 : value };
  } catch (fault) {
    if (fault instanceof ExpressionFault) {
      return { ok: false, message: fault.message };
    }
    throw fault;
  }
}

/** Names a text refers to that are not constants or functions; empty if it can't be read. */
function namesIn(text: string): string[] {
  try {
    const names = new Set<string>();
    parse(readable(text)).traverse((node) => {
      const looked = node as unknown as Looked;
      if (looked.type === 'SymbolNode' && looked.name && !reservedNames.has(looked.name)) {
        names.add(looked.name);
      }
    });
    return [...names];
  } catch (fault) {
    if (fault instanceof ExpressionFault) {
      return [];
    }
    throw fault;
  }
}

const namePattern = /^[A-Za-z][A-Za-z0-9_]*$/;

function nameProblem(parameters: readonly CellParameter[], index: number): string | null {
  const { name } = parameters[index]!;
  if (!namePattern.test(name)) {
    return 'Start the name with a letter; letters, digits and _ may follow.';
  }
  if (reservedNames.has(name)) {
    return `${name} has a meaning of its own: choose another name.`;
  }
  if (parameters.findIndex((other) => other.name === name) !== index) {
    return `There are two parameters called ${name}: rename one.`;
  }
  return null;
}

/** Parameters by name, with a problem for each name that can't be used. */
function indexByName(
  parameters: readonly CellParameter[],
  problems: FieldProblem[],
): ReadonlyMap<string, number> {
  const byName = new Map<string, number>();
  parameters.forEach((parameter, index) => {
    const message = nameProblem(parameters, index);
    if (message === null) {
      byName.set(parameter.name, index);
    } else {
      problems.push({ code: 'cell.parameter_name', field: `parameters.${index}.name`, message });
    }
  });
  return byName;
}

/** Values of parameters, and what was wrong with those that have none. */
export interface ParameterValues {
  readonly values: Record<string, number>;
  readonly problems: FieldProblem[];
  /** Names of parameters without a value, for messages of what uses them. */
  readonly broken: ReadonlySet<string>;
}

/**
 * Values of a cell's parameters, which may refer to each other in any order.
 *
 * @returns the values that could be worked out, and a problem per field: `parameters.1.expression`.
 *   A circle is named by its members.
 */
export function evaluateParameters(parameters: readonly CellParameter[]): ParameterValues {
  const values: Record<string, number> = {};
  const problems: FieldProblem[] = [];
  const broken = new Set<string>();
  const byName = indexByName(parameters, problems);
  const fail = (name: string, code: string, message: string): void => {
    broken.add(name);
    problems.push({ code, field: `parameters.${byName.get(name)!}.expression`, message });
  };
  const visit = (name: string, path: readonly string[]): void => {
    if (!byName.has(name) || broken.has(name) || Object.hasOwn(values, name)) {
      return;
    }
    if (path.includes(name)) {
      const members = path.slice(path.indexOf(name));
      const circle = [...members, name].join(' → ');
      const message = `Parameters refer to each other in a circle (${circle}): give one a number.`;
      members.forEach((member) => fail(member, 'cell.parameter_cycle', message));
      return;
    }
    const { expression } = parameters[byName.get(name)!]!;
    namesIn(expression).forEach((other) => visit(other, [...path, name]));
    if (broken.has(name)) {
      return;
    }
    const result = evaluateExpression(expression, values, broken);
    if (result.ok) {
      values[name] = result.value;
    } else {
      fail(name, 'cell.expression', result.message);
    }
  };
  byName.forEach((_, name) => visit(name, []));
  return { values, problems, broken };
}
