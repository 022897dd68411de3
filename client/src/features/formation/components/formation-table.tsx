import type { JSX } from 'react';

import type { FormationLedger } from '#common/physics/energetics/formation-ledger';
import {
  LedgerRow,
  rowGrid,
  type LineActions,
} from '#client/features/formation/components/ledger-row.tsx';
import { balanceBar, balanceScale } from '#client/features/formation/model/balance.ts';
import type { EnergyScale } from '#client/lib/energy-unit.ts';
import { classNames } from '#client/lib/class-names.ts';

interface FormationTableProps {
  ledger: FormationLedger;
  scale: EnergyScale;
  actions: LineActions | null;
  lit: string | null;
  onLight: (key: string | null) => void;
}

function Head({ scale }: { scale: EnergyScale }): JSX.Element {
  return (
    <div
      role="row"
      className={classNames(rowGrid, 'border-b border-line pb-1.5 text-small text-soft')}
    >
      <span role="columnheader" className="pl-1.5">
        <span className="sr-only">counted, number</span>
      </span>
      <span role="columnheader">line</span>
      <span role="columnheader" className="text-right max-sm:sr-only">
        value
      </span>
      <span
        role="columnheader"
        className="flex justify-between gap-1 whitespace-nowrap max-sm:sr-only"
      >
        <span>binds</span> <span>opposes</span>
      </span>
      <span role="columnheader" className="pr-1 text-right">
        {scale.unit}
      </span>
    </div>
  );
}

/** The account line by line: left binds, right opposes, the balance running down to the sum. */
export function FormationTable(props: FormationTableProps): JSX.Element {
  const { ledger, scale, actions, lit, onLight } = props;
  const { lines, formation } = ledger;
  const most = balanceScale(ledger);
  return (
    <div role="table" aria-label="Formation account">
      <Head scale={scale} />
      {lines.map((line, at) => (
        <LedgerRow
          key={line.key}
          line={line}
          number={at + 1}
          bar={balanceBar(
            line,
            at === 0 ? { low: 0, high: 0 } : (lines[at - 1]?.runningKjPerMol ?? null),
            most,
          )}
          scale={scale}
          actions={actions}
          isLit={lit === line.key}
          onLight={onLight}
        />
      ))}
      <div className="border-t border-ink">
        <LedgerRow
          line={formation}
          number={null}
          bar={balanceBar(formation, null, most)}
          scale={scale}
          actions={actions}
          isLit={false}
          onLight={onLight}
        />
      </div>
    </div>
  );
}
