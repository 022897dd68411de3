import { z } from 'zod';

import { cellDefinition } from '#common/schemas/cell';

/** A place in a prototype that an ion fills: `A` the cation of rock salt, `X` its anion. */
export const prototypeRole = z.object({
  /** The element that stands there in the CIF: `Na`. */
  element: z.string(),
  charge: z.number(),
  coordination: z.number().int(),
  perFormulaUnit: z.number(),
});
export type PrototypeRole = z.infer<typeof prototypeRole>;

export const prototypeSummary = z.object({
  /** File name without ending: `rock-salt`. */
  id: z.string(),
  name: z.string(),
  /** Formula of the example in the file: `NaCl`. */
  example: z.string(),
  spaceGroupNumber: z.number().int(),
  spaceGroupSymbol: z.string(),
  roles: z.array(prototypeRole),
  /** One sentence on who sits where. */
  description: z.string(),
});
export type PrototypeSummary = z.infer<typeof prototypeSummary>;
export const prototypeList = z.object({ items: z.array(prototypeSummary) });

/** One ion per role, in the order of the roles. */
export const applyPrototypeRequest = z.object({
  ions: z
    .array(z.object({ element: z.string().max(3), charge: z.number().min(-9).max(9) }))
    .min(1)
    .max(6),
});
export type ApplyPrototypeRequest = z.infer<typeof applyPrototypeRequest>;

export const appliedPrototype = z.object({
  prototype: z.string(),
  suggestedName: z.string(),
  cell: cellDefinition,
  /** How the lattice parameters were guessed, one sentence a person can check. */
  guess: z.string(),
  warnings: z.array(z.object({ code: z.string(), message: z.string() })),
});
export type AppliedPrototype = z.infer<typeof appliedPrototype>;

export const readCifRequest = z.object({ text: z.string().max(2_000_000) });
export const readCifResponse = z.object({
  suggestedName: z.string(),
  cell: cellDefinition,
  warnings: z.array(z.object({ code: z.string(), message: z.string() })),
});
export type ReadCifResponse = z.infer<typeof readCifResponse>;
