import { useSyncExternalStore } from 'react';

import { EV_IN_KJ_PER_MOL } from '#common/units/constants';

export type EnergyUnit = 'kJ mol⁻¹' | 'eV';

/** A unit energies are shown and typed in. */
export interface EnergyScale {
  readonly unit: EnergyUnit;
  readonly kjPerMol: number;
  /** Decimals of sums and contributions. */
  readonly decimals: number;
  /** Decimals of a single value as the tables give it, at most. */
  readonly fineDecimals: number;
}

/** Model energies are good for a few parts in a thousand at best: no more digits are shown. */
export const energyScales: Readonly<Record<EnergyUnit, EnergyScale>> = {
  'kJ mol⁻¹': { unit: 'kJ mol⁻¹', kjPerMol: 1, decimals: 1, fineDecimals: 3 },
  eV: { unit: 'eV', kjPerMol: EV_IN_KJ_PER_MOL, decimals: 3, fineDecimals: 5 },
};

const storageKey = 'holdfast.energy-unit';
const listeners = new Set<() => void>();

function read(): EnergyUnit {
  try {
    return localStorage.getItem(storageKey) === 'eV' ? 'eV' : 'kJ mol⁻¹';
  } catch {
    // Storage may be blocked; the usual unit then serves.
    return 'kJ mol⁻¹';
  }
}

let unit = read();

/** Takes another unit on every screen, and remembers it on this device. */
export function setEnergyUnit(next: EnergyUnit): void {
  unit = next;
  try {
    localStorage.setItem(storageKey, next);
  } catch {
    // Not remembered where storage is blocked; it still holds until the page closes.
  }
  for (const listener of listeners) {
    listener();
  }
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** The unit energies are shown in. */
export function useEnergyScale(): EnergyScale {
  return energyScales[useSyncExternalStore(subscribe, () => unit)];
}
