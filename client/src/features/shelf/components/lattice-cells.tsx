import type { JSX } from 'react';
import { Link } from 'react-router-dom';

import type { LatticeSummary } from '#common/schemas/lattice';
import { COULOMB_RELATIVE_UNCERTAINTY } from '#common/units/constants';
import { CertainText } from '#client/components/chem/certain-number.tsx';
import { SpaceGroupText } from '#client/components/chem/space-group-text.tsx';
import { StateBadge } from '#client/components/state-badge.tsx';

/** In the place of a value that a lattice does not have. */
export function Missing({ what }: { what: string }): JSX.Element {
  return (
    <span className="text-soft">
      <span aria-hidden>–</span>
      <span className="sr-only">{what}</span>
    </span>
  );
}

/** Name, leading to the lattice where it can be opened, and its tags. */
export function NameCell({
  lattice,
  address,
}: {
  lattice: LatticeSummary;
  address: string | null;
}): JSX.Element {
  return (
    <span className="flex min-w-0 flex-wrap items-baseline gap-x-2.5 gap-y-1">
      {address === null ? (
        <span className="font-medium">{lattice.name}</span>
      ) : (
        <Link
          to={address}
          className="rounded-control font-medium decoration-faint underline-offset-4 hover:underline"
        >
          {lattice.name}
        </Link>
      )}
      {lattice.tags.map((tag) => (
        <span
          key={tag}
          className="rounded-control border border-line px-1.5 text-small whitespace-nowrap text-soft"
        >
          {tag}
        </span>
      ))}
    </span>
  );
}

export function SpaceGroupCell({ lattice }: { lattice: LatticeSummary }): JSX.Element {
  return lattice.spaceGroupSymbol === null ? (
    <Missing what="no space group" />
  ) : (
    <span className="whitespace-nowrap">
      <SpaceGroupText symbol={lattice.spaceGroupSymbol} />
      {lattice.spaceGroupNumber !== null && (
        <span className="text-soft"> · {lattice.spaceGroupNumber}</span>
      )}
    </span>
  );
}

export function MadelungCell({ lattice }: { lattice: LatticeSummary }): JSX.Element {
  return lattice.madelungReduced === null ? (
    <Missing what="no Madelung constant" />
  ) : (
    <CertainText {...lattice.madelungReduced} />
  );
}

const shortReasons: Partial<Record<string, string>> = {
  'cell.not_neutral': 'charges don’t balance',
  'cell.no_charges': 'no charges',
  'cell.coincident_sites': 'sites coincide',
  'cell.no_sites': 'no sites yet',
};

export function EnergyCell({ lattice }: { lattice: LatticeSummary }): JSX.Element {
  const energy = lattice.energyEvPerFormulaUnit;
  if (energy === null) {
    return lattice.problemCode === null ? (
      <Missing what="not computed" />
    ) : (
      <span className="text-small whitespace-nowrap text-fails">
        {shortReasons[lattice.problemCode] ?? 'the cell has errors'}
      </span>
    );
  }
  const bound = energy.bound + Math.abs(energy.value) * COULOMB_RELATIVE_UNCERTAINTY;
  return <CertainText value={energy.value} bound={bound} unit="eV" />;
}

/** State, how many remarks wait, whether someone is editing. */
export function StateCell({ lattice }: { lattice: LatticeSummary }): JSX.Element {
  const isEdited = lattice.hasDraft && lattice.headRevision > 0;
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap">
      <StateBadge state={lattice.state} />
      {lattice.openRemarks > 0 && (
        <span className="text-small text-oppose">
          {lattice.openRemarks} {lattice.openRemarks === 1 ? 'remark' : 'remarks'}
        </span>
      )}
      {isEdited && <span className="text-small text-soft max-[1320px]:hidden">edited</span>}
    </span>
  );
}
