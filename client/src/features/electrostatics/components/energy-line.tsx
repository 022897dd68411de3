import type { JSX } from 'react';

import { CertainNumber } from '#client/components/chem/certain-number.tsx';
import type { LiveEvaluation } from '#client/features/electrostatics/hooks/use-live-evaluation.ts';
import { energyBoundEv } from '#client/features/electrostatics/model/bounds.ts';
import { conventions } from '#client/features/electrostatics/model/conventions.ts';

/** The energy in one line, for places where the ledger is not shown; says why there is none. */
export function EnergyLine({ live }: { live: LiveEvaluation }): JSX.Element {
  const { evaluation, problem, isPending } = live;
  if (problem !== null) {
    return <span className="font-normal text-fails">{problem.message}</span>;
  }
  if (evaluation === null) {
    return <span className="font-normal text-soft">{isPending ? 'computing …' : '–'}</span>;
  }
  const energy = evaluation.result.energyEvPerFormulaUnit;
  return (
    <span className={isPending ? 'opacity-60' : undefined}>
      <CertainNumber
        value={energy.value}
        bound={energyBoundEv(energy)}
        unit="eV per formula unit"
        convention={conventions.energy}
      />
    </span>
  );
}
