import { COULOMB_RELATIVE_UNCERTAINTY } from '#common/units/constants';
import type { Bounded } from '#common/schemas/evaluation';

/** Bound of an energy as shown: the numerical one and what is not known of k_e itself. */
export function energyBoundEv({ value, bound }: Bounded): number {
  return bound + Math.abs(value) * COULOMB_RELATIVE_UNCERTAINTY;
}

/** Bound of any quantity proportional to k_e (potential, field, force, stress). */
export function withCoulombUncertainty(value: number, bound: number): number {
  return bound + Math.abs(value) * COULOMB_RELATIVE_UNCERTAINTY;
}
