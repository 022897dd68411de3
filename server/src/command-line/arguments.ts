import { parseArgs } from 'node:util';

import { evaluationMethod, type EvaluationMethod } from '#common/schemas/cell';

/** What was asked on the command line. */
export interface EvaluateArguments {
  readonly files: readonly string[];
  /** Charges by element or site label, in elementary charges. */
  readonly charges: ReadonlyMap<string, number>;
  readonly method: EvaluationMethod;
}

/** A call that can't be understood; the message is for the person who typed it. */
export class UsageError extends Error {}

export const usage = `Usage: npm run --silent evaluate -- FILE.cif [FILE…] [--charges Na=1,Cl=-1] [--tolerance 1e-12]

Prints one JSON object a line, one line a file.
  --charges    charges by element or by site label; a label wins over its element
  --tolerance  relative tolerance, 1e-13 to 1e-4 (default 1e-10)`;

/**
 * Reads the command line.
 * @throws UsageError
 */
export function readArguments(args: readonly string[]): EvaluateArguments {
  const { values, positionals } = parse(args);
  if (positionals.length === 0) {
    throw new UsageError('Name at least one CIF file.');
  }
  return {
    files: positionals,
    charges: readCharges(values.charges ?? []),
    method: readMethod(values.tolerance),
  };
}

function parse(args: readonly string[]) {
  try {
    return parseArgs({
      args: [...args],
      allowPositionals: true,
      options: {
        charges: { type: 'string', multiple: true },
        tolerance: { type: 'string' },
      },
    });
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

function readCharges(texts: readonly string[]): Map<string, number> {
  const charges = new Map<string, number>();
  for (const part of texts.flatMap((text) => text.split(','))) {
    const match = /^\s*([^\s=]+)\s*=\s*([+-]?(?:\d+\.?\d*|\.\d+))\s*$/.exec(part);
    const charge = Number(match?.[2]);
    if (!match || Math.abs(charge) > 9) {
      throw new UsageError(
        `--charges: “${part}” is not of the form Na=1, with a charge between -9 and 9.`,
      );
    }
    if (charges.has(match[1]!)) {
      throw new UsageError(`--charges: ${match[1]!} is given twice.`);
    }
    charges.set(match[1]!, charge);
  }
  return charges;
}

function readMethod(tolerance: string | undefined): EvaluationMethod {
  const asked = tolerance === undefined ? {} : { toleranceRelative: Number(tolerance || NaN) };
  const method = evaluationMethod.safeParse(asked);
  if (!method.success) {
    throw new UsageError(`--tolerance: “${tolerance ?? ''}” is no number from 1e-13 to 1e-4.`);
  }
  return method.data;
}
