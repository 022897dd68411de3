import type { RevisionDetail, RevisionSummary } from '#common/schemas/lattice';
import { presentEvaluation } from '#server/electrostatics/evaluation.presenter';
import { presentPerson } from '#server/users/person.presenter';

import { presentBounded } from '../lattice.presenter.js';
import type { RevisionListRow } from './revisions.repository.js';
import type { EvaluatedRevision } from './revisions.service.js';

export const presentRevision = (row: RevisionListRow): RevisionSummary => ({
  id: row.id,
  number: row.number,
  note: row.note,
  state: row.state,
  author: presentPerson(row.author),
  createdAt: row.createdAt.toISOString(),
  submittedBy: row.submittedBy && presentPerson(row.submittedBy),
  submittedAt: row.submittedAt?.toISOString() ?? null,
  decidedBy: row.decidedBy && presentPerson(row.decidedBy),
  decidedAt: row.decidedAt?.toISOString() ?? null,
  decisionReason: row.decisionReason,
  formula: row.formula,
  energyEvPerFormulaUnit: presentBounded(
    row.energyEvPerFormulaUnit,
    row.energyBoundEvPerFormulaUnit,
  ),
  evaluationHash: row.evaluationHash,
});

export const presentRevisionDetail = ({
  revision,
  evaluation,
}: EvaluatedRevision): RevisionDetail => ({
  ...presentRevision(revision),
  latticeId: revision.latticeId,
  latticeName: revision.latticeName,
  cell: revision.cell,
  method: revision.method,
  model: revision.model,
  prototype: revision.prototype,
  evaluation: evaluation && presentEvaluation(evaluation),
  evaluationProblem: revision.evaluationProblem,
});
