import type { DataOverrides } from '#common/chemistry/sourced';
import {
  energeticsOf,
  type EnergeticsAccount,
} from '#common/physics/energetics/energetics-account';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EnergeticModel, RepulsionModel } from '#common/schemas/energetics';
import type { EvaluationResult } from '#common/schemas/evaluation';
import type { ReportBlock, ReportSection } from '#common/schemas/report';
import { formatFixed, formatTidy } from '#common/units/format';

import { ionText } from './ion-text.js';
import { figures, missing, modelFigure, plain, rangeText, table, text } from './report-blocks.js';

const modelNames: Record<RepulsionModel['kind'], string> = {
  born_lande: 'Born–Landé',
  born_mayer: 'Born–Mayer',
  born_mayer_huggins: 'Born–Mayer–Huggins',
  pair_table: 'pair table',
};

function pairRows(repulsion: RepulsionModel): ReportBlock[] {
  if (repulsion.kind !== 'pair_table') {
    return [];
  }
  const rows = repulsion.pairs.map((pair) => [
    `${ionText(pair.speciesA)} – ${ionText(pair.speciesB)}`,
    formatTidy(pair.prefactorEv, 4),
    formatTidy(pair.hardnessA, 5),
    formatTidy(pair.dispersionEvA6, 4),
  ]);
  return [table('Pair table', ['Pair', '>A, eV', '>Hardness, Å', '>C, eV Å⁶'], rows)];
}

function accountFigures(account: EnergeticsAccount) {
  const { kapustinskii, hardness } = account;
  const at = 'model value at 0 K';
  return figures([
    modelFigure(
      'Lattice energy',
      account.latticeEnergyKjPerMol,
      1,
      'kJ/mol',
      `${at}, gas ions to crystal`,
    ),
    modelFigure('Equilibrium spacing', account.equilibriumSpacingA, 4, 'Å', at),
    modelFigure('Bond energy per formula unit', account.bondEnergyEv, 4, 'eV', at),
    modelFigure('Bulk modulus', account.bulkModulusGpa, 1, 'GPa', at),
    ...(hardness === null
      ? []
      : [
          modelFigure(
            hardness.symbol === 'n' ? 'Born exponent n' : 'Hardness ρ',
            hardness.range,
            4,
            hardness.unit,
            hardness.source,
          ),
        ]),
    kapustinskii.energyKjPerMol === null
      ? missing('Kapustinskii’s estimate', kapustinskii.reason ?? 'not defined')
      : plain(
          'Kapustinskii’s estimate',
          kapustinskii.energyKjPerMol,
          1,
          'kJ/mol',
          'from formula and ionic radii alone',
        ),
  ]);
}

function measuredWords({ measured }: EnergeticModel): string | null {
  const parts = [
    ...(measured.latticeEnergyKjPerMol === null
      ? []
      : [`lattice energy ${rangeText(measured.latticeEnergyKjPerMol, 1)} kJ/mol`]),
    ...(measured.bulkModulusGpa === null
      ? []
      : [`bulk modulus ${rangeText(measured.bulkModulusGpa, 1)} GPa`]),
  ];
  if (parts.length === 0) {
    return null;
  }
  const source = measured.source === '' ? 'no source given' : measured.source;
  return `Measured: ${parts.join(', ')} (${source}).`;
}

/** Repulsion, lattice energy and spacing under the revision's model. */
export function modelSection(
  cell: ResolvedCell,
  result: EvaluationResult,
  model: EnergeticModel,
  overrides: DataOverrides,
): ReportSection {
  const account = energeticsOf(cell, result, model, overrides);
  const measured = measuredWords(model);
  const own = [...overrides].length;
  return {
    key: 'model',
    title: 'Lattice energy and spacing',
    blocks: [
      text(
        `Repulsion: ${modelNames[model.repulsion.kind]}. Energies come from scaling the cell uniformly ` +
          `about the one given (spacing ${formatFixed(account.spacingA, 4)} Å).`,
      ),
      ...pairRows(model.repulsion),
      ...(account.reason === null ? [accountFigures(account)] : [text(account.reason)]),
      ...(account.derivation === null ? [] : [text(account.derivation)]),
      ...account.warnings.map(text),
      ...(measured === null ? [] : [text(measured)]),
      ...(own === 0
        ? []
        : [
            text(
              `The workspace has ${own} own values in place of tabulated ones, as they stand today.`,
            ),
          ]),
    ],
  };
}
