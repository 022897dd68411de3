import { LoaderCircle } from 'lucide-react';
import { useMemo, type JSX, type ReactNode } from 'react';

import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationResult } from '#common/schemas/evaluation';
import { certainDigits } from '#common/units/certain-digits';
import { Skeleton } from '#client/components/skeleton.tsx';
import { EnergyFigures } from '#client/features/electrostatics/components/energy-figures.tsx';
import { EvaluationProblem } from '#client/features/electrostatics/components/evaluation-problem.tsx';
import { PairLedger } from '#client/features/electrostatics/components/pair-ledger.tsx';
import { ReachControls } from '#client/features/electrostatics/components/reach-controls.tsx';
import { Warnings } from '#client/features/electrostatics/components/warnings.tsx';
import type { LiveEvaluation } from '#client/features/electrostatics/hooks/use-live-evaluation.ts';
import {
  reachRange,
  usePairLedger,
  type LedgerChoice,
} from '#client/features/electrostatics/hooks/use-pair-ledger.ts';
import { energyBoundEv } from '#client/features/electrostatics/model/bounds.ts';
import {
  pickedPair,
  touchedRows,
  type PickedIon,
} from '#client/features/electrostatics/model/picked-ions.ts';

export interface LedgerProps {
  cell: ResolvedCell | null;
  choice: LedgerChoice;
  onChoice: (choice: LedgerChoice) => void;
  picked: readonly PickedIon[];
  selectedKey: string | null;
  onSelect: (key: string | null) => void;
  remarksByKey: ReadonlyMap<string, readonly number[]>;
}

function Ledger({ result, ...props }: LedgerProps & { result: EvaluationResult }): JSX.Element {
  const { cell, choice, picked } = props;
  const { ledger, isBehind } = usePairLedger(cell, result, choice);
  const range = useMemo(() => reachRange(cell, result), [cell, result]);
  const touched = useMemo(() => {
    const [one, other] = picked;
    const pair =
      cell !== null && one !== undefined && other !== undefined
        ? pickedPair(cell, one, other, ledger)
        : null;
    return touchedRows(ledger, picked, pair);
  }, [cell, ledger, picked]);
  const energy = result.energyEvPerFormulaUnit;
  return (
    <>
      <PairLedger
        ledger={ledger}
        selectedKey={props.selectedKey}
        onSelect={props.onSelect}
        touchedKeys={touched}
        remarksByKey={props.remarksByKey}
        totalDecimals={certainDigits(energy.value, energyBoundEv(energy)).decimals}
        isBehind={isBehind}
      />
      <ReachControls
        choice={choice}
        usualA={result.pairLedger.reachA}
        range={range}
        onChange={props.onChoice}
      />
    </>
  );
}

function Waiting(): JSX.Element {
  return (
    <div role="status" aria-label="Computing" className="grid gap-4">
      <Skeleton className="h-10 w-3/4" />
      <Skeleton className="w-1/2" />
      {Array.from({ length: 10 }, (_, index) => (
        <Skeleton key={index} className="h-5" />
      ))}
    </div>
  );
}

/** Says, after a moment, that newer numbers are on their way; takes no room. */
function PendingMark({ isPending }: { isPending: boolean }): JSX.Element {
  return (
    <p
      role="status"
      className="pointer-events-none absolute top-0 right-0 flex h-5 items-center gap-1.5 bg-paper text-small text-soft"
    >
      {isPending && (
        <>
          <LoaderCircle aria-hidden className="size-3.5 animate-spin" /> computing
        </>
      )}
    </p>
  );
}

/** The numbers of a cell: figures and pair ledger, or why there are none. */
export function EnergyPanel({
  live,
  fallback,
  problemAction,
  ...ledger
}: LedgerProps & {
  live: LiveEvaluation;
  /** Shown where there is nothing to evaluate yet. */
  fallback: ReactNode;
  problemAction?: ReactNode;
}): JSX.Element {
  const { evaluation, problem, isPending } = live;
  if (problem !== null) {
    return <EvaluationProblem problem={problem} onRetry={live.retry} action={problemAction} />;
  }
  if (evaluation === null) {
    if (live.isBehind) {
      return isPending ? <Waiting /> : <div className="min-h-96" />;
    }
    return <>{fallback}</>;
  }
  return (
    <div className="relative" aria-busy={isPending}>
      <PendingMark isPending={isPending} />
      <EnergyFigures result={evaluation.result} />
      <Ledger result={evaluation.result} {...ledger} />
      <Warnings warnings={evaluation.result.warnings} />
    </div>
  );
}
