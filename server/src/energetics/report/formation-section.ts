import type { DataOverrides } from '#common/chemistry/sourced';
import { energeticsOf } from '#common/physics/energetics/energetics-account';
import { formationComposition } from '#common/physics/energetics/formation-composition';
import { formationLedger } from '#common/physics/energetics/formation-ledger';
import type { FormationLine } from '#common/physics/energetics/formation-line';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EnergeticModel, ValueRange } from '#common/schemas/energetics';
import type { EvaluationResult } from '#common/schemas/evaluation';
import type { ReportSection } from '#common/schemas/report';
import { formatTidy } from '#common/units/format';

import { rangeText, table, text } from './report-blocks.js';

const kj = (range: ValueRange | null) => (range === null ? '–' : rangeText(range, 1));

function lineRow(line: FormationLine): string[] {
  const remark = line.remark === null ? '' : `, ${line.remark}`;
  const out = line.isExcluded ? ' (left out)' : '';
  return [
    `${line.name}${remark}${out}`,
    formatTidy(line.coefficient, 4),
    kj(line.valueKjPerMol),
    kj(line.contributionKjPerMol),
    line.reason ?? line.source,
  ];
}

/** The Born–Haber account line by line, each with its source; or why there is none. */
export function formationSection(
  cell: ResolvedCell,
  result: EvaluationResult,
  model: EnergeticModel,
  overrides: DataOverrides,
): ReportSection {
  const about = { key: 'formation', title: 'Formation ledger' };
  const composition = formationComposition(cell);
  if ('reason' in composition) {
    return { ...about, blocks: [text(composition.reason)] };
  }
  const account = energeticsOf(cell, result, model, overrides);
  const ledger = formationLedger(composition, model, account, overrides);
  const titles = ['Line', '>Times', '>Each, kJ/mol', '>Per formula, kJ/mol', 'Source'];
  return {
    ...about,
    blocks: [
      text(
        'kJ per mole of formula units. Enthalpies at 298.15 K, ionisation energies and affinities at 0 K; ' +
          'a lattice energy from the model is a model value at 0 K.',
      ),
      table('', titles, ledger.lines.map(lineRow), [lineRow(ledger.formation)]),
      ...(ledger.open === null ? [] : [text(ledger.open.message)]),
      ...(ledger.isPartial
        ? [text('Lines are left out: the sum is no enthalpy of formation.')]
        : []),
    ],
  };
}
