import { ionicRadiusA } from '#common/chemistry/ionic-radii';
import { resolveCell } from '#common/physics/resolve-cell';
import { composition } from '#common/physics/composition';
import type { CellDefinition, LatticeParameterTexts } from '#common/schemas/cell';
import type { Warning } from '#common/schemas/evaluation';
import type { AppliedPrototype } from '#common/schemas/prototype';
import { symmetryOf } from '#server/symmetry/space-groups';

import { meanContactA } from './contact-distance.js';
import type { Prototype } from './prototypes.js';
import {
  guessEdge,
  ionText,
  type GuessContact,
  type PrototypeIon,
  type StartingGuess,
} from './starting-guess.js';

/** Å; a guess from radii is good to a few hundredths at best. */
const guessDecimals = 4;

/**
 * Puts ions into a structure type. Edges follow from ionic radii, axial ratios and internal
 * parameters stay those of the file. With the file's own ions the edges stay the measured ones.
 * @param ions one per role, in the order of the roles
 */
export function applyPrototype(
  prototype: Prototype,
  ions: readonly PrototypeIon[],
): AppliedPrototype {
  const warnings = balanceWarnings(prototype, ions);
  const guess = guessEdge(contactsOf(prototype, ions), ionicRadiusA);
  const { lattice, sentence } = sizeOf(prototype, ions, guess, warnings);
  const cell = { ...prototype.cell, lattice, sites: sitesWith(prototype, ions) };
  return {
    prototype: prototype.facts.id,
    suggestedName: suggestName(prototype, cell),
    cell,
    guess: sentence,
    warnings,
  };
}

function balanceWarnings({ summary }: Prototype, ions: readonly PrototypeIon[]): Warning[] {
  const excess = summary.roles.reduce(
    (sum, role, index) => sum + role.perFormulaUnit * ions[index]!.chargeE,
    0,
  );
  if (Math.abs(excess) < 1e-9) {
    return [];
  }
  const signed = `${excess > 0 ? '+' : '−'}${Number(Math.abs(excess).toFixed(6))}`;
  const parts = summary.roles
    .map(({ perFormulaUnit }, index) => `${perFormulaUnit} ${ionText(ions[index]!)}`)
    .join(', ');
  return [
    {
      code: 'prototype.not_neutral',
      message: `The charges of ${parts} leave ${signed} e per formula unit: change a charge or take another structure type.`,
    },
  ];
}

function contactsOf(prototype: Prototype, ions: readonly PrototypeIon[]): GuessContact[] {
  const { facts, resolved } = prototype;
  return facts.contacts.map(({ cation, anion, exactFactor, bonds }) => {
    const cationIndex = facts.roles.findIndex(({ label }) => label === cation);
    const anionIndex = facts.roles.findIndex(({ label }) => label === anion);
    const cationRole = facts.roles[cationIndex]!;
    const distanceA = meanContactA(resolved, cation, anion, cationRole.coordination);
    if (distanceA === null) {
      throw new Error(`${facts.id} has no contact ${cation}–${anion}.`);
    }
    return {
      cation: ions[cationIndex]!,
      cationCoordination: cationRole.coordination,
      anion: ions[anionIndex]!,
      anionCoordination: facts.roles[anionIndex]!.coordination,
      edgeOverDistance: resolved.lattice.aA / distanceA,
      exactFactor,
      bonds,
    };
  });
}

function sizeOf(
  prototype: Prototype,
  ions: readonly PrototypeIon[],
  guess: StartingGuess,
  warnings: Warning[],
): { lattice: LatticeParameterTexts; sentence: string } {
  const { cell, summary } = prototype;
  const kept = shapeKept(prototype);
  const isOwn = summary.roles.every(
    ({ element, charge }, index) =>
      ions[index]!.element === element && ions[index]!.chargeE === charge,
  );
  if (isOwn) {
    const compare =
      guess.kind === 'guess' ? ` From ionic radii it would be ${guess.sentence}.` : '';
    return {
      lattice: cell.lattice,
      sentence: `a = ${cell.lattice.a} Å is that of ${summary.example} itself${kept}.${compare}`,
    };
  }
  if (guess.kind === 'no-radius') {
    const ionNames = guess.ions.join(', ');
    warnings.push({
      code: 'prototype.no_radius',
      message: `No ionic radius is tabulated for ${ionNames}: the edges are still those of ${summary.example}. Set them yourself.`,
    });
    return {
      lattice: cell.lattice,
      sentence: `No guess: a = ${cell.lattice.a} Å is that of ${summary.example}, because no radius is tabulated for ${ionNames}.`,
    };
  }
  return {
    lattice: scaled(prototype, guess.aA),
    sentence: `A guess from ionic radii: ${guess.sentence}${kept}.`,
  };
}

/** What besides a is taken over from the file, said in words. */
function shapeKept({ cell, resolved, summary }: Prototype): string {
  const { aA, cA, gammaDeg } = resolved.lattice;
  const isCubic = aA === cA && gammaDeg === 90;
  const ratio = isCubic ? [] : [`c/a = ${(cA / aA).toFixed(4)}`];
  const free = cell.parameters.map(({ name, expression }) => `${name} = ${expression}`);
  const kept = [...ratio, ...free].join(', ');
  return kept === '' ? '' : `; ${kept} as in ${summary.example}`;
}

function scaled({ cell, resolved }: Prototype, aA: number): LatticeParameterTexts {
  const { aA: fileA, bA, cA } = resolved.lattice;
  const text = (edge: number) => String(Number(((edge / fileA) * aA).toFixed(guessDecimals)));
  return { ...cell.lattice, a: text(fileA), b: text(bA), c: text(cA) };
}

/** The file's sites with the new ions, labelled by element and a running number. */
function sitesWith(prototype: Prototype, ions: readonly PrototypeIon[]): CellDefinition['sites'] {
  const { cell, facts } = prototype;
  const counts = new Map<string, number>();
  return cell.sites.map((site) => {
    const ion = ions[facts.roles.findIndex(({ label }) => label === site.label)]!;
    const count = (counts.get(ion.element) ?? 0) + 1;
    counts.set(ion.element, count);
    return {
      ...site,
      label: `${ion.element}${count}`,
      element: ion.element,
      charge: String(ion.chargeE),
    };
  });
}

function suggestName({ facts }: Prototype, cell: CellDefinition): string {
  const { cell: resolved } = resolveCell(cell, symmetryOf(cell.symmetry));
  return resolved ? `${composition(resolved).formula} (${facts.name.toLowerCase()})` : facts.name;
}
