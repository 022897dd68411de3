import type { FormationLedger } from '#common/physics/energetics/formation-ledger';
import { exactly, type FormationLine } from '#common/physics/energetics/formation-line';
import type { ValueRange } from '#common/schemas/energetics';

/** What exists at a level of the account. */
export type FormationStage = 'elements' | 'gas_atoms' | 'gas_cations' | 'gas_ions' | 'crystal';

/** A level: the energy of everything in one formula unit, counted from the elements. */
export interface FormationLevel {
  readonly stage: FormationStage;
  readonly energyKjPerMol: ValueRange;
}

/** One line of the account as a change of level. */
export interface FormationRise {
  readonly line: FormationLine;
  readonly fromKjPerMol: ValueRange;
  readonly toKjPerMol: ValueRange;
}

/** A level and the changes that lead to the next one; the last level has none. */
export interface FormationLevelGroup extends FormationLevel {
  readonly rises: readonly FormationRise[];
}

const stages: readonly { stage: FormationStage; kinds: readonly FormationLine['kind'][] }[] = [
  { stage: 'gas_atoms', kinds: ['atomisation'] },
  { stage: 'gas_cations', kinds: ['ionisation'] },
  { stage: 'gas_ions', kinds: ['affinity'] },
  { stage: 'crystal', kinds: ['lattice', 'heat'] },
];

function risesOf(lines: readonly FormationLine[], start: ValueRange): FormationRise[] {
  let at = start;
  return lines.map((line) => {
    const rise = { line, fromKjPerMol: at, toKjPerMol: line.runningKjPerMol ?? at };
    at = rise.toKjPerMol;
    return rise;
  });
}

/**
 * The levels from the elements (zero) through gas atoms and gas ions to the crystal, with the lines
 * that lead from each to the next; kJ per mole of formula units. Lines left out change nothing and
 * are not among them. Null while the account is open.
 */
export function formationLevels(ledger: FormationLedger): readonly FormationLevelGroup[] | null {
  if (ledger.open !== null) {
    return null;
  }
  const groups: FormationLevelGroup[] = [];
  let level: FormationLevel = { stage: 'elements', energyKjPerMol: exactly(0) };
  for (const { stage, kinds } of stages) {
    const lines = ledger.lines.filter(
      ({ kind, isExcluded }) => kinds.includes(kind) && !isExcluded,
    );
    const rises = risesOf(lines, level.energyKjPerMol);
    const last = rises.at(-1);
    if (last !== undefined) {
      groups.push({ ...level, rises });
      level = { stage, energyKjPerMol: last.toKjPerMol };
    }
  }
  return [...groups, { ...level, rises: [] }];
}
