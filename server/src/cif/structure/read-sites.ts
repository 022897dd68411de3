import { Problem } from '#common/errors/problem';
import { cartesianToFractional, cellVectors } from '#common/physics/cell-metric';
import { cellLimits } from '#common/schemas/cell';
import type { Warning } from '#common/schemas/evaluation';

import { columnReader, findLoop, numberOf } from '../format/block-values.js';
import type { CifBlock, CifLoop, CifValue } from '../format/cif-document.js';
import { shortened } from '../format/shortened.js';
import type { ReadLattice } from './read-lattice.js';
import { snapFraction } from './snap-fraction.js';
import { readLabelElement, readTypeSymbol, type ReadIon } from './type-symbol.js';

/** A site as the file gives it; coordinates are expressions. */
export interface ReadSite {
  readonly label: string;
  readonly element: string;
  /** In elementary charges; null when the file does not say. */
  readonly chargeE: number | null;
  readonly coordinates: readonly [string, string, string];
  readonly occupancy: string;
  readonly line: number;
}

const fractionalTags = ['_atom_site_fract_x', '_atom_site_fract_y', '_atom_site_fract_z'] as const;
const cartesianTags = ['_atom_site_cartn_x', '_atom_site_cartn_y', '_atom_site_cartn_z'] as const;

/** Leaves room for the mark that tells repeated labels apart. */
const longestLabel = cellLimits.labelLength - 5;

type Column = ReturnType<typeof columnReader>;

/** True when a block lists sites with coordinates. */
export function hasSites(block: CifBlock): boolean {
  return findLoop(block, fractionalTags[0], cartesianTags[0]) !== null;
}

/**
 * Reads the site list of a block.
 * @throws Problem `cif.missing_value` or `cif.bad_value` with the line of the site
 */
export function readSites(block: CifBlock, lattice: ReadLattice, warnings: Warning[]): ReadSite[] {
  const loop = findLoop(block, fractionalTags[0], cartesianTags[0]);
  if (!loop || loop.rows.length === 0) {
    throw new Problem('cif.no_structure', `The block “${block.name}” lists no sites.`, {
      line: block.line,
    });
  }
  requireFewEnough(loop);
  const oxidationNumbers = readOxidationNumbers(block);
  const isotopes = new Set<string>();
  const read = columnReader(loop);
  const sites = loop.rows
    .filter((row) => read(row, '_atom_site_calc_flag')?.text !== 'dum')
    .map((row) => readSite(row, read, loop, { lattice, oxidationNumbers, isotopes }));
  noteIsotopes(isotopes, warnings);
  if (!loop.tags.includes(fractionalTags[0])) {
    warnings.push({
      code: 'cif.cartesian',
      message:
        'Only Cartesian coordinates are given: x was taken along a, y in the plane of a and b.',
    });
  }
  return withDistinctLabels(sites, warnings);
}

function requireFewEnough({ rows, line }: CifLoop): void {
  if (rows.length > cellLimits.definedSites) {
    throw new Problem(
      'cell.too_many_sites',
      `The file lists ${rows.length} sites; at most ${cellLimits.definedSites} are taken.`,
      { line },
    );
  }
}

interface SiteContext {
  readonly lattice: ReadLattice;
  readonly oxidationNumbers: ReadonlyMap<string, number>;
  readonly isotopes: Set<string>;
}

function readSite(
  row: readonly CifValue[],
  read: Column,
  loop: CifLoop,
  context: SiteContext,
): ReadSite {
  const line = row[0]!.line;
  const type = read(row, '_atom_site_type_symbol');
  const label = (read(row, '_atom_site_label')?.text ?? type?.text ?? '')
    .trim()
    .slice(0, longestLabel);
  const ion = readIon(type?.text ?? null, label, line);
  if (ion.isotope !== null) {
    context.isotopes.add(ion.isotope);
  }
  const occupancy = read(row, '_atom_site_occupancy');
  return {
    label,
    element: ion.element,
    chargeE: chargeOf(type?.text ?? null, ion, context),
    coordinates: readCoordinates(row, read, loop, { lattice: context.lattice, label, line }),
    occupancy: occupancy ? numberOf(occupancy, '_atom_site_occupancy').digits : '1',
    line,
  };
}

