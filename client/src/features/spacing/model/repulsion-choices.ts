import {
  energeticsLimits,
  type PairPotential,
  type RepulsionModel,
} from '#common/schemas/energetics';

export const repulsionWords: Readonly<
  Record<RepulsionModel['kind'], { label: string; hint: string }>
> = {
  born_lande: { label: 'Born–Landé', hint: 'Repulsion falls with a power n of the spacing.' },
  born_mayer: { label: 'Born–Mayer', hint: 'Repulsion falls exponentially with hardness ρ.' },
  born_mayer_huggins: {
    label: 'Born–Mayer–Huggins',
    hint: 'Every pair repels by the sizes of its ions; fitted to the cell.',
  },
  pair_table: { label: 'Pair table', hint: 'Your own A, ρ and C for each pair of ions.' },
};

/** ρ that serves many salts, Å; common practice. */
const usualHardnessA = 0.345;

/** Every pair of ion kinds once. */
export function pairsOf(speciesKeys: readonly string[]): [string, string][] {
  return speciesKeys.flatMap((one, index) =>
    speciesKeys.slice(index).map((other): [string, string] => [one, other]),
  );
}

/** A table to start from: the pairs a fitted model has, else one row without strength. */
export function startingTable(
  speciesKeys: readonly string[],
  fitted: readonly PairPotential[],
): PairPotential[] {
  const [first = '', second = first] = speciesKeys;
  return fitted.length > 0
    ? fitted.map((pair) => ({ ...pair, prefactorEv: Number(pair.prefactorEv.toPrecision(8)) }))
    : [
        {
          speciesA: first,
          speciesB: second,
          prefactorEv: 1000,
          hardnessA: usualHardnessA,
          dispersionEvA6: 0,
        },
      ];
}

/** A model of a kind with its usual settings. */
export function repulsionOfKind(
  kind: RepulsionModel['kind'],
  speciesKeys: readonly string[],
  fitted: readonly PairPotential[],
): RepulsionModel {
  switch (kind) {
    case 'born_lande':
      return { kind, exponent: { from: 'ions' } };
    case 'born_mayer':
      return { kind, hardnessA: { low: usualHardnessA, high: usualHardnessA } };
    case 'born_mayer_huggins':
      return { kind, hardnessA: null };
    case 'pair_table':
      return {
        kind,
        pairs: startingTable(speciesKeys, fitted).slice(0, energeticsLimits.pairRows),
        cutoffA: 12,
      };
  }
}
