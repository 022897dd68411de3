import type { JSX } from 'react';

import type { PairLedger } from '#common/schemas/evaluation';
import { formatFixed } from '#common/units/format';
import { Button } from '#client/components/button.tsx';
import { Segmented } from '#client/components/segmented.tsx';
import type { LedgerChoice } from '#client/features/electrostatics/hooks/use-pair-ledger.ts';

interface ReachControlsProps {
  choice: LedgerChoice;
  usualA: number;
  range: { minA: number; maxA: number };
  onChange: (choice: LedgerChoice) => void;
}

const views: readonly { value: PairLedger['view']; label: string; title: string }[] = [
  { value: 'bare', label: 'bare', title: 'The Coulomb energy of each pair as it is.' },
  {
    value: 'neutralised',
    label: 'neutralised',
    title: 'Each ion’s sphere is made neutral at the reach, so that the rest shrinks as it grows.',
  },
];

const sliderLook =
  'h-6 min-w-0 grow cursor-pointer appearance-none bg-transparent ' +
  '[&::-webkit-slider-runnable-track]:h-[3px] [&::-webkit-slider-runnable-track]:rounded-full [&::-webkit-slider-runnable-track]:bg-line ' +
  '[&::-webkit-slider-thumb]:-mt-1.5 [&::-webkit-slider-thumb]:size-[15px] [&::-webkit-slider-thumb]:appearance-none [&::-webkit-slider-thumb]:rounded-full [&::-webkit-slider-thumb]:bg-ink ' +
  '[&::-moz-range-thumb]:size-[15px] [&::-moz-range-thumb]:border-0 [&::-moz-range-thumb]:bg-ink [&::-moz-range-track]:h-[3px] [&::-moz-range-track]:bg-line';

/** How far the rows go, and whether each ion’s sphere is made neutral there. */
export function ReachControls({
  choice,
  usualA,
  range,
  onChange,
}: ReachControlsProps): JSX.Element {
  const reachA = choice.reachA ?? usualA;
  return (
    <div className="flex flex-wrap items-center gap-x-3 gap-y-2 pt-3.5 pl-2.5 text-small text-soft">
      <label className="flex min-w-56 grow items-center gap-3">
        Reach
        <input
          type="range"
          className={sliderLook}
          min={range.minA}
          max={range.maxA}
          step={0.01}
          value={reachA}
          aria-valuetext={`${formatFixed(reachA, 2)} Å`}
          onChange={(event) => onChange({ ...choice, reachA: Number(event.target.value) })}
        />
        <span className="w-14 text-right text-ink">{formatFixed(reachA, 2)} Å</span>
      </label>
      {choice.reachA !== null && (
        <Button size="small" variant="quiet" onClick={() => onChange({ ...choice, reachA: null })}>
          Default
        </Button>
      )}
      <Segmented
        label="View of the ledger"
        options={views}
        value={choice.view}
        onChange={(view) => onChange({ ...choice, view })}
      />
    </div>
  );
}
