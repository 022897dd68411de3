import type { EvaluationResult, SiteResult } from '#common/schemas/evaluation';
import type { ReportSection } from '#common/schemas/report';
import { certainDigits } from '#common/units/certain-digits';
import { EV_IN_KJ_PER_MOL } from '#common/units/constants';
import { formatFixed, formatPower, formatTidy } from '#common/units/format';

import { ionText } from './ion-text.js';
import {
  certain,
  certainOrReason,
  coulombBound,
  figures,
  plain,
  table,
  text,
} from './report-blocks.js';

const boundary =
  'Point charges, conducting surroundings (no surface term), zero with all ions infinitely far apart.';

function energyFigures(result: EvaluationResult) {
  const { value, bound } = result.energyEvPerFormulaUnit;
  const whole = coulombBound(value, bound);
  return figures([
    certain('Electrostatic energy per formula unit', value, whole, 'eV', boundary),
    certain(
      'The same per mole',
      value * EV_IN_KJ_PER_MOL,
      whole * EV_IN_KJ_PER_MOL,
      'kJ/mol',
      '1 eV per particle in kJ/mol is exact',
    ),
    ...(result.shortestUnlikeDistanceA === null
      ? []
      : [
          plain(
            'Shortest cation–anion distance d0',
            result.shortestUnlikeDistanceA,
            5,
            'Å',
            (result.shortestUnlikePair ?? []).join(' – '),
          ),
        ]),
  ]);
}

function madelungFigures({ madelung }: EvaluationResult) {
  return figures([
    certainOrReason(
      'Madelung constant M(d0)',
      madelung.perDistance,
      '−E d0 / k_e, charges included',
    ),
    certainOrReason('Madelung constant M′', madelung.perCharge, 'M(d0) / |z+ z−|'),
    certainOrReason(
      'Reduced Madelung constant',
      madelung.reduced,
      '2 M(d0) / sum of z² (Templeton 1953)',
    ),
    certainOrReason('Madelung constant M(a)', madelung.perEdge, '−E a / k_e'),
  ]);
}

function marks(result: EvaluationResult): string[] {
  return [
    ...(result.method.uniformBackground
      ? [
          'The cell is charged: a uniform background of opposite charge is included in every number.',
        ]
      : []),
    ...(result.hasPolarAxis
      ? ['The point group has a polar axis: the conducting boundary is part of the result.']
      : []),
    ...(result.certificate.agrees
      ? []
      : ['The two evaluations do not agree: treat the digits as doubtful.']),
    ...result.warnings.map(({ message }) => message),
  ];
}

export function energySection(result: EvaluationResult): ReportSection {
  return {
    key: 'energy',
    title: 'Electrostatic energy',
    blocks: [energyFigures(result), madelungFigures(result), ...marks(result).map(text)],
  };
}

/** Pairs by distance: binding negative, opposing positive; the account closes on the total. */
export function ledgerSection(result: EvaluationResult): ReportSection {
  const { pairLedger, energyEvPerFormulaUnit: energy } = result;
  const { decimals } = certainDigits(energy.value, coulombBound(energy.value, energy.bound));
  const ev = (value: number) => formatFixed(value, Math.min(5, Math.max(0, decimals)));
  const rows = pairLedger.rows.map((row) => [
    `${ionText(row.speciesA)} – ${ionText(row.speciesB)}`,
    formatFixed(row.distanceA, 4),
    formatTidy(row.pairsPerFormulaUnit, 4),
    ev(row.pairEnergyEv),
    ev(row.contributionEv),
    ev(row.runningEv),
  ]);
  const titles = [
    'Pair',
    '>Distance, Å',
    '>Pairs',
    '>One pair, eV',
    '>Contribution, eV',
    '>Balance, eV',
  ];
  return {
    key: 'ledger',
    title: 'Pair ledger',
    blocks: [
      text(
        `Ion pairs within ${formatFixed(pairLedger.reachA, 3)} Å, per formula unit: bare Coulomb energies. ` +
          'Unlike ions bind (negative), like ions oppose (positive). What lies beyond closes the account on the periodic total.',
      ),
      table('', titles, rows, [
        ['beyond the reach', '', '', '', ev(pairLedger.beyondEv), ev(pairLedger.totalEv)],
        ['periodic total', '', '', '', '', ev(pairLedger.totalEv)],
      ]),
    ],
  };
}

