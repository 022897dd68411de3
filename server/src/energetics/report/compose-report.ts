import { hazardsOf } from '#common/chemistry/hazards';
import type { DataOverrides } from '#common/chemistry/sourced';
import { resolveCell } from '#common/physics/resolve-cell';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { RevisionDetail } from '#common/schemas/lattice';
import type { LatticeReport, ReportSection } from '#common/schemas/report';
import {
  COULOMB_EV_ANGSTROM,
  COULOMB_RELATIVE_UNCERTAINTY,
  EV_IN_KJ_PER_MOL,
} from '#common/units/constants';
import { formatPower } from '#common/units/format';
import { symmetryOf } from '#server/symmetry/space-groups';

import { cellSection } from './cell-section.js';
import {
  certificateSection,
  energySection,
  ledgerSection,
  sitesSection,
  sublatticeSection,
} from './electrostatics-sections.js';
import { checksSection } from './checks-section.js';
import { formationSection } from './formation-section.js';
import { latticePicture } from './lattice-picture.js';
import { modelSection } from './model-section.js';
import { text } from './report-blocks.js';

/** What a report is made from. */
export interface ReportSubject {
  readonly revision: Omit<RevisionDetail, 'id' | 'latticeId'>;
  readonly workspaceName: string;
  readonly overrides: DataOverrides;
  /** Null where the reader is not told. */
  readonly remarks: { readonly open: number; readonly resolved: number } | null;
  readonly address: string | null;
  readonly madeAt: Date;
}

const day = (iso: string) => `${iso.slice(0, 10)} ${iso.slice(11, 16)} UTC`;

function reviewWords({ revision }: ReportSubject): string {
  const { state, decidedBy, decidedAt, submittedBy, submittedAt } = revision;
  switch (state) {
    case 'accepted':
      return `Accepted by ${decidedBy?.name ?? '–'}, ${day(decidedAt ?? '')}`;
    case 'returned':
      return `Returned by ${decidedBy?.name ?? '–'}, ${day(decidedAt ?? '')}`;
    case 'in_review':
      return `In review, submitted by ${submittedBy?.name ?? '–'}, ${day(submittedAt ?? '')}`;
    case 'draft':
      return 'Not submitted for review';
  }
}

function reviewSection(subject: ReportSubject): ReportSection {
  const { revision, remarks } = subject;
  const { decisionReason, note } = revision;
  return {
    key: 'review',
    title: 'Review',
    blocks: [
      text(`${reviewWords(subject)}.`),
      ...(decisionReason === null ? [] : [text(`Reason given: ${decisionReason}`)]),
      ...(note === '' ? [] : [text(`Note of the author: ${note}`)]),
      ...(remarks === null
        ? []
        : [text(`Remarks: ${remarks.open} open, ${remarks.resolved} resolved.`)]),
    ],
  };
}

function sourcesSection(): ReportSection {
  return {
    key: 'sources',
    title: 'Conventions and sources',
    blocks: [
      text(
        `Coulomb constant k_e = ${COULOMB_EV_ANGSTROM} eV Å (CODATA 2022, relative uncertainty ` +
          `${formatPower(COULOMB_RELATIVE_UNCERTAINTY, 2)}); 1 eV per particle = ${EV_IN_KJ_PER_MOL} kJ/mol (exact SI).`,
      ),
      text(
        'Periodic sums after Ewald (1921). A number is printed as far as it is certain: its bound holds the ' +
          'truncation of both sums, rounding, and for energies the uncertainty of k_e.',
      ),
      text('Every formula, table and source is on the methods page of this server, /methods.'),
    ],
  };
}

const cautionSection = (cell: ResolvedCell | null): ReportSection => ({
  key: 'caution',
  title: 'Caution',
  blocks: [
    ...(cell === null
      ? []
      : hazardsOf(cell).map((words) => ({ kind: 'caution' as const, text: words }))),
    {
      kind: 'caution',
      text:
        'These are energies of a model of point charges, not a procedure for making or handling the compound. ' +
        'For any work with it, the safety data sheet, local codes and licensed practice decide.',
    },
  ],
});

/** Everything on the report of a revision; pure but for what it is given. */
export function composeReport(subject: ReportSubject): LatticeReport {
  const { revision } = subject;
  const symmetry = symmetryOf(revision.cell.symmetry);
  const resolved = resolveCell(revision.cell, symmetry).cell;
  const evaluation = revision.evaluation;
  const result = evaluation?.result ?? null;
  const problem = revision.evaluationProblem;
  return {
    title: revision.latticeName,
    formula: revision.formula,
    workspaceName: subject.workspaceName,
    revision: revision.number,
    author: revision.author.name,
    savedAt: revision.createdAt,
    state: revision.state,
    review: reviewWords(subject),
    madeAt: subject.madeAt.toISOString(),
    contentHash: evaluation?.hash ?? null,
    address: subject.address,
    picture: resolved === null ? null : latticePicture(resolved),
    sections: [
      reviewSection(subject),
      cellSection(revision.cell, resolved, symmetry.setting),
      ...(result === null
        ? [
            {
              key: 'energy',
              title: 'Electrostatic energy',
              blocks: [text(problem?.message ?? '–')],
            },
          ]
        : [energySection(result), ledgerSection(result)]),
      ...(result === null || resolved === null
        ? []
        : [
            modelSection(resolved, result, revision.model, subject.overrides),
            formationSection(resolved, result, revision.model, subject.overrides),
          ]),
      ...(result === null
        ? []
        : [sitesSection(result), sublatticeSection(result), certificateSection(result)]),
      ...(resolved === null
        ? []
        : [checksSection(resolved, result, revision.model, subject.overrides)]),
      sourcesSection(),
      cautionSection(resolved),
    ],
  };
}
