import { findElement } from '#common/chemistry/elements';
import type {
  FormationComposition,
  FormationIon,
} from '#common/physics/energetics/formation-composition';
import {
  isHalfBond,
  standardState,
  type StandardState,
} from '#common/physics/energetics/formation-standard-states';

/** One particle of a step as chemists write it: ½ Cl₂(g), Na⁺(g), e⁻. */
export interface FormationParticle {
  readonly coefficient: number;
  /** Formula without charge; `e` for an electron. */
  readonly formula: string;
  readonly chargeE: number;
  readonly phase: 's' | 'l' | 'g' | null;
}

export type FormationStepKind = 'atomisation' | 'ionisation' | 'affinity';

/** A step from the elements to the gas ions. */
export interface FormationStep {
  /** As stored with the choices: `ionisation:Na:1`. */
  readonly key: string;
  readonly kind: FormationStepKind;
  readonly element: string;
  /** 1 for the first ionisation or affinity, 2 for the second …; 0 for atomisation. */
  readonly step: number;
  /** Moles of it per mole of formula units. */
  readonly coefficient: number;
  /** In words: `second ionisation of magnesium`. */
  readonly name: string;
  readonly from: readonly FormationParticle[];
  readonly to: readonly FormationParticle[];
  /** Where an atomisation starts; null for the other steps. */
  readonly standardState: StandardState | null;
  /** True where the value is half of a bond enthalpy, ½ D. */
  readonly isHalfBond: boolean;
}

const ordinals = 'first second third fourth fifth sixth seventh eighth ninth'.split(' ');

export const elementName = (element: string): string =>
  (findElement(element)?.name ?? element).toLowerCase();

const gas = (element: string, chargeE: number): FormationParticle => ({
  coefficient: 1,
  formula: element,
  chargeE,
  phase: 'g',
});

const electron: FormationParticle = { coefficient: 1, formula: 'e', chargeE: -1, phase: null };

function atomisationOf(element: string, coefficient: number): FormationStep {
  const state = standardState(element, elementName(element));
  return {
    key: `atomisation:${element}`,
    kind: 'atomisation',
    element,
    step: 0,
    coefficient,
    name: `atomisation of ${elementName(element)}`,
    from: [
      {
        coefficient: 1 / state.atoms,
        formula: state.formula,
        chargeE: 0,
        phase: state.phase,
      },
    ],
    to: [gas(element, 0)],
    standardState: state,
    isHalfBond: isHalfBond(state),
  };
}

function chargingOf(element: string, sign: 1 | -1, step: number, coefficient: number) {
  const kind: FormationStepKind = sign > 0 ? 'ionisation' : 'affinity';
  const before = gas(element, sign * (step - 1));
  const after = gas(element, sign * step);
  const word = sign > 0 ? 'ionisation' : 'electron affinity';
  return {
    key: `${kind}:${element}:${step}`,
    kind,
    element,
    step,
    coefficient,
    name: `${ordinals[step - 1]} ${word} of ${elementName(element)}`,
    from: sign > 0 ? [before] : [before, electron],
    to: sign > 0 ? [after, electron] : [after],
    standardState: null,
    isHalfBond: false,
  } satisfies FormationStep;
}

function sumOf(ions: readonly FormationIon[], counts: (ion: FormationIon) => boolean): number {
  const sum = ions.filter(counts).reduce((total, { count }) => total + count, 0);
  return Number(sum.toFixed(9));
}

function chargings(ions: readonly FormationIon[], elements: readonly string[], sign: 1 | -1) {
  return elements.flatMap((element) => {
    const own = ions.filter((ion) => ion.element === element);
    const most = Math.max(0, ...own.map(({ chargeE }) => sign * chargeE));
    return Array.from({ length: most }, (_, at) =>
      chargingOf(
        element,
        sign,
        at + 1,
        sumOf(own, ({ chargeE }) => sign * chargeE > at),
      ),
    );
  });
}

/**
 * The steps from the elements in their standard states to the gas ions of one formula unit:
 * atomisation of every element, ionisation by ionisation up to each charge, electron by electron
 * down to each charge. An element with two charges (Fe²⁺ and Fe³⁺) shares its first steps.
 */
export function formationSteps({ ions }: FormationComposition): FormationStep[] {
  const elements = [...new Set(ions.map(({ element }) => element))];
  return [
    ...elements.map((element) =>
      atomisationOf(
        element,
        sumOf(ions, (ion) => ion.element === element),
      ),
    ),
    ...chargings(ions, elements, 1),
    ...chargings(ions, elements, -1),
  ];
}

/** Number of gas particles per formula unit. */
export function particleCount({ ions }: FormationComposition): number {
  return sumOf(ions, () => true);
}
