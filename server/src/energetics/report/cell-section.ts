import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { CellDefinition } from '#common/schemas/cell';
import type { ReportSection } from '#common/schemas/report';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';
import { formatNetCharge, formatTidy } from '#common/units/format';

import { figures, plain, table, text } from './report-blocks.js';

const edge = (name: string, valueA: number) => ({
  ...plain(name, valueA, 5, 'Å'),
  text: formatTidy(valueA, 6),
});
const angle = (name: string, valueDeg: number) => ({
  ...plain(name, valueDeg, 4, '°'),
  text: formatTidy(valueDeg, 4),
});

function symmetryWords(cell: CellDefinition, setting: SpaceGroupSetting | null): string {
  if (setting !== null) {
    return `Space group ${setting.symbol}, number ${setting.number}, ${setting.crystalSystem}.`;
  }
  const count = cell.symmetry.kind === 'operations' ? cell.symmetry.operations.length : 0;
  return `Symmetry given as ${count} operations, no tabulated setting.`;
}

const listed = 80;

/** Edges, angles, symmetry and the sites as typed. */
export function cellSection(
  cell: CellDefinition,
  resolved: ResolvedCell | null,
  setting: SpaceGroupSetting | null,
): ReportSection {
  const shown = cell.sites.slice(0, listed);
  const rows = shown.map((site) => [
    site.label,
    site.element,
    site.charge,
    site.x,
    site.y,
    site.z,
    site.occupancy,
  ]);
  const titles = ['Site', 'Element', '>Charge, e', '>x', '>y', '>z', '>Occupancy'];
  const rest = cell.sites.length - shown.length;
  const parameters = cell.parameters.map(({ name, expression }) => [
    name,
    expression,
    resolved === null ? '–' : formatTidy(resolved.parameters[name] ?? NaN, 6),
  ]);
  return {
    key: 'cell',
    title: 'Cell',
    blocks: [
      text(symmetryWords(cell, setting)),
      ...(resolved === null ? [] : [figures(latticeFigures(resolved))]),
      ...(parameters.length === 0
        ? []
        : [table('Parameters', ['Name', 'As typed', '>Value'], parameters)]),
      table('Sites as typed, fractional coordinates', titles, rows),
      ...(rest > 0 ? [text(`${rest} further sites are not listed; the CIF has them all.`)] : []),
    ],
  };
}

function latticeFigures(resolved: ResolvedCell) {
  const { lattice, sites, volumeA3 } = resolved;
  const chargeE = sites.reduce((sum, site) => sum + site.chargeE, 0);
  return [
    edge('a', lattice.aA),
    edge('b', lattice.bA),
    edge('c', lattice.cA),
    angle('α', lattice.alphaDeg),
    angle('β', lattice.betaDeg),
    angle('γ', lattice.gammaDeg),
    plain('Volume of the cell', volumeA3, 4, 'Å³'),
    plain('Places in the cell', sites.length, 0, ''),
    { ...plain('Sum of charges', chargeE, 4, 'e'), text: formatNetCharge(chargeE) },
  ];
}
