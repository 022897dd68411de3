import { CircleAlert } from 'lucide-react';
import type { JSX } from 'react';

import type { FormationLedger } from '#common/physics/energetics/formation-ledger';
import { middleOf, type FormationLine } from '#common/physics/energetics/formation-line';
import { Button } from '#client/components/button.tsx';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { rangeOn, valueOn } from '#client/features/formation/model/energy-scale.ts';
import type { EnergyScale } from '#client/lib/energy-unit.ts';
import { originWords } from '#client/features/formation/model/words.ts';

interface FiguresProps {
  ledger: FormationLedger;
  scale: EnergyScale;
  onSolveFor: ((key: string) => void) | null;
}

function Open({ ledger, onSolveFor }: FiguresProps): JSX.Element | null {
  const { open } = ledger;
  if (open === null) {
    return null;
  }
  const instead = [...ledger.lines, ledger.formation].find(({ key }) => key === open.solveInstead);
  return (
    <div role="status" className="border-l-3 border-doubtful bg-wash px-4 py-3">
      <h2 className="flex items-center gap-2 text-lead">
        <CircleAlert aria-hidden className="size-4.5 text-doubtful" />
        The account does not close yet
      </h2>
      <p className="mt-1">{open.message}</p>
      {[...ledger.lines, ledger.formation]
        .filter(({ reason }) => reason !== null)
        .slice(0, 3)
        .map(({ key, reason }) => (
          <p key={key} className="mt-1 text-small text-soft">
            {reason}
          </p>
        ))}
      {instead !== undefined && onSolveFor !== null && (
        <Button size="small" className="mt-3" onClick={() => onSolveFor(instead.key)}>
          Solve for the {instead.name}
        </Button>
      )}
    </div>
  );
}

/** The solved number beside what tables, model or the person say about it. */
function Comparison({
  line,
  scale,
}: {
  line: FormationLine;
  scale: EnergyScale;
}): JSX.Element | null {
  const { known, valueKjPerMol } = line;
  if (known === null || valueKjPerMol === null) {
    return null;
  }
  const difference = middleOf(valueKjPerMol) - middleOf(known.valueKjPerMol);
  return (
    <p className="mt-1 text-small text-soft">
      <span title={known.source}>
        {originWords[known.origin]} {valueOn(scale, known.valueKjPerMol)}
      </span>
      {' · difference '}
      <span className="text-ink">
        {rangeOn(scale, { low: difference, high: difference }, true)}
      </span>{' '}
      {scale.unit}
    </p>
  );
}

function Lattice({ ledger, scale }: Pick<FiguresProps, 'ledger' | 'scale'>): JSX.Element {
  const { formation, latticeEnthalpyKjPerMol, latticeEnergyKjPerMol } = ledger;
  const items = [
    ['formation enthalpy', formation.valueKjPerMol],
    ['lattice enthalpy, 298 K', latticeEnthalpyKjPerMol],
    ['lattice energy, 0 K', latticeEnergyKjPerMol],
  ] as const;
  return (
    <dl className="mt-3.5 mb-4 grid grid-cols-[repeat(auto-fit,minmax(9.2rem,1fr))] gap-x-6 gap-y-2.5">
      {items.map(([name, range]) => (
        <div key={name} className="min-w-0">
          <dd className="text-lead font-medium">{range === null ? '–' : rangeOn(scale, range)}</dd>
          <dt className="text-small text-soft">{name}</dt>
        </div>
      ))}
    </dl>
  );
}

/** What the account gives: the solved line in large figures, and the sums beside it. */
export function FormationFigures(props: FiguresProps): JSX.Element {
  const { ledger, scale } = props;
  const solved = [...ledger.lines, ledger.formation].find(({ isSolved }) => isSolved);
  const value = solved?.valueKjPerMol ?? null;
  const isModel = ledger.lines.some(({ origin, isExcluded }) => origin === 'model' && !isExcluded);
  if (ledger.open !== null || solved === undefined || value === null) {
    return <Open {...props} />;
  }
  const perWhat = ['lattice', 'formation'].includes(solved.key)
    ? 'per formula unit'
    : 'per mole of it';
  return (
    <section aria-label="Result of the account">
      <p className="flex flex-wrap items-baseline gap-x-2">
        <span className="text-[clamp(28px,7.6vw,38px)] leading-[1.08] font-bold tracking-[-0.03em]">
          {rangeOn(scale, value)}
        </span>
        <span className="text-lead text-soft">{scale.unit}</span>
      </p>
      <p className="mt-1 text-small text-soft">
        {solved.name}
        {solved.kind === 'formation' && (
          <>
            {' of '}
            <FormulaText formula={ledger.formula} />
          </>
        )}
        {`, ${perWhat}, solved from the other lines`}
        {isModel && ' · model value'}
      </p>
      {ledger.isPartial && (
        <p role="note" className="mt-1 flex gap-1.5 text-small text-doubtful">
          <CircleAlert aria-hidden className="mt-0.5 size-3.5 shrink-0" />
          Lines are left out: this is not a whole account of formation.
        </p>
      )}
      <Comparison line={solved} scale={scale} />
      <Lattice ledger={ledger} scale={scale} />
    </section>
  );
}
