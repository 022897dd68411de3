import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

import { composition } from '#common/physics/composition';
import { resolveCell } from '#common/physics/resolve-cell';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { CellDefinition, CellSite } from '#common/schemas/cell';
import type { PrototypeSummary } from '#common/schemas/prototype';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';
import { readStructure } from '#server/cif/read-structure';
import { symmetryOf } from '#server/symmetry/space-groups';

import { prototypeFacts, type PrototypeFacts } from './prototype-facts.js';

/** A structure type ready for use: its facts, its file as a cell, and that cell in numbers. */
export interface Prototype {
  readonly facts: PrototypeFacts;
  readonly summary: PrototypeSummary;
  /** The file's cell; coordinates that are free carry their names, the names stand as parameters. */
  readonly cell: CellDefinition;
  readonly resolved: ResolvedCell;
}

/** The folder structures/ of this installation, from source as from the build. */
export function structuresFolder(): string {
  for (let folder = import.meta.dirname; ; folder = path.dirname(folder)) {
    const candidate = path.join(folder, 'structures');
    if (existsSync(path.join(candidate, 'SOURCE.md'))) {
      return candidate;
    }
    if (folder === path.dirname(folder)) {
      throw new Error('The folder structures/ is missing from this installation.');
    }
  }
}

/**
 * Reads every structure type from its CIF.
 * @throws Error when a file is missing or does not hold what its facts say
 */
export function readPrototypes(folder: string = structuresFolder()): readonly Prototype[] {
  return prototypeFacts.map((facts) => {
    const text = readFileSync(path.join(folder, `${facts.id}.cif`), 'utf8');
    return toPrototype(facts, text);
  });
}

function toPrototype(facts: PrototypeFacts, text: string): Prototype {
  const cell = withFreeCoordinates(readStructure(text).cell, facts);
  const symmetry = symmetryOf(cell.symmetry);
  const { cell: resolved, problems } = resolveCell(cell, symmetry);
  if (!resolved || !symmetry.setting) {
    throw new Error(
      `structures/${facts.id}.cif: ${problems[0]?.message ?? 'no tabulated setting'}`,
    );
  }
  const summary = summarise(facts, cell, resolved, symmetry.setting);
  return { facts, summary, cell, resolved };
}

/** Gives free coordinates their names: `0.3053` in the file becomes `u` with u = 0.3053. */
function withFreeCoordinates(cell: CellDefinition, facts: PrototypeFacts): CellDefinition {
  const parameters = facts.freeCoordinates.map(({ name, label, axis }) => ({
    name,
    expression: siteOf(cell, label)[axis],
  }));
  const sites = cell.sites.map((site): CellSite => {
    const free = facts.freeCoordinates.find(({ label }) => label === site.label);
    return free ? { ...site, ...free.expressions } : site;
  });
  return { ...cell, parameters, sites };
}

function siteOf(cell: CellDefinition, label: string): CellSite {
  const site = cell.sites.find((one) => one.label === label);
  if (!site) {
    throw new Error(`The structure type has no site ${label}.`);
  }
  return site;
}

function summarise(
  facts: PrototypeFacts,
  cell: CellDefinition,
  resolved: ResolvedCell,
  setting: SpaceGroupSetting,
): PrototypeSummary {
  const { formula, formulaUnitsPerCell } = composition(resolved);
  return {
    id: facts.id,
    name: facts.name,
    example: formula,
    spaceGroupNumber: setting.number,
    spaceGroupSymbol: setting.symbol,
    roles: facts.roles.map(({ label, coordination }) => {
      const { element, charge } = siteOf(cell, label);
      const copies = resolved.sites.filter((site) => site.label === label).length;
      return {
        element,
        charge: Number(charge),
        coordination,
        perFormulaUnit: copies / formulaUnitsPerCell,
      };
    }),
    description: facts.description,
  };
}
