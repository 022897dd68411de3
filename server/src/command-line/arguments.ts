import { parseArgs } from 'node:util';

import { evaluationMethod, type EvaluationMethod } from '#common/schemas/cell';
import { energeticsLimits, type RepulsionModel } from '#common/schemas/energetics';

/** What was asked on the command line. */
export interface EvaluateArguments {
  readonly files: readonly string[];
  /** Charges by element or site label, in elementary charges. */
  readonly charges: ReadonlyMap<string, number>;
  readonly method: EvaluationMethod;
  /** Null: electrostatics only. */
  readonly repulsion: RepulsionModel | null;
}

/** A call that can't be understood; the message is for the person who typed it. */
export class UsageError extends Error {}

export const usage = `Usage: npm run --silent evaluate -- FILE.cif [FILE…] [--charges Na=1,Cl=-1] [--tolerance 1e-12]
       [--repulsion born-lande|born-mayer [--exponent n] [--rho Å]]

Prints one JSON object a line, one line a file.
  --charges    charges by element or by site label; a label wins over its element
  --tolerance  relative tolerance, 1e-13 to 1e-4 (default 1e-10)
  --repulsion  adds lattice energy, bulk modulus, Kapustinskii’s estimate and checks
  --exponent   Born exponent for born-lande, 2 to 30 (default: mean over the ions)
  --rho        hardness in Å for born-mayer, 0.01 to 2 (default 0.345)`;

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
    repulsion: readRepulsion(values),
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
        repulsion: { type: 'string' },
        exponent: { type: 'string' },
        rho: { type: 'string' },
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

/** A hardness that serves many salts, Å; common practice. */
const usualHardnessA = 0.345;

interface RepulsionTexts {
  readonly repulsion?: string | undefined;
  readonly exponent?: string | undefined;
  readonly rho?: string | undefined;
}

function readWithin(option: string, text: string, { low, high }: { low: number; high: number }) {
  const value = text.trim() === '' ? NaN : Number(text);
  if (!(value >= low && value <= high)) {
    throw new UsageError(`--${option}: “${text}” is no number from ${low} to ${high}.`);
  }
  return { low: value, high: value };
}

function readRepulsion({ repulsion, exponent, rho }: RepulsionTexts): RepulsionModel | null {
  if (exponent !== undefined && repulsion !== 'born-lande') {
    throw new UsageError('--exponent goes with --repulsion born-lande.');
  }
  if (rho !== undefined && repulsion !== 'born-mayer') {
    throw new UsageError('--rho goes with --repulsion born-mayer.');
  }
  switch (repulsion) {
    case undefined:
      return null;
    case 'born-lande':
      return {
        kind: 'born_lande',
        exponent:
          exponent === undefined
            ? { from: 'ions' }
            : {
                from: 'typed',
                exponent: readWithin('exponent', exponent, energeticsLimits.exponent),
              },
      };
    case 'born-mayer':
      return {
        kind: 'born_mayer',
        hardnessA: readWithin('rho', rho ?? String(usualHardnessA), energeticsLimits.hardnessA),
      };
    default:
      throw new UsageError(`--repulsion: “${repulsion}” is neither born-lande nor born-mayer.`);
  }
}
