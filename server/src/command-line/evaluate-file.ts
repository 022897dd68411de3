import { readFile } from 'node:fs/promises';
import path from 'node:path';

import { Problem, type FieldProblem } from '#common/errors/problem';
import type { ErrorCode } from '#common/errors/error-codes';
import { noOverrides } from '#common/chemistry/sourced';
import type { CheckResult } from '#common/physics/checks/check-result';
import { judge } from '#common/physics/checks/judge';
import { energeticsOf } from '#common/physics/energetics/energetics-account';
import { resolveCell } from '#common/physics/resolve-cell';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { CellDefinition } from '#common/schemas/cell';
import { defaultEnergeticModel, type RepulsionModel } from '#common/schemas/energetics';
import type { EvaluationResult, Warning } from '#common/schemas/evaluation';
import { completeCharges, type CompletedCharges } from '#server/cif/complete-charges';
import { readStructure, type ReadStructure } from '#server/cif/read-structure';
import { evaluateCell } from '#server/electrostatics/evaluate-cell';
import { symmetryOf } from '#server/symmetry/space-groups';

import type { EvaluateArguments } from './arguments.js';

/** One line of output for a file that was evaluated. */
export interface EvaluatedFile {
  readonly file: string;
  readonly ok: true;
  readonly formula: string;
  readonly formulaUnitsPerCell: number;
  readonly sitesPerCell: number;
  readonly volumeA3: number;
  readonly spaceGroupNumber: number | null;
  readonly shortestDistanceA: number;
  readonly energyEvPerFormulaUnit: number;
  /** The four conventions; null where one means nothing for the compound. */
  readonly madelung: Readonly<Record<keyof EvaluationResult['madelung'], number | null>>;
  readonly siteCharges: Readonly<Record<string, number>>;
  readonly relativeErrorBound: number;
  readonly warnings: readonly Warning[];
}

/** What a repulsion model adds; null where it gives no number. */
export interface EnergeticsOfFile {
  readonly latticeEnergyKjPerMol: number | null;
  readonly bulkModulusGpa: number | null;
  readonly kapustinskiiKjPerMol: number | null;
  readonly checks: readonly Pick<CheckResult, 'key' | 'word' | 'value' | 'finding'>[];
}

/** One line of output for a file that was not. */
export interface FailedFile {
  readonly file: string;
  readonly ok: false;
  readonly error: { readonly code: ErrorCode; readonly message: string; readonly line?: number };
}

const largestFileBytes = 50_000_000;

/**
 * Evaluates one CIF file. Never rejects: whatever goes wrong is the file's own result.
 * @param file as typed
 * @param folder what a relative name is relative to
 * @param onUnexpected told about failures that are no {@link Problem}, so that none goes unseen
 */
export async function evaluateFile(
  file: string,
  folder: string,
  { charges, method, repulsion }: Pick<EvaluateArguments, 'charges' | 'method' | 'repulsion'>,
  onUnexpected: (error: unknown) => void,
): Promise<(EvaluatedFile & Partial<EnergeticsOfFile>) | FailedFile> {
  try {
    const structure = readStructure(await readText(path.resolve(folder, file)));
    const completed = completeCharges(structure, charges);
    const { cell, warnings } = completed;
    const symmetry = symmetryOf(cell.symmetry);
    const { cell: resolved, problems } = resolveCell(cell, symmetry);
    if (!resolved) {
      throw asProblem(problems, structure);
    }
    requireCharges(completed);
    const result = evaluateCell(resolved, method, {
      spaceGroupNumber: symmetry.setting?.number ?? null,
      spaceGroupSymbol: symmetry.setting?.symbol ?? null,
    });
    const line = present(file, cell, result, [...structure.warnings, ...warnings]);
    return repulsion === null ? line : { ...line, ...energetics(resolved, result, repulsion) };
  } catch (error) {
    return { file, ok: false, error: describe(error, onUnexpected) };
  }
}

