import { GAS_CONSTANT_J_PER_MOL_K } from '#common/units/constants';

/** The temperature that tables of enthalpies mean, K. */
export const TABLE_TEMPERATURE_K = 298.15;

/** RT at 298.15 K in kJ mol⁻¹: 2.479. */
export const RT_KJ_PER_MOL = (GAS_CONSTANT_J_PER_MOL_K * TABLE_TEMPERATURE_K) / 1_000;

/**
 * What turns a lattice energy (gas ions at rest → crystal, 0 K, without zero-point motion) into the
 * enthalpy of the same step at 298.15 K, in kJ per mole of gas particles: +½ RT = 1.239.
 *
 * Formula, for crystal → gas: ΔH_L = U + Σ ν_i (c_i/2 − 2) RT with c = 3 for a monatomic ion, so
 * −½ RT for each; the sign turns with the direction. It holds the gas ions' 5/2 RT against the
 * crystal's 3 RT of lattice vibrations in the classical limit. Source: handbook, "Lattice energies".
 */
export const LATTICE_HEAT_KJ_PER_MOL_OF_PARTICLES = RT_KJ_PER_MOL / 2;
