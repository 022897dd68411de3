import { bornExponent } from '#common/chemistry/born-exponent';
import { usualExponents } from '#common/physics/energetics/born-exponent-of-cell';
import { LATTICE_HEAT_KJ_PER_MOL_OF_PARTICLES } from '#common/physics/energetics/formation-heat';
import { kapustinskiiConstants } from '#common/physics/energetics/kapustinskii';
import { formatFixed } from '#common/units/format';
import {
  formula,
  say,
  tabulate,
  type MethodSection,
} from '#client/features/methods/model/method-section.ts';

/** One ion for each closed shell that has an exponent. */
const shells: readonly (readonly [string, string, number])[] = [
  ['Li⁺', 'Li', 1],
  ['Na⁺', 'Na', 1],
  ['K⁺', 'K', 1],
  ['Cu⁺', 'Cu', 1],
  ['Rb⁺', 'Rb', 1],
  ['Ag⁺', 'Ag', 1],
  ['Cs⁺', 'Cs', 1],
  ['Au⁺', 'Au', 1],
];

function exponentRow([ion, element, chargeE]: (typeof shells)[number]): string[] {
  const found = bornExponent(element, chargeE);
  return [ion, found === null ? '–' : String(found.value), found?.source ?? ''];
}

const repulsion: MethodSection = {
  id: 'repulsion',
  title: 'Repulsion, lattice energy and spacing',
  blocks: [
    say(
      'The cell is scaled uniformly, every distance times s, s = 1 as given. Its electrostatic energy is then −A/s with A = −E per formula unit. The repulsion model adds R(s). These are model energies at 0 K.',
    ),
    formula('Born–Landé:  R(s) = [A¦n] s^{−n},  U = −A (1 − [1¦n]),  K = [(n − 1) A¦9V]'),
    formula(
      'Born–Mayer:  R(s) = [Aρ¦r_0] exp(−r_0 (s − 1)/ρ),  U = −A (1 − [ρ¦r_0]),  K = [A (r_0/ρ − 2)¦9V]',
    ),
    say(
      'V is the volume of a formula unit, r₀ the shortest cation–anion distance, K the bulk modulus. Sources: M. Born, A. Landé (1918) Verh. Dtsch. Phys. Ges. 20, 210; M. Born, J. E. Mayer (1932) Z. Phys. 75, 1.',
    ),
    formula('Pair table:  u(r) = A exp(−r/ρ) − [C¦r^6]'),
    formula(
      'Born–Mayer–Huggins:  u(r) = c_{ij} b exp((r_i + r_j − r)/ρ),  c_{ij} = 1 + [z_i¦N_i] + [z_j¦N_j]',
    ),
    say(
      'c are Pauling’s factors, N the numbers of outer electrons. One constant is fitted so that the cell as given is at rest under uniform scaling.',
    ),
    formula('Exponent from a measured bulk modulus:  n = 1 + [9 K V¦A]'),
    tabulate(
      'Born exponents by closed shell; a compound takes the mean over its ion kinds',
      ['Ion', 'Exponent', 'Source'],
      shells.map(exponentRow),
    ),
    say(
      `An exponent outside ${usualExponents.low} to ${usualExponents.high} brings a warning (common practice, no source).`,
    ),
  ],
};

const { energyLengthKjAPerMol, repulsionA } = kapustinskiiConstants;
const kapustinskii: MethodSection = {
  id: 'kapustinskii',
  title: 'Kapustinskii’s estimate',
  blocks: [
    say('From formula and ionic radii alone, without a structure:'),
    formula('U = −K [Σ n z^2¦r_+ + r_−] (1 − [d¦r_+ + r_−])'),
    say(
      `K = ${energyLengthKjAPerMol} kJ mol⁻¹ Å, d = ${repulsionA} Å (A. F. Kapustinskii, 1956, Q. Rev. Chem. Soc. 10, 283). For more than two kinds of ion the radii are means.`,
    ),
  ],
};

const formation: MethodSection = {
  id: 'formation',
  title: 'Formation ledger',
  blocks: [
    say(
      'The Born–Haber account, kJ per mole of formula units: energy put in is positive, energy given off negative.',
    ),
    formula('ΔH_f = Σ atomisation + Σ ionisation + Σ affinities + lattice enthalpy'),
    say(
      'Atomisation starts from the elements in their standard states; a diatomic gas gives half its bond enthalpy per atom. Affinities are enthalpies of gaining an electron. The lattice line runs from gas ions to crystal and is negative. Any one line may be solved from the rest.',
    ),
    say(
      `Atomisation, lattice and formation enthalpies are those at 298.15 K, ionisation energies and affinities those at 0 K: in a neutral compound the electrons’ own enthalpy cancels. A lattice energy from a model belongs to 0 K; ½ RT = ${formatFixed(LATTICE_HEAT_KJ_PER_MOL_OF_PARTICLES, 4)} kJ/mol for each gas ion turns it into the enthalpy.`,
    ),
  ],
};

const dynamics: MethodSection = {
  id: 'dynamics',
  title: 'Relaxation, elastic constants, vibrations',
  blocks: [
    say(
      'Holdfast’s engine computes these; no page offers them yet. All three follow from the pair model: periodic electrostatics and the short-range terms, with forces, stress and second derivatives in closed form.',
    ),
    say('Relaxation lowers the energy over cell and coordinates within the space group.'),
    formula('C_{ij} = [1¦V] [∂^2E¦∂ε_i ∂ε_j], ions free to follow'),
    say(
      'Elastic constants are judged by the Born criterion: the matrix of constants must be positive definite (F. Mouhat, F.-X. Coudert, 2014, Phys. Rev. B 90, 224104). Bulk and shear moduli of a powder are the means of Voigt and Reuss after Hill.',
    ),
    formula('D_{ij} = [Φ_{ij}¦√(m_i m_j)],  D e = ω^2 e'),
    say(
      'Vibrations are those at the centre of the zone, from the dynamical matrix with standard atomic masses. An imaginary frequency means that the structure gives way along that mode.',
    ),
  ],
};

const cautions: MethodSection = {
  id: 'cautions',
  title: 'What these numbers are not',
  blocks: [
    say(
      'Models of point charges leave out covalence, polarisation and most of dispersion. They are best for halides of the alkali metals and oxides of small, hard ions; soft or strongly polarising ions may come out in the wrong order.',
    ),
    say(
      'Nothing here is a procedure for making or handling a compound. For any such work the safety data sheet, local codes and licensed practice decide.',
    ),
  ],
};

/** What follows from a repulsion model, and the limits of all of it. */
export const energeticSections: readonly MethodSection[] = [
  repulsion,
  kapustinskii,
  formation,
  dynamics,
];
export const cautionSection: MethodSection = cautions;