function energetics(
  cell: ResolvedCell,
  result: EvaluationResult,
  repulsion: RepulsionModel,
): EnergeticsOfFile {
  const model = { ...defaultEnergeticModel, repulsion };
  const account = energeticsOf(cell, result, model, noOverrides);
  const { checks } = judge(cell, result, model, noOverrides);
  return {
    latticeEnergyKjPerMol: account.latticeEnergyKjPerMol?.low ?? null,
    bulkModulusGpa: account.bulkModulusGpa?.low ?? null,
    kapustinskiiKjPerMol: account.kapustinskii.energyKjPerMol,
    checks: checks.map(({ key, word, value, finding }) => ({ key, word, value, finding })),
  };
}

async function readText(fullPath: string): Promise<string> {
  try {
    const bytes = await readFile(fullPath);
    if (bytes.length > largestFileBytes) {
      throw new Problem('file.unreadable', `The file is larger than ${largestFileBytes / 1e6} MB.`);
    }
    // Older files hold Latin-1 names; no byte of theirs may stop the reading of plain numbers.
    return new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes);
  } catch (error) {
    if (error instanceof Error && 'code' in error && !(error instanceof Problem)) {
      throw new Problem('file.unreadable', unreadable(String(error.code)));
    }
    throw error;
  }
}

function unreadable(code: string): string {
  switch (code) {
    case 'ENOENT':
      return 'There is no such file.';
    case 'EISDIR':
      return 'This is a folder, not a file.';
    case 'EACCES':
      return 'You may not read this file.';
    default:
      return `The file can’t be read (${code}).`;
  }
}

/** The first thing wrong with a cell, with the line of the site it is about. */
function asProblem(problems: readonly FieldProblem[], { siteLines }: ReadStructure): Problem {
  const first = problems[0];
  if (!first) {
    return new Problem('evaluation.failed', 'The cell could not be made out.');
  }
  const site = /^sites\.(\d+)/.exec(first.field)?.[1];
  const line = site === undefined ? undefined : siteLines[Number(site)];
  return new Problem(first.code as ErrorCode, first.message, line === undefined ? {} : { line });
}

function requireCharges({ missing, choices }: CompletedCharges): void {
  if (missing.length === 0) {
    return;
  }
  const names = missing.join(', ');
  const option = missing.map((element) => `${element}=…`).join(',');
  throw new Problem(
    'cif.charges_needed',
    choices.length === 0
      ? `The file gives no oxidation numbers for ${names}, and common ones leave no neutral choice. Give them: --charges ${option}`
      : `The file gives no oxidation numbers for ${names}, and several choices are neutral. Give one: --charges ${choices.join(' or ')}`,
  );
}

function describe(error: unknown, onUnexpected: (error: unknown) => void): FailedFile['error'] {
  if (!(error instanceof Problem)) {
    onUnexpected(error);
    return { code: 'evaluation.failed', message: 'The computation stopped unexpectedly.' };
  }
  const line = error.details?.line;
  return { code: error.code, message: error.message, ...(line === undefined ? {} : { line }) };
}

function present(
  file: string,
  cell: CellDefinition,
  result: EvaluationResult,
  warnings: readonly Warning[],
): EvaluatedFile {
  const { perDistance, perCharge, reduced, perEdge } = result.madelung;
  return {
    file,
    ok: true,
    formula: result.formula,
    formulaUnitsPerCell: result.formulaUnitsPerCell,
    sitesPerCell: result.sitesPerCell,
    volumeA3: result.volumeA3,
    spaceGroupNumber: result.spaceGroupNumber,
    shortestDistanceA: result.shortestDistanceA,
    energyEvPerFormulaUnit: result.energyEvPerFormulaUnit.value,
    madelung: {
      perDistance: perDistance.value,
      perCharge: perCharge.value,
      reduced: reduced.value,
      perEdge: perEdge.value,
    },
    siteCharges: Object.fromEntries(cell.sites.map(({ label, charge }) => [label, Number(charge)])),
    relativeErrorBound: result.relativeErrorBound,
    warnings: [...warnings, ...result.warnings],
  };
}
