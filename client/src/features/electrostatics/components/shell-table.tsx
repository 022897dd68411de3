import type { JSX } from 'react';

import type { ShellRow } from '#common/schemas/evaluation';
import { formatFixed, formatSigned } from '#common/units/format';
import { IonText } from '#client/components/chem/ion-text.tsx';
import { RunningLine, SenseBar } from '#client/features/electrostatics/components/sense-bar.tsx';
import { layOutBar, ledgerDecimals } from '#client/features/electrostatics/model/ledger-layout.ts';

interface ShellTableProps {
  rows: readonly ShellRow[];
  /** Lights the pairs of one shell in the stage. */
  litRow: number | null;
  onLight: (row: ShellRow, index: number) => void;
}

const head = 'pb-1.5 text-small font-normal text-soft';

/** Neighbours of one ion, shell by shell: how many, and what they do to it. */
export function ShellTable({ rows, litRow, onLight }: ShellTableProps): JSX.Element {
  const scaleEv = rows.reduce(
    (most, row) => Math.max(most, Math.abs(row.energyEv), Math.abs(row.runningEv)),
    0,
  );
  const bars = rows.map((row) => layOutBar(row.energyEv, row.runningEv, scaleEv));
  const decimals = ledgerDecimals(scaleEv);
  if (rows.length === 0) {
    return <p className="py-3 text-soft">No neighbour lies within the reach.</p>;
  }
  return (
    <table className="w-full border-collapse whitespace-nowrap">
      <thead>
        <tr className="border-b border-line text-left">
          <th scope="col" className={`${head} pl-2.5`}>
            neighbour
          </th>
          <th scope="col" className={head}>
            d, Å
          </th>
          <th scope="col" className={head}>
            n
          </th>
          <th scope="col" className={`${head} w-2/5 px-2`}>
            <span className="flex justify-between">
              <span>binds</span> <span>opposes</span>
            </span>
          </th>
          <th scope="col" className={`${head} text-right`}>
            eV
          </th>
          <th scope="col" className={`${head} text-right max-sm:hidden`}>
            sum, eV
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row, index) => (
          <tr
            key={`${row.speciesKey}${row.distanceA}`}
            className={`h-[31px] border-b border-wash ${index === litRow ? 'bg-raised shadow-[inset_3px_0_0_var(--ink)]' : ''}`}
          >
            <td className="pl-2.5 whitespace-nowrap">
              <button
                type="button"
                aria-pressed={index === litRow}
                title="Show these neighbours in the stage"
                className="rounded-control underline-offset-4 hover:underline"
                onClick={() => onLight(row, index)}
              >
                <IonText speciesKey={row.speciesKey} />
              </button>
            </td>
            <td className="pr-2 text-small text-soft">{formatFixed(row.distanceA, 3)}</td>
            <td className="pr-2 text-small text-soft">{row.multiplicity}</td>
            <td className="relative h-[31px] px-2">
              <span className="block h-full">
                <SenseBar bar={bars[index]!} isThin />
              </span>
              {index === 0 && (
                <span
                  className="absolute inset-x-2 top-0 block"
                  style={{ height: `${rows.length * 31}px` }}
                >
                  <RunningLine bars={bars} rowCount={rows.length} />
                </span>
              )}
            </td>
            <td className="text-right">{formatSigned(row.energyEv, decimals)}</td>
            <td className="pl-3 text-right text-small text-soft max-sm:hidden">
              {formatSigned(row.runningEv, decimals)}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
