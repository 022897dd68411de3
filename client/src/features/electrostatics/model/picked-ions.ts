import type { ResolvedCell, ResolvedSite } from '#common/physics/resolved-cell';
import type { PairLedger, PairLedgerRow } from '#common/schemas/evaluation';
import { COULOMB_EV_ANGSTROM } from '#common/units/constants';
import { ionPosition, parseIonId } from '#client/scene/model/ion-id.ts';

/** An ion picked in the stage. */
export interface PickedIon {
  readonly id: string;
  readonly siteIndex: number;
  readonly site: ResolvedSite;
}

/** Ids as the address holds them, those the cell does not have left out. */
export function pickedIons(cell: ResolvedCell, ids: readonly string[]): readonly PickedIon[] {
  return ids.flatMap((id) => {
    const siteIndex = parseIonId(id)?.siteIndex;
    const site = siteIndex === undefined ? undefined : cell.sites[siteIndex];
    return siteIndex === undefined || site === undefined ? [] : [{ id, siteIndex, site }];
  });
}

/** Two picked ions: how far apart, what that one pair contributes, which ledger row it is part of. */
export interface PickedPair {
  readonly distanceA: number;
  /** k_e q₁q₂/d of the two alone. */
  readonly energyEv: number;
  readonly row: PairLedgerRow | null;
}

/** Ledger distances are grouped this closely. */
const sameDistanceA = 2e-3;

export function isRowOf(row: PairLedgerRow, one: string, other: string): boolean {
  return (
    (row.speciesA === one && row.speciesB === other) ||
    (row.speciesA === other && row.speciesB === one)
  );
}

export function pickedPair(
  cell: ResolvedCell,
  one: PickedIon,
  other: PickedIon,
  ledger: PairLedger | null,
): PickedPair | null {
  const a = ionPosition(cell, one.id);
  const b = ionPosition(cell, other.id);
  if (a === null || b === null || one.id === other.id) {
    return null;
  }
  const distanceA = Math.hypot(a[0] - b[0], a[1] - b[1], a[2] - b[2]);
  const row = ledger?.rows.find(
    (candidate) =>
      Math.abs(candidate.distanceA - distanceA) < sameDistanceA &&
      isRowOf(candidate, one.site.speciesKey, other.site.speciesKey),
  );
  return {
    distanceA,
    energyEv: (COULOMB_EV_ANGSTROM * one.site.chargeE * other.site.chargeE) / distanceA,
    row: row ?? null,
  };
}

/** Keys of the ledger rows that picked ions take part in: both ends for two, any end for one. */
export function touchedRows(
  ledger: PairLedger,
  picked: readonly PickedIon[],
  pair: PickedPair | null,
): ReadonlySet<string> {
  if (pair !== null) {
    return new Set(pair.row === null ? [] : [pair.row.key]);
  }
  const [only] = picked;
  if (only === undefined || picked.length > 1) {
    return new Set();
  }
  const { speciesKey } = only.site;
  return new Set(
    ledger.rows
      .filter((row) => row.speciesA === speciesKey || row.speciesB === speciesKey)
      .map((row) => row.key),
  );
}
