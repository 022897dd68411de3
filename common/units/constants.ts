/**
 * Physical constants, CODATA 2022 (exact SI where exact). Å, eV and elementary charges inside.
 * Source: SI definition of e and N_A; vacuum permittivity ε₀ = 8.854 187 8188(14) × 10⁻¹² F m⁻¹.
 */

/** Coulomb constant k_e = e²/(4πε₀) in eV Å, from CODATA 2022 e and ε₀. */
export const COULOMB_EV_ANGSTROM = 14.399645469;

/** Relative standard uncertainty of k_e, which is that of ε₀ (CODATA 2022). */
export const COULOMB_RELATIVE_UNCERTAINTY = 1.6e-10;

/** 1 eV Å⁻³ in GPa: e × 10²¹ (exact SI). */
export const EV_PER_CUBIC_ANGSTROM_IN_GPA = 160.2176634;

/** Avogadro constant in mol⁻¹ (exact SI). */
export const AVOGADRO_PER_MOL = 6.02214076e23;

/** 1 g mol⁻¹ Å⁻³ in g cm⁻³: 10²⁴ / N_A. */
export const GRAM_PER_MOL_CUBIC_ANGSTROM_IN_GRAM_PER_CM3 = 1e24 / AVOGADRO_PER_MOL;

/** 1 eV per particle in kJ mol⁻¹: e N_A (exact SI), 96.485 332 12. */
export const EV_IN_KJ_PER_MOL = (1.602176634e-19 * AVOGADRO_PER_MOL) / 1000;

/** Gas constant R = N_A k_B in J mol⁻¹ K⁻¹ (exact SI). */
export const GAS_CONSTANT_J_PER_MOL_K = 8.31446261815324;

/** Elementary charge in C, and so 1 eV in J (exact SI). */
export const ELEMENTARY_CHARGE_C = 1.602176634e-19;

/** Atomic mass constant u in kg, CODATA 2022: 1.660 539 068 92(52) × 10⁻²⁷. */
export const ATOMIC_MASS_KG = 1.66053906892e-27;

/** Speed of light in m s⁻¹ (exact SI). */
export const SPEED_OF_LIGHT_M_PER_S = 299_792_458;
