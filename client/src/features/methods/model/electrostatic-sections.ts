import {
  ATOMIC_MASS_KG,
  AVOGADRO_PER_MOL,
  COULOMB_EV_ANGSTROM,
  COULOMB_RELATIVE_UNCERTAINTY,
  ELEMENTARY_CHARGE_C,
  EV_IN_KJ_PER_MOL,
  EV_PER_CUBIC_ANGSTROM_IN_GPA,
  GAS_CONSTANT_J_PER_MOL_K,
  SPEED_OF_LIGHT_M_PER_S,
} from '#common/units/constants';
import { defaultEvaluationMethod } from '#common/schemas/cell';
import { formatPower } from '#common/units/format';
import {
  formula,
  say,
  tabulate,
  type MethodSection,
} from '#client/features/methods/model/method-section.ts';

const exact = 'SI, exact';
const codata = 'CODATA 2022';

const constants: MethodSection = {
  id: 'constants',
  title: 'Constants and units',
  blocks: [
    say(
      'Lengths are in Å, energies in eV or kJ/mol, charges in elementary charges, pressures in GPa. All come from these numbers; the program has no others.',
    ),
    tabulate(
      'Physical constants',
      ['Constant', 'Value', 'Source'],
      [
        [
          'Coulomb constant kₑ = e²/(4πε₀)',
          `${COULOMB_EV_ANGSTROM} eV Å`,
          `${codata}: exact e, ε₀ with relative uncertainty ${formatPower(COULOMB_RELATIVE_UNCERTAINTY, 2)}`,
        ],
        ['Avogadro constant', `${formatPower(AVOGADRO_PER_MOL, 9)} mol⁻¹`, exact],
        ['Elementary charge', `${formatPower(ELEMENTARY_CHARGE_C, 10)} C`, exact],
        ['1 eV per particle', `${EV_IN_KJ_PER_MOL} kJ/mol`, exact],
        ['1 eV Å⁻³', `${EV_PER_CUBIC_ANGSTROM_IN_GPA} GPa`, exact],
        ['Gas constant', `${GAS_CONSTANT_J_PER_MOL_K} J mol⁻¹ K⁻¹`, exact],
        ['Atomic mass constant', `${formatPower(ATOMIC_MASS_KG, 12)} kg`, codata],
        ['Speed of light', `${SPEED_OF_LIGHT_M_PER_S} m/s`, exact],
      ],
    ),
  ],
};

const electrostatics: MethodSection = {
  id: 'electrostatics',
  title: 'Electrostatic energy',
  blocks: [
    say(
      'Ions are point charges qᵢ at rᵢ in a cell of volume V that repeats without end. The sum over all of them is split in two that converge fast (P. P. Ewald, 1921), with a splitting parameter η that the result does not depend on:',
    ),
    formula('E_{direct} = ½ k_e Σ_{ij} Σ′_n q_i q_j [erfc(η r)¦r]'),
    formula(
      'E_{reciprocal} = [2π k_e¦V] Σ_{G≠0} [exp(−G^2/4η^2)¦G^2] |S(G)|^2,  S(G) = Σ q_i exp(iG·r_i)',
    ),
    formula('E_{self} = −k_e [η¦√π] Σ q_i^2'),
    say(
      'Boundary: conducting surroundings, no surface term. It matters for cells with a polar axis, and those say so. Zero is all ions infinitely far apart.',
    ),
    formula('E_{background} = −[π k_e¦2Vη^2] Q^2'),
    say(
      'The background is zero for a neutral cell. A cell whose charges do not add up to zero has no Madelung energy and is refused, unless a uniform background is switched on; every number then carries that mark.',
    ),
    formula('E = ½ Σ q_i φ_i,  F_i = −q_i ∇φ_i,  σ = [1¦V] [∂E¦∂ε],  tr(σ) V = −E'),
    say(
      'φ is the potential of all other ions at a site. A site that several ions share, or that is partly empty, carries its mean charge: the sum of occupancy times charge.',
    ),
  ],
};

const madelung: MethodSection = {
  id: 'madelung',
  title: 'Madelung constants',
  blocks: [
    say(
      'Four conventions are in use; each number is labelled with its own. E is the energy of one formula unit, d₀ the shortest cation–anion distance, a the first cell edge, z the charges. The values are those of rock salt with charges ±1 and of fluorite.',
    ),
    tabulate(
      'Conventions of the Madelung constant',
      ['Name', 'Definition', 'Rock salt', 'Fluorite'],
      [
        ['M(d₀), charges included', '−E d₀ / kₑ', '1.747 565', '5.038 785'],
        [
          'M′, per charge product',
          'M(d₀) / |z₊ z₋|, two kinds of ion only',
          '1.747 565',
          '2.519 392',
        ],
        [
          'M̃, reduced',
          '2 M(d₀) / Σ z² over the formula unit (D. H. Templeton, 1953)',
          '1.747 565',
          '1.679 595',
        ],
        ['M(a), per cell edge', '−E a / kₑ', '3.495 129', '11.636 575'],
      ],
    ),
    say(
      'Scaling a cell uniformly changes none of them. Where one means nothing it is left out, with the reason.',
    ),
  ],
};

const ledger: MethodSection = {
  id: 'pair-ledger',
  title: 'Pair ledger',
  blocks: [
    say(
      'The sums over like pairs and over unlike pairs each grow without end; only the whole is definite. The ledger lists what is not ambiguous: for each kind of pair within a reach R its distance d, the number n of such pairs per formula unit, and',
    ),
    formula('contribution = n k_e [q_A q_B¦d]'),
    say(
      'Unlike ions bind (negative, to the left), like ions oppose (positive, to the right). One last row holds all that lies beyond R: the periodic total less the rows. The account always closes. Unless set, R is the smallest that completes a shell at three times d₀ or more.',
    ),
    say(
      'In the neutralised view each ion’s sphere is made neutral at R, which shows how the balance settles as R grows:',
    ),
    formula('contribution = n k_e q_A q_B ([1¦d] − [1¦R]),  self = −k_e [Σ q^2¦2R]'),
  ],
};

const sublattices: MethodSection = {
  id: 'sublattices',
  title: 'Sublattice matrix',
  blocks: [
    say(
      'The periodic sum by kinds of ion A and B. Each kind alone is charged, so each pair carries its own background term, twice for A ≠ B; in a neutral cell these add up to zero.',
    ),
    formula('E = Σ_{A≤B} E_{AB},  background of AB = −[π k_e¦2Vη^2] Q_A Q_B'),
    say(
      'Each sublattice sits in its own uniform compensating background: like sublattices come out negative and the cross term may be positive. Only sums over neutral combinations are physical.',
    ),
  ],
};

const digits: MethodSection = {
  id: 'digits',
  title: 'Certain digits',
  blocks: [
    say(
      'Every energy and constant has an absolute bound: what both sums leave out at their cut-offs, and an estimate of rounding. The cell is summed again with another η, and the difference, the virial, the sum of forces and ½ Σ qφ − E must lie within their bounds; the certificate lists them.',
    ),
    say(
      'A number is shown as far as value − bound and value + bound round to the same digits. Energies, potentials and forces also carry the uncertainty of kₑ; Madelung constants do not depend on it.',
    ),
    say(
      `Unless asked otherwise the tolerance is ${formatPower(defaultEvaluationMethod.toleranceRelative)} of Σ q²/d₀.`,
    ),
  ],
};

/** Constants, periodic sums and what is read from them. */
export const electrostaticSections: readonly MethodSection[] = [
  constants,
  electrostatics,
  madelung,
  ledger,
  sublattices,
  digits,
];
