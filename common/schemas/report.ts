import { z } from 'zod';

import { revisionState } from '#common/schemas/lattice';
import { timestamp } from '#common/schemas/shared';

/** One number with its name, as printed; `value` and `bound` are what the text was made from. */
export const reportFigure = z.object({
  name: z.string(),
  /** As far as it is certain; a range has both ends; a dash where there is no number. */
  text: z.string(),
  unit: z.string(),
  value: z.number().nullable(),
  /** Absolute bound in the same unit; null for model values and exact ones. */
  bound: z.number().nullable(),
  /** The convention, the source, or why there is no number. */
  note: z.string(),
});
export type ReportFigure = z.infer<typeof reportFigure>;

export const reportTable = z.object({
  caption: z.string(),
  columns: z.array(z.object({ title: z.string(), align: z.enum(['left', 'right']) })),
  /** One text per column, exactly as printed. */
  rows: z.array(z.array(z.string())),
  /** Closing rows under a rule: totals. */
  closing: z.array(z.array(z.string())),
});
export type ReportTable = z.infer<typeof reportTable>;

export const reportBlock = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('text'), text: z.string() }),
  z.object({ kind: z.literal('figures'), figures: z.array(reportFigure) }),
  z.object({ kind: z.literal('table'), table: reportTable }),
  z.object({ kind: z.literal('caution'), text: z.string() }),
]);
export type ReportBlock = z.infer<typeof reportBlock>;

export const reportSection = z.object({
  key: z.string(),
  title: z.string(),
  blocks: z.array(reportBlock),
});
export type ReportSection = z.infer<typeof reportSection>;

/** The lattice drawn flat; lengths relative to a square of side 1, y downwards. */
export const reportPicture = z.object({
  /** From back to front. */
  balls: z.array(
    z.object({ x: z.number(), y: z.number(), radius: z.number(), colour: z.string() }),
  ),
  edges: z.array(z.object({ x1: z.number(), y1: z.number(), x2: z.number(), y2: z.number() })),
  legend: z.array(z.object({ ion: z.string(), colour: z.string() })),
  /** In words, for those who don't see it. */
  description: z.string(),
});
export type ReportPicture = z.infer<typeof reportPicture>;

/** Everything on the report of one revision. */
export const latticeReport = z.object({
  title: z.string(),
  formula: z.string().nullable(),
  workspaceName: z.string(),
  revision: z.number().int(),
  author: z.string(),
  savedAt: timestamp,
  state: revisionState,
  /** Who accepted or returned it and when, or how it stands. */
  review: z.string(),
  /** When the report was made. */
  madeAt: timestamp,
  /** SHA-256 of what was computed from; null where the cell can't be evaluated. */
  contentHash: z.string().nullable(),
  /** Where the revision is; null for a link holder. */
  address: z.string().nullable(),
  /** Null where the cell has nothing to draw or too much. */
  picture: reportPicture.nullable(),
  sections: z.array(reportSection),
});
export type LatticeReport = z.infer<typeof latticeReport>;
