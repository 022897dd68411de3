import type { JSX } from 'react';

import type { LatticeSummary } from '#common/schemas/lattice';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { RelativeTime } from '#client/components/relative-time.tsx';
import { LatticeActions } from '#client/features/shelf/components/lattice-actions.tsx';
import {
  EnergyCell,
  NameCell,
  SpaceGroupCell,
  StateCell,
} from '#client/features/shelf/components/lattice-cells.tsx';

interface ShelfCardsProps {
  workspace: string;
  lattices: readonly LatticeSummary[];
}

function Card({ workspace, lattice }: { workspace: string; lattice: LatticeSummary }): JSX.Element {
  const address = lattice.deletedAt === null ? `/w/${workspace}/lattices/${lattice.id}` : null;
  return (
    <li className="rounded-control border border-line bg-raised px-4 py-3">
      <div className="flex items-start justify-between gap-3">
        <NameCell lattice={lattice} address={address} />
        <span className="-mt-1 -mr-2">
          <LatticeActions lattice={lattice} workspace={workspace} />
        </span>
      </div>
      <div className="mt-1 flex flex-wrap gap-x-4 text-soft">
        {lattice.formula !== null && (
          <span className="text-ink">
            <FormulaText formula={lattice.formula} />
          </span>
        )}
        {lattice.prototype !== null && <span>{lattice.prototype.replaceAll('-', ' ')}</span>}
        {lattice.spaceGroupSymbol !== null && <SpaceGroupCell lattice={lattice} />}
      </div>
      <div className="mt-2 flex items-baseline justify-between gap-3">
        <span>
          <EnergyCell lattice={lattice} />
          {lattice.energyEvPerFormulaUnit !== null && (
            <span className="text-small text-soft"> eV per formula unit</span>
          )}
        </span>
      </div>
      <div className="mt-2 flex items-center justify-between gap-3 border-t border-line pt-2">
        <StateCell lattice={lattice} />
        <span className="text-small text-soft">
          <RelativeTime at={lattice.deletedAt ?? lattice.updatedAt} />
        </span>
      </div>
    </li>
  );
}

/** The shelf on a phone: a card for each lattice. */
export function ShelfCards({ workspace, lattices }: ShelfCardsProps): JSX.Element {
  return (
    <ul aria-label="Lattices" className="grid gap-3">
      {lattices.map((lattice) => (
        <Card key={lattice.id} workspace={workspace} lattice={lattice} />
      ))}
    </ul>
  );
}
