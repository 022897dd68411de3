import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';

import {
  hall_symbol_entry,
  initSync,
  operations_from_number,
  space_group_type,
  type MoyoHallSymbolEntry,
  type MoyoOperation,
} from '@spglib/moyo-wasm';

import { determinant } from '#common/physics/cell-metric';
import {
  crystalSystem,
  type SpaceGroupSetting,
  type SymmetryOperation,
} from '#common/schemas/symmetry';

/** A setting, its operations and every name it is known by. */
export interface TabulatedSetting {
  readonly setting: SpaceGroupSetting;
  readonly operations: readonly SymmetryOperation[];
  /** Full Hermann–Mauguin symbol with spaces: `F 4/m -3 2/m`. */
  readonly fullSymbol: string;
}

const settingCount = 530;

/** The package prints Hall number 331 as `B b c b`; its three sisters carry the double glide `e`. */
const correctedSymbols: Readonly<Record<number, string>> = { 331: 'B b e b' };

/**
 * Reads all 530 settings of the 230 space groups with their operations.
 *
 * Everything is read once, from fixed Hall numbers; nothing a person types ever reaches the
 * WebAssembly module, so no input can make it panic.
 * @throws Error if the package's tables are not what is expected of them
 */
export function readTabulatedSettings(): readonly TabulatedSetting[] {
  const require = createRequire(import.meta.url);
  const wasm = readFileSync(require.resolve('@spglib/moyo-wasm/moyo_wasm_bg.wasm'));
  initSync({ module: wasm });
  return Array.from({ length: settingCount }, (_, index) => readSetting(index + 1));
}

function readSetting(hallNumber: number): TabulatedSetting {
  const entry = hall_symbol_entry(hallNumber);
  const operations = operations_from_number(
    entry.number,
    { type: 'HallNumber', value: hallNumber },
    false,
  ).map(toOperation);
  return { setting: describe(entry), operations, fullSymbol: plainSymbol(entry.hm_full) };
}

function describe(entry: MoyoHallSymbolEntry): SpaceGroupSetting {
  const system = crystalSystem.parse(space_group_type(entry.number).crystal_system.toLowerCase());
  const uniqueAxis = system === 'monoclinic' ? uniqueAxisOf(entry.setting) : null;
  return {
    hallNumber: entry.hall_number,
    number: entry.number,
    symbol: shortSymbol(entry, uniqueAxis),
    hallSymbol: entry.hall_symbol,
    setting: entry.setting,
    crystalSystem: system,
    hexagonalAxes: system === 'hexagonal' || (system === 'trigonal' && entry.setting !== 'R'),
    uniqueAxis,
    isStandard: ['', '2', 'H', 'b', 'b1'].includes(entry.setting),
  };
}

function uniqueAxisOf(code: string): 'a' | 'b' | 'c' {
  const axis = code.replace('-', '').charAt(0);
  if (axis !== 'a' && axis !== 'b' && axis !== 'c') {
    throw new Error(`No unique axis in the setting code “${code}”.`);
  }
  return axis;
}

/**
 * Unique axis b is the convention, so its symbols drop the 1s (`P 21/n`); other axes keep them
 * (`P 1 1 21/b`), or one symbol would stand for several settings.
 */
function shortSymbol(entry: MoyoHallSymbolEntry, uniqueAxis: 'a' | 'b' | 'c' | null): string {
  if (uniqueAxis === null) {
    return plainSymbol(correctedSymbols[entry.hall_number] ?? entry.hm_short);
  }
  const full = plainSymbol(entry.hm_full);
  return uniqueAxis === 'b' ? full.replace(/ 1(?= |$)/g, '') : full;
}

/** Screw axes as the tables print them in plain text: `P 2_1/c` → `P 21/c`. */
function plainSymbol(symbol: string): string {
  return symbol.replaceAll('_', '');
}

/**
 * The package hands out W column by column; ours is row-major. Translations of the tabulated
 * operations are multiples of 1/24: take the exact multiple.
 */
function toOperation({ rotation, translation }: MoyoOperation): SymmetryOperation {
  const r = rotation;
  const rowMajor = [r[0], r[3], r[6], r[1], r[4], r[7], r[2], r[5], r[8]];
  if (Math.abs(determinant(rowMajor)) !== 1) {
    throw new Error('A tabulated rotation has a determinant other than ±1.');
  }
  return { rotation: rowMajor, translation: translation.map(exactTwentyFourths) };
}

function exactTwentyFourths(value: number): number {
  const count = Math.round(value * 24);
  if (Math.abs(value * 24 - count) > 1e-6) {
    throw new Error(`A tabulated translation ${value} is no multiple of 1/24.`);
  }
  return (((count % 24) + 24) % 24) / 24;
}