const size = (vector: readonly number[]) => Math.hypot(...vector);

function siteRow(site: SiteResult, result: EvaluationResult): string[] {
  const bound = coulombBound(site.potentialV, result.potentialBoundV);
  const digits = (value: number, within: number, most: number) =>
    certainDigits(value, within, most).text;
  // A field's error: a potential's over the shortest distance, with a factor of ten to spare.
  const fieldBound = (10 * bound) / result.shortestDistanceA;
  return [
    site.label,
    ionText(site.speciesKey),
    String(site.multiplicity),
    digits(site.potentialV, bound, 6),
    digits(size(site.fieldVPerA), fieldBound, 4),
    digits(size(site.forceEvPerA), fieldBound * Math.max(1, Math.abs(site.charge)), 4),
    digits(site.energyShareEv, bound * Math.abs(site.charge), 5),
  ];
}

export function sitesSection(result: EvaluationResult): ReportSection {
  const titles = [
    'Site',
    'Ion',
    '>Copies',
    '>Potential, V',
    '>Field, V/Å',
    '>Force, eV/Å',
    '>Share, eV',
  ];
  return {
    key: 'sites',
    title: 'Site potentials',
    blocks: [
      text(
        'What each ion feels of all others; a site’s share of the energy is half its charge times its potential.',
      ),
      table(
        '',
        titles,
        result.sites.map((site) => siteRow(site, result)),
      ),
    ],
  };
}

/** Wider matrices don't fit a page and are given pair by pair. */
const widestMatrix = 6;

function sublatticeTable({ sublatticeMatrix }: EvaluationResult) {
  const { speciesKeys, energiesEv, boundEv } = sublatticeMatrix;
  const cell = (value: number) => certainDigits(value, coulombBound(value, boundEv), 5).text;
  const names = speciesKeys.map(ionText);
  if (names.length > widestMatrix) {
    const rows = names.flatMap((one, a) =>
      names.slice(a).map((other, k) => [`${one} – ${other}`, cell(energiesEv[a]![a + k]!)]),
    );
    return table('', ['Sublattices', '>Energy, eV'], rows);
  }
  return table(
    '',
    ['', ...names.map((name) => `>${name}`)],
    energiesEv.map((row, a) => [names[a]!, ...row.map((value, b) => (b < a ? '' : cell(value)))]),
  );
}

export function sublatticeSection(result: EvaluationResult): ReportSection {
  return {
    key: 'sublattices',
    title: 'Sublattice matrix',
    blocks: [
      text(
        'eV per formula unit. Each sublattice sits in its own uniform compensating background; ' +
          'only sums over neutral combinations are physical. The upper triangle adds up to the total.',
      ),
      sublatticeTable(result),
    ],
  };
}

export function certificateSection(result: EvaluationResult): ReportSection {
  const { certificate } = result;
  const [one = 0, other = 0] = certificate.splittingPerA;
  const power = (name: string, value: number, unit: string) => ({
    ...plain(name, value, 0, unit),
    text: formatPower(value, 2),
  });
  return {
    key: 'certificate',
    title: 'Certificate',
    blocks: [
      text(
        `The cell was summed twice, with splitting parameters ${formatFixed(one, 4)} and ${formatFixed(other, 4)} Å⁻¹. ` +
          (certificate.agrees
            ? 'Every residual lies within its bound.'
            : 'A residual lies outside its bound.'),
      ),
      figures([
        power('Difference of the two, per cell', certificate.energyDifferenceEv, 'eV'),
        power('Virial: trace of stress × volume + energy', certificate.virialResidualEv, 'eV'),
        power('Half of charges × potentials − energy', certificate.potentialSumResidualEv, 'eV'),
        power('Sum of forces', certificate.forceSumEvPerA, 'eV/Å'),
        plain('Direct terms', certificate.realTerms, 0, ''),
        plain('Reciprocal terms', certificate.reciprocalTerms, 0, ''),
        power('Tolerance asked for', result.method.toleranceRelative, ''),
      ]),
      text(`Engine ${result.engine}.`),
    ],
  };
}
