import { X } from 'lucide-react';
import type { JSX, ReactNode } from 'react';

import type { EvaluationResult } from '#common/schemas/evaluation';
import { formatFixed, formatSigned, formatTidy } from '#common/units/format';
import { IconButton } from '#client/components/button.tsx';
import { IonText } from '#client/components/chem/ion-text.tsx';
import type { PickedIon, PickedPair } from '#client/features/electrostatics/model/picked-ions.ts';

interface PickedBarProps {
  picked: readonly PickedIon[];
  pair: PickedPair | null;
  result: EvaluationResult | null;
  onClear: () => void;
  /** Buttons: shells, remark. */
  actions?: ReactNode;
}

function Name({ ion }: { ion: PickedIon }): JSX.Element {
  return (
    <span className="whitespace-nowrap">
      <strong className="font-medium">{ion.site.label}</strong>{' '}
      <IonText speciesKey={ion.site.speciesKey} />
    </span>
  );
}

function OneIon({ ion, result }: { ion: PickedIon; result: EvaluationResult | null }): JSX.Element {
  const site = result?.sites.find((one) => one.label === ion.site.label);
  const shell = site?.shells[0];
  return (
    <p className="flex flex-wrap gap-x-4 gap-y-0.5">
      <Name ion={ion} />
      {site !== undefined && <span>φ {formatFixed(site.potentialV, 2)} V</span>}
      {site !== undefined && <span>½qφ {formatFixed(site.energyShareEv, 2)} eV</span>}
      {shell !== undefined && (
        <span className="text-soft">
          {shell.multiplicity} × <IonText speciesKey={shell.speciesKey} /> at{' '}
          {formatFixed(shell.distanceA, 3)} Å
        </span>
      )}
    </p>
  );
}

/** Share of one pair in its row, in words. */
function shareOf({ row }: PickedPair): string | null {
  if (row === null) {
    return null;
  }
  const percent = formatTidy(100 / row.pairsPerFormulaUnit, 1);
  return `one of ${formatTidy(row.pairsPerFormulaUnit, 2)} such pairs per formula unit: ${percent} % of ${formatSigned(row.contributionEv, 2)} eV`;
}

function TwoIons({
  ions,
  pair,
}: {
  ions: readonly [PickedIon, PickedIon];
  pair: PickedPair;
}): JSX.Element {
  return (
    <p className="flex flex-wrap gap-x-4 gap-y-0.5">
      <span>
        <Name ion={ions[0]} /> – <Name ion={ions[1]} />
      </span>
      <span>{formatFixed(pair.distanceA, 4)} Å</span>
      <span className={pair.energyEv < 0 ? 'text-bind' : 'text-oppose'}>
        {formatSigned(pair.energyEv, 4)} eV {pair.energyEv < 0 ? 'binds' : 'opposes'}
      </span>
      <span className="text-soft">{shareOf(pair) ?? 'beyond the reach of the ledger'}</span>
    </p>
  );
}

/** What is picked in the stage, in one line under it. */
export function PickedBar({ picked, pair, result, onClear, actions }: PickedBarProps): JSX.Element {
  const [one, other] = picked;
  return (
    <div
      role="status"
      aria-label="Picked in the stage"
      className="flex min-h-11 items-center gap-3 border-t border-line py-1.5 text-small md:px-1"
    >
      <div className="grow">
        {one === undefined && (
          <p className="text-soft">
            Pick an ion to see what surrounds it; pick a second with Shift for their distance.
          </p>
        )}
        {one !== undefined && other === undefined && <OneIon ion={one} result={result} />}
        {one !== undefined && other !== undefined && pair !== null && picked.length === 2 && (
          <TwoIons ions={[one, other]} pair={pair} />
        )}
        {picked.length > 2 && <p>{picked.length} ions picked.</p>}
      </div>
      {one !== undefined && (
        <div className="flex shrink-0 items-center gap-1">
          {actions}
          <IconButton
            label="Let go of the picked ions"
            icon={<X aria-hidden className="size-4" />}
            onClick={onClear}
          />
        </div>
      )}
    </div>
  );
}
