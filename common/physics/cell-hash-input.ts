import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationMethod } from '#common/schemas/cell';

/** The space group a result names. */
export interface NamedSpaceGroup {
  readonly number: number;
  readonly symbol: string;
}

/** JSON with sorted keys: the same meaning gives the same text. Numbers by shortest round trip. */
function canonical(value: unknown): string {
  if (Array.isArray(value)) {
    return `[${value.map(canonical).join(',')}]`;
  }
  if (typeof value === 'object' && value !== null) {
    const entries = Object.entries(value as Record<string, unknown>)
      .filter(([, entry]) => entry !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, entry]) => `${JSON.stringify(key)}:${canonical(entry)}`);
    return `{${entries.join(',')}}`;
  }
  return JSON.stringify(value);
}

/**
 * Exactly what an evaluation depends on, as one text to hash: the cell in numbers (however it was
 * typed), the method, the space group it names and the version of the engine.
 */
export function evaluationHashInput(
  cell: ResolvedCell,
  method: EvaluationMethod,
  spaceGroup: NamedSpaceGroup | null,
  engineVersion: string,
): string {
  return canonical({
    engineVersion,
    method,
    spaceGroup,
    lattice: cell.lattice,
    hasPolarAxis: cell.hasPolarAxis,
    sites: cell.sites.map(({ definitionIndex, label, copy, fractional, components }) => ({
      definitionIndex,
      label,
      copy,
      fractional,
      components,
    })),
  });
}
