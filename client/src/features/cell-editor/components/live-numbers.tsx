import type { JSX, ReactNode } from 'react';

import { summariseCell } from '#common/physics/cell-summary';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import { formatFixed, formatNetCharge, formatTidy } from '#common/units/format';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { classNames } from '#client/lib/class-names.ts';

function Figure({
  name,
  children,
  isWrong = false,
}: {
  name: string;
  children: ReactNode;
  isWrong?: boolean;
}): JSX.Element {
  return (
    <div className="whitespace-nowrap">
      <dt className="text-small text-soft">{name}</dt>
      <dd className={classNames('font-medium', isWrong && 'text-fails')}>{children}</dd>
    </div>
  );
}

interface LiveNumbersProps {
  cell: ResolvedCell | null;
  /** The cell shown is the last readable one: its numbers are not those of the form. */
  isStale: boolean;
  /** The energy, where it is known. */
  energy?: ReactNode;
}

/** What follows from the cell at once: formula, Z, volume, density, charges, contacts. */
export function LiveNumbers({ cell, isStale, energy }: LiveNumbersProps): JSX.Element | null {
  if (cell === null) {
    return null;
  }
  const summary = summariseCell(cell);
  const isCharged = Math.abs(summary.chargeSumE) > 1e-6;
  return (
    <dl
      aria-label="What follows from the cell"
      className={classNames(
        'flex flex-wrap gap-x-7 gap-y-2 rounded-control bg-wash px-4 py-3 transition-opacity duration-150',
        isStale && 'opacity-55',
      )}
    >
      <Figure name="formula">
        <FormulaText formula={summary.formula} />
      </Figure>
      <Figure name="Z, per cell">{formatTidy(summary.formulaUnitsPerCell, 4)}</Figure>
      <Figure name="sites">{cell.sites.length}</Figure>
      <Figure name="volume">{formatFixed(summary.volumeA3, 3)} Å³</Figure>
      <Figure name="density">{formatFixed(summary.densityGPerCm3, 3)} g/cm³</Figure>
      <Figure name={isCharged ? 'charges do not balance' : 'charge sum'} isWrong={isCharged}>
        {formatNetCharge(summary.chargeSumE)}
      </Figure>
      {energy !== undefined && (
        <div className="basis-full">
          <dt className="text-small text-soft">energy</dt>
          <dd className="font-medium">{energy}</dd>
        </div>
      )}
      <div className="basis-full">
        <dt className="text-small text-soft">shortest contacts</dt>
        <dd className="flex flex-wrap gap-x-4">
          {summary.contacts.slice(0, 4).map((contact) => (
            <span key={`${contact.labelA}${contact.labelB}${contact.distanceA}`}>
              {contact.labelA}–{contact.labelB}{' '}
              <span className="text-soft">{formatFixed(contact.distanceA, 3)} Å</span>
            </span>
          ))}
        </dd>
      </div>
    </dl>
  );
}
