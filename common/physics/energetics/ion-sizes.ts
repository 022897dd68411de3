import { ionicRadiusA } from '#common/chemistry/ionic-radii';
import type { DataOverrides } from '#common/chemistry/sourced';
import type { ResolvedCell, SiteComponent } from '#common/physics/resolved-cell';
import type { EvaluationResult } from '#common/schemas/evaluation';
import { formatCharge, superscript } from '#common/units/format';

/** An ion kind of the cell with its surroundings. */
export interface SizedIon {
  readonly speciesKey: string;
  readonly components: readonly SiteComponent[];
  readonly chargeE: number;
  readonly perFormulaUnit: number;
  /** Neighbours of opposite charge up to a quarter beyond the nearest. */
  readonly coordination: number;
  /** Mean effective ionic radius for that coordination; null where the tables have none. */
  readonly radiusA: number | null;
}

/** An ion kind as chemists write it: `Mg²⁺`; the ions of a shared site one after the other. */
export const ionName = ({ components }: Pick<SizedIon, 'components'>): string =>
  components
    .map(({ element, chargeE }) => `${element}${superscript(formatCharge(chargeE))}`)
    .join('/');

/** Neighbours this much farther than the nearest of opposite charge still count as its shell. */
const shellWidth = 1.25;

function coordinationOf(speciesKey: string, result: EvaluationResult): number {
  const site = result.sites.find((one) => one.speciesKey === speciesKey);
  const charges = new Map(result.species.map(({ key, charge }) => [key, charge]));
  const opposite = (site?.shells ?? []).filter(
    (shell) => (charges.get(shell.speciesKey) ?? 0) * (site?.charge ?? 0) < 0,
  );
  const nearestA = Math.min(...opposite.map(({ distanceA }) => distanceA));
  return opposite
    .filter(({ distanceA }) => distanceA <= shellWidth * nearestA)
    .reduce((sum, { multiplicity }) => sum + multiplicity, 0);
}

/** Mean radius of the ions on a site, weighted by their occupancies. */
function radiusOf(
  components: readonly SiteComponent[],
  coordination: number,
  overrides: DataOverrides,
): number | null {
  let sum = 0;
  let weight = 0;
  for (const { element, chargeE, occupancy } of components) {
    const radius = ionicRadiusA(element, chargeE, coordination, undefined, overrides);
    if (radius === null) {
      return null;
    }
    sum += radius.radiusA * occupancy;
    weight += occupancy;
  }
  return sum / weight;
}

/** The ion kinds of an evaluated cell with coordination and size. */
export function sizedIons(
  cell: ResolvedCell,
  result: EvaluationResult,
  overrides: DataOverrides,
): SizedIon[] {
  return result.species.map(({ key, charge, perFormulaUnit }) => {
    const components = cell.sites.find((site) => site.speciesKey === key)?.components ?? [];
    const coordination = coordinationOf(key, result);
    return {
      speciesKey: key,
      components,
      chargeE: charge,
      perFormulaUnit,
      coordination,
      radiusA: components.length === 0 ? null : radiusOf(components, coordination, overrides),
    };
  });
}