/** The listed oxidation number of the type or its element, else the charge in the type symbol. */
function chargeOf(type: string | null, ion: ReadIon, context: SiteContext): number | null {
  const { oxidationNumbers } = context;
  const ofType = type === null ? undefined : oxidationNumbers.get(type);
  return ofType ?? ion.chargeE ?? oxidationNumbers.get(ion.element) ?? null;
}

function readIon(type: string | null, label: string, line: number): ReadIon {
  const ion = (type === null ? null : readTypeSymbol(type)) ?? readLabelElement(type ?? label);
  if (!ion) {
    throw new Problem(
      'cif.bad_value',
      `Line ${line}: no element can be made out of “${shortened(type ?? label)}”.`,
      { line },
    );
  }
  return ion;
}

function readCoordinates(
  row: readonly CifValue[],
  read: Column,
  loop: CifLoop,
  site: { lattice: ReadLattice; label: string; line: number },
): [string, string, string] {
  const isFractional = loop.tags.includes(fractionalTags[0]);
  const tags = isFractional ? fractionalTags : cartesianTags;
  const [x, y, z] = tags.map((tag) => {
    const value = read(row, tag);
    if (!value) {
      throw new Problem(
        'cif.missing_value',
        `Line ${site.line}: ${tag} of ${site.label} is missing or unknown.`,
        { line: site.line },
      );
    }
    return numberOf(value, tag);
  });
  if (isFractional) {
    const text = (number: typeof x) =>
      (number!.uncertainty === null ? snapFraction(number!.digits) : null) ?? number!.digits;
    return [text(x), text(y), text(z)];
  }
  const { a, b, c, alpha, beta, gamma } = site.lattice.values;
  const vectors = cellVectors({
    aA: a,
    bA: b,
    cA: c,
    alphaDeg: alpha,
    betaDeg: beta,
    gammaDeg: gamma,
  });
  const fractional = cartesianToFractional(vectors, [x!.value, y!.value, z!.value]);
  const text = (index: number) => String(Number((fractional[index] ?? 0).toFixed(8)));
  return [text(0), text(1), text(2)];
}

function readOxidationNumbers(block: CifBlock): Map<string, number> {
  const numbers = new Map<string, number>();
  const loop = findLoop(block, '_atom_type_oxidation_number');
  if (!loop) {
    return numbers;
  }
  const read = columnReader(loop);
  for (const row of loop.rows) {
    const symbol = read(row, '_atom_type_symbol');
    const value = read(row, '_atom_type_oxidation_number');
    if (symbol && value) {
      numbers.set(symbol.text, numberOf(value, '_atom_type_oxidation_number').value);
    }
  }
  return numbers;
}

function noteIsotopes(isotopes: ReadonlySet<string>, warnings: Warning[]): void {
  for (const isotope of isotopes) {
    warnings.push({
      code: 'cif.isotope',
      message: `${isotope} is hydrogen-${isotope === 'D' ? 2 : 3}: it was read as H.`,
    });
  }
}

/** Two sites of one label can't be told apart later: the second gets a letter behind it. */
function withDistinctLabels(sites: readonly ReadSite[], warnings: Warning[]): ReadSite[] {
  const taken = new Set<string>();
  return sites.map((site) => {
    let label = site.label;
    for (let count = 2; taken.has(label); count += 1) {
      label = `${site.label}_${count}`;
    }
    if (label !== site.label) {
      warnings.push({
        code: 'cif.label_repeated',
        message: `Line ${site.line}: the label ${site.label} stands twice; this site is now ${label}.`,
      });
    }
    taken.add(label);
    return { ...site, label };
  });
}
