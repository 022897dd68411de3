import { create, parseDependencies, type MathNode } from 'mathjs/number';

// Only the parser: nothing that evaluates, so nothing a text could reach.
const { parse } = create({ ...parseDependencies });

/** Parses an arithmetic text to mathjs's tree, without any way to evaluate it. */
export function parseArithmetic(text: string): MathNode {
  return parse(text);
}
