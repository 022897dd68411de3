import { useMemo, type JSX } from 'react';

import type { ResolvedCell } from '#common/physics/resolved-cell';
import { buildShellTable } from '#common/physics/shell-table';
import type { EvaluationResult, SiteResult } from '#common/schemas/evaluation';
import { IonText } from '#client/components/chem/ion-text.tsx';
import { ShellTable } from '#client/features/electrostatics/components/shell-table.tsx';
import { SiteResults } from '#client/features/electrostatics/components/site-results.tsx';
import { isRowOf, type PickedIon } from '#client/features/electrostatics/model/picked-ions.ts';
import { frontIonId } from '#client/routes/lattice-page/front-ion.ts';

interface SitesPanelProps {
  cell: ResolvedCell | null;
  result: EvaluationResult;
  picked: readonly PickedIon[];
  row: string | null;
  reachA: number | null;
  onPick: (ids: readonly string[]) => void;
  onRow: (key: string | null) => void;
}

/** Shells of the ion picked last; each lights the ledger row it is part of. */
function Shells({
  cell,
  result,
  ion,
  row,
  reachA,
  onRow,
}: Omit<SitesPanelProps, 'picked' | 'onPick'> & {
  cell: ResolvedCell;
  ion: PickedIon;
}): JSX.Element {
  const reach = reachA ?? result.pairLedger.reachA;
  const shells = useMemo(
    () => buildShellTable(cell, ion.siteIndex, reach),
    [cell, ion.siteIndex, reach],
  );
  const keys = shells.map(
    (shell) =>
      result.pairLedger.rows.find(
        (one) =>
          Math.abs(one.distanceA - shell.distanceA) < 2e-3 &&
          isRowOf(one, ion.site.speciesKey, shell.speciesKey),
      )?.key ?? `${ion.site.speciesKey}|${shell.speciesKey}|${shell.distanceA.toFixed(3)}`,
  );
  const lit = row === null ? -1 : keys.indexOf(row);
  return (
    <section aria-labelledby="shells-title">
      <h2 id="shells-title" className="mb-2 text-lead">
        Around {ion.site.label} <IonText speciesKey={ion.site.speciesKey} />
      </h2>
      <ShellTable
        rows={shells}
        litRow={lit === -1 ? null : lit}
        onLight={(_shell, index) => onRow(index === lit ? null : (keys[index] ?? null))}
      />
    </section>
  );
}

/** What each site feels, and the shells around the picked ion. */
export function SitesPanel(props: SitesPanelProps): JSX.Element {
  const { cell, result, picked } = props;
  const ion = picked.at(-1);
  const pick = (site: SiteResult): void => {
    const id = cell === null ? null : frontIonId(cell, site.label);
    const isPicked = ion?.site.label === site.label;
    props.onPick(id === null || isPicked ? [] : [id]);
  };
  return (
    <div className="grid grid-cols-1 gap-7">
      <SiteResults
        result={result}
        pickedLabels={new Set(picked.map((one) => one.site.label))}
        onPick={pick}
      />
      {cell !== null && ion !== undefined ? (
        <Shells {...props} cell={cell} ion={ion} />
      ) : (
        <p className="text-soft">Pick a site here or an ion in the stage to see its shells.</p>
      )}
    </div>
  );
}
