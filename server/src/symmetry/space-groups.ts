import { parseOperation } from '#common/physics/symmetry-operation';
import { Problem } from '#common/errors/problem';
import type { CellSymmetry } from '#common/schemas/cell';
import type { SpaceGroupSetting, SymmetryOperation } from '#common/schemas/symmetry';

import { operationSetKey } from './operation-key.js';
import { readSymbol, symbolKeysOf } from './symbol-names.js';
import { readTabulatedSettings, type TabulatedSetting } from './tabulated-settings.js';

interface SpaceGroups {
  readonly settings: readonly TabulatedSetting[];
  readonly bySymbol: ReadonlyMap<string, readonly SpaceGroupSetting[]>;
  readonly byOperations: ReadonlyMap<string, SpaceGroupSetting>;
  readonly byHallSymbol: ReadonlyMap<string, SpaceGroupSetting>;
}

let loaded: SpaceGroups | null = null;

/** Reads the tables once (about 0.1 s); every other function here does so on first use. */
export function loadSpaceGroups(): SpaceGroups {
  loaded ??= index(readTabulatedSettings());
  return loaded;
}

function index(settings: readonly TabulatedSetting[]): SpaceGroups {
  const bySymbol = new Map<string, SpaceGroupSetting[]>();
  const byOperations = new Map<string, SpaceGroupSetting>();
  const byHallSymbol = new Map<string, SpaceGroupSetting>();
  // Conventional settings first, so that the first candidate of an ambiguous name is the usual one.
  const usualFirst = [...settings].sort(
    (a, b) =>
      Number(b.setting.isStandard) - Number(a.setting.isStandard) ||
      rankOfAxis(a.setting) - rankOfAxis(b.setting) ||
      a.setting.hallNumber - b.setting.hallNumber,
  );
  for (const tabulated of usualFirst) {
    const { setting, operations } = tabulated;
    for (const key of symbolKeysOf(tabulated)) {
      bySymbol.set(key, [...(bySymbol.get(key) ?? []), setting]);
    }
    const operationsKey = operationSetKey(operations)!;
    byOperations.set(operationsKey, byOperations.get(operationsKey) ?? setting);
    const hallKey = hallSymbolKey(setting.hallSymbol);
    byHallSymbol.set(hallKey, byHallSymbol.get(hallKey) ?? setting);
  }
  return { settings, bySymbol, byOperations, byHallSymbol };
}

function rankOfAxis({ uniqueAxis }: SpaceGroupSetting): number {
  return uniqueAxis === null ? 0 : 'bca'.indexOf(uniqueAxis);
}

/** Axis marks are optional in a Hall symbol (`-P 2yc` and `-P 2yc`), quotes and spaces vary. */
function hallSymbolKey(symbol: string): string {
  return symbol
    .trim()
    .replace(/_/g, ' ')
    .replace(/["“”′]/g, '=')
    .replace(/\s+/g, ' ')
    .toLowerCase();
}

/** The 530 tabulated settings in the order of their Hall numbers. */
export function listSettings(): readonly SpaceGroupSetting[] {
  return loadSpaceGroups().settings.map(({ setting }) => setting);
}

/** The setting of a Hall number 1…530, or null. */
export function findSetting(hallNumber: number): SpaceGroupSetting | null {
  return tabulated(hallNumber)?.setting ?? null;
}

function tabulated(hallNumber: number): TabulatedSetting | undefined {
  return Number.isInteger(hallNumber) ? loadSpaceGroups().settings[hallNumber - 1] : undefined;
}

/**
 * All operations of a setting, centring included, translations in [0, 1).
 * @throws Problem `cell.space_group` for a number outside 1…530
 */
export function operationsOf(hallNumber: number): readonly SymmetryOperation[] {
  const found = tabulated(hallNumber);
  if (!found) {
    throw new Problem('cell.space_group', `There is no Hall number ${hallNumber}; use 1 to 530.`);
  }
  return found.operations;
}

/** The conventional setting of an International Tables number 1…230, or null. */
export function findByNumber(number: number): SpaceGroupSetting | null {
  return settingsOfNumber(number).find(({ isStandard }) => isStandard) ?? null;
}

/** All settings of an International Tables number, the conventional one first. */
export function settingsOfNumber(number: number): readonly SpaceGroupSetting[] {
  return listSettings()
    .filter((setting) => setting.number === number)
    .sort((a, b) => Number(b.isStandard) - Number(a.isStandard));
}

/**
 * The settings a Hermann–Mauguin symbol may stand for, the conventional one first; empty when there
 * is no such symbol. Spaces don't matter, full symbols and symbols of older tables are known, and a
 * mark behind the symbol (`:1`, `:2`, `:H`, `:R`, `:b2`) narrows the choice.
 */
export function findBySymbol(symbol: string): readonly SpaceGroupSetting[] {
  const { key, mark } = readSymbol(symbol);
  const found = loadSpaceGroups().bySymbol.get(key) ?? [];
  return mark === null ? found : found.filter((setting) => carriesMark(setting, mark));
}

/** Origin choices of settings with other axes are written `2cab`; the mark `2` covers them. */
function carriesMark({ setting }: SpaceGroupSetting, mark: string): boolean {
  return setting === mark || (/^[12]$/.test(mark) && setting.startsWith(mark));
}

/** The setting of a Hall symbol as tabulated (`-F 4 2 3`), or null. */
export function findByHallSymbol(symbol: string): SpaceGroupSetting | null {
  return loadSpaceGroups().byHallSymbol.get(hallSymbolKey(symbol)) ?? null;
}

/** The tabulated setting with exactly these operations in any order, or null. */
export function matchOperations(
  operations: readonly SymmetryOperation[],
): SpaceGroupSetting | null {
  const key = operationSetKey(operations);
  return key === null ? null : (loadSpaceGroups().byOperations.get(key) ?? null);
}

/**
 * What a cell's symmetry means: its operations, and the tabulated setting if they are one.
 * @throws Problem `cell.space_group` for an unknown setting, `cell.operation` for an unreadable one
 */
export function symmetryOf(symmetry: CellSymmetry): {
  operations: readonly SymmetryOperation[];
  setting: SpaceGroupSetting | null;
} {
  if (symmetry.kind === 'setting') {
    const operations = operationsOf(symmetry.hallNumber);
    return { operations, setting: findSetting(symmetry.hallNumber) };
  }
  const operations = symmetry.operations.map((text) => parseOperation(text));
  return { operations, setting: matchOperations(operations) };
}
