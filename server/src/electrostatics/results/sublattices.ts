import type { SpeciesOfCell } from '#common/physics/pair-ledger';

/** More ion kinds than this make a matrix nobody reads, and one that costs more than the sums. */
const mostSublattices = 32;

/** Classes of sites for the sublattice matrix. */
export interface Sublattices {
  readonly keys: readonly string[];
  readonly indexOfSite: Int32Array;
  /** True where there are too many ion kinds, and the classes are the signs of the charges. */
  readonly areMerged: boolean;
}

/** One class per ion kind, or, with too many kinds, cations, anions and uncharged sites. */
export function sublatticesOf(species: SpeciesOfCell): Sublattices {
  if (species.keys.length <= mostSublattices) {
    return { keys: species.keys, indexOfSite: species.indexOfSite, areMerged: false };
  }
  const classOf = (chargeE: number) =>
    chargeE > 0 ? 'cations' : chargeE < 0 ? 'anions' : 'uncharged';
  const keys = ['cations', 'anions', 'uncharged'].filter((key) =>
    species.chargesE.some((chargeE) => classOf(chargeE) === key),
  );
  const indexOfSite = species.indexOfSite.map((kind) =>
    keys.indexOf(classOf(species.chargesE[kind]!)),
  );
  return { keys, indexOfSite, areMerged: true };
}
