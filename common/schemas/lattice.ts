import { z } from 'zod';

import { cellDefinition, evaluationMethod } from '#common/schemas/cell';
import { bounded, evaluationProblem, storedEvaluation } from '#common/schemas/evaluation';
import { defaultEnergeticModel, energeticModel } from '#common/schemas/energetics';
import { id, pageOf, pageQuery, personSummary, timestamp } from '#common/schemas/shared';

export const revisionState = z.enum(['draft', 'in_review', 'accepted', 'returned']);
export type RevisionState = z.infer<typeof revisionState>;

const latticeName = z.string().trim().min(1, 'Give the lattice a name.').max(120);
const tags = z.array(z.string().trim().min(1).max(30)).max(12);

/** One row of the shelf: the newest revision, or the draft where there is none yet. */
export const latticeSummary = z.object({
  id,
  name: z.string(),
  tags: z.array(z.string()),
  formula: z.string().nullable(),
  prototype: z.string().nullable(),
  spaceGroupSymbol: z.string().nullable(),
  spaceGroupNumber: z.number().int().nullable(),
  /** Reduced Madelung constant. */
  madelungReduced: bounded.nullable(),
  energyEvPerFormulaUnit: bounded.nullable(),
  /** Why there is no energy, when there is none. */
  problemCode: z.string().nullable(),
  state: revisionState,
  /** Number of the newest revision; 0 when only a draft exists. */
  headRevision: z.number().int(),
  hasDraft: z.boolean(),
  openRemarks: z.number().int(),
  author: personSummary,
  createdAt: timestamp,
  updatedAt: timestamp,
  deletedAt: timestamp.nullable(),
});
export type LatticeSummary = z.infer<typeof latticeSummary>;

export const shelfSort = z.enum([
  'name',
  'formula',
  'spaceGroup',
  'madelung',
  'energy',
  'state',
  'author',
  'updated',
]);
export const shelfQuery = pageQuery.extend({
  search: z.string().trim().max(100).default(''),
  sort: shelfSort.default('updated'),
  order: z.enum(['asc', 'desc']).default('desc'),
  state: revisionState.optional(),
  deleted: z.stringbool().default(false),
});
export type ShelfQuery = z.infer<typeof shelfQuery>;
export const shelfPage = pageOf(latticeSummary);
export type ShelfPage = z.infer<typeof shelfPage>;

export const createLatticeRequest = z.object({
  name: latticeName,
  cell: cellDefinition,
  method: evaluationMethod.optional(),
  model: energeticModel.optional(),
  prototype: z.string().max(60).nullable().default(null),
  tags: tags.default([]),
});
export type CreateLatticeRequest = z.infer<typeof createLatticeRequest>;
export const updateLatticeRequest = z.object({
  name: latticeName.optional(),
  tags: tags.optional(),
});

/** The unsaved edit. `etag` goes back as If-Match; baseRevision 0 means nothing is saved yet. */
export const draft = z.object({
  latticeId: id,
  etag: z.string(),
  baseRevision: z.number().int(),
  /** False when this is just the newest revision, untouched. */
  isChanged: z.boolean(),
  cell: cellDefinition,
  method: evaluationMethod,
  model: energeticModel,
  prototype: z.string().nullable(),
  updatedAt: timestamp.nullable(),
  updatedBy: personSummary.nullable(),
});
export type Draft = z.infer<typeof draft>;
export const putDraftRequest = z.object({
  cell: cellDefinition,
  method: evaluationMethod,
  model: energeticModel.default(defaultEnergeticModel),
});
export type PutDraftRequest = z.infer<typeof putDraftRequest>;

export const saveRevisionRequest = z.object({ note: z.string().trim().max(500).default('') });

export const revisionSummary = z.object({
  id,
  number: z.number().int(),
  note: z.string(),
  state: revisionState,
  author: personSummary,
  createdAt: timestamp,
  submittedBy: personSummary.nullable(),
  submittedAt: timestamp.nullable(),
  decidedBy: personSummary.nullable(),
  decidedAt: timestamp.nullable(),
  /** Why it was returned; may also go with acceptance. */
  decisionReason: z.string().nullable(),
  formula: z.string().nullable(),
  energyEvPerFormulaUnit: bounded.nullable(),
  evaluationHash: z.string().nullable(),
});
export type RevisionSummary = z.infer<typeof revisionSummary>;
export const revisionList = z.object({ items: z.array(revisionSummary) });

export const revisionDetail = revisionSummary.extend({
  latticeId: id,
  latticeName: z.string(),
  cell: cellDefinition,
  method: evaluationMethod,
  model: energeticModel,
  prototype: z.string().nullable(),
  evaluation: storedEvaluation.nullable(),
  evaluationProblem: evaluationProblem.nullable(),
});
export type RevisionDetail = z.infer<typeof revisionDetail>;
