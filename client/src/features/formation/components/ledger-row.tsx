import type { JSX } from 'react';

import type { FormationLine } from '#common/physics/energetics/formation-line';
import { formatTidy } from '#common/units/format';
import { BalanceCell } from '#client/features/formation/components/balance-cell.tsx';
import { LineValue } from '#client/features/formation/components/line-value.tsx';
import { ReactionText } from '#client/features/formation/components/reaction-text.tsx';
import { SourceMark } from '#client/features/formation/components/source-mark.tsx';
import type { BalanceBar } from '#client/features/formation/model/balance.ts';
import { rangeOn } from '#client/features/formation/model/energy-scale.ts';
import type { EnergyScale } from '#client/lib/energy-unit.ts';
import { signCaution } from '#client/features/formation/model/formation-choices.ts';
import { capitalised, noteOf, originWords } from '#client/features/formation/model/words.ts';
import { classNames } from '#client/lib/class-names.ts';

/** What a row can change; null where the account may only be read. */
export interface LineActions {
  readonly type: (key: string, valueKjPerMol: number) => void;
  readonly restore: (key: string) => void;
  readonly exclude: (key: string, isExcluded: boolean) => void;
  readonly solveFor: (key: string) => void;
}

interface LedgerRowProps {
  line: FormationLine;
  /** Place in the account, as in the diagram; null for the sum. */
  number: number | null;
  bar: BalanceBar;
  scale: EnergyScale;
  actions: LineActions | null;
  isLit: boolean;
  onLight: (key: string | null) => void;
}

function CountSwitch({ line, actions }: Pick<LedgerRowProps, 'line' | 'actions'>): JSX.Element {
  const isFixed = actions === null || !line.mayExclude || line.isSolved;
  return (
    <input
      type="checkbox"
      aria-label={`Count the ${line.name}`}
      title={line.isSolved ? 'The solved line always counts.' : 'Untick to leave this line out'}
      checked={!line.isExcluded}
      disabled={isFixed}
      onChange={(event) => actions?.exclude(line.key, !event.target.checked)}
      className="size-4 accent-(--ink) disabled:opacity-55"
    />
  );
}

function SourceOf({
  line,
  scale,
  actions,
}: Omit<LedgerRowProps, 'bar' | 'number' | 'isLit' | 'onLight'>): JSX.Element {
  const tone = line.origin === 'missing' ? 'missing' : line.origin === 'typed' ? 'own' : 'soft';
  return (
    <>
      <SourceMark
        word={originWords[line.origin]}
        lines={noteOf(line, scale)}
        tone={tone}
        label={line.name}
      />
      {line.origin === 'missing' && actions !== null && !line.isExcluded && (
        <button
          type="button"
          className="rounded-control text-small font-medium underline underline-offset-4"
          onClick={() => actions.solveFor(line.key)}
          aria-label={`Solve for the ${line.name}`}
        >
          solve for it
        </button>
      )}
    </>
  );
}

function Named({
  line,
  scale,
  actions,
}: Omit<LedgerRowProps, 'bar' | 'number' | 'isLit' | 'onLight'>): JSX.Element {
  const value = line.valueKjPerMol;
  const caution =
    line.isTyped && !line.isSolved && value !== null ? signCaution(line.kind, value.low) : null;
  return (
    <>
      <span className={classNames('block', line.isExcluded && 'text-soft line-through')}>
        {capitalised(line.name)}
      </span>
      <span className="flex flex-wrap gap-x-2 text-small text-soft">
        {line.from.length > 0 && <ReactionText from={line.from} to={line.to} />}
        {line.remark !== null && <span>{line.remark}</span>}
        <SourceOf line={line} scale={scale} actions={actions} />
      </span>
      {caution !== null && <span className="block text-small text-doubtful">{caution}</span>}
    </>
  );
}

/** Columns from 480 px on; below that the bar and the value share a second line. */
export const rowGrid =
  'grid grid-cols-[1.75rem_minmax(0,1fr)_max-content] gap-x-2 ' +
  'sm:grid-cols-[2.75rem_minmax(0,1.9fr)_8.25rem_minmax(5.75rem,1fr)_4.75rem]';

/** One line of the account: what happens, its value, its bar, its share. */
export function LedgerRow(props: LedgerRowProps): JSX.Element {
  const { line, number, bar, scale, actions } = props;
  const contribution = line.contributionKjPerMol;
  const times = Math.abs(line.coefficient - 1) < 1e-9 ? '' : `${formatTidy(line.coefficient, 3)} ×`;
  return (
    <div
      role="row"
      data-line={line.key}
      onPointerEnter={() => props.onLight(line.key)}
      onPointerLeave={() => props.onLight(null)}
      onFocus={() => props.onLight(line.key)}
      onBlur={() => props.onLight(null)}
      className={classNames(
        rowGrid,
        'border-b border-wash',
        line.isSolved && 'bg-wash',
        props.isLit && 'bg-raised',
      )}
    >
      <span
        role="cell"
        className="flex items-start gap-1 py-2 pl-1.5 text-small text-soft max-sm:flex-col"
      >
        <CountSwitch line={line} actions={actions} />
        {number !== null && <span className="leading-4 whitespace-nowrap">{number}</span>}
      </span>
      <span role="cell" className="min-w-0 py-1.5">
        <Named line={line} scale={scale} actions={actions} />
      </span>
      <span
        role="cell"
        className="flex items-start justify-end gap-1.5 py-1.5 max-sm:col-start-2 max-sm:row-start-2 max-sm:justify-start max-sm:pt-0"
      >
        {times !== '' && (
          <span className="pt-1 text-small whitespace-nowrap text-soft">{times}</span>
        )}
        <span className="leading-7">
          <LineValue
            line={line}
            scale={scale}
            onType={actions && ((value) => actions.type(line.key, value))}
            onRestore={() => actions?.restore(line.key)}
          />
        </span>
      </span>
      <span
        role="cell"
        className="max-sm:col-span-3 max-sm:col-start-1 max-sm:row-start-3 max-sm:h-6"
      >
        <span className="sr-only">{bar.sense === 'none' ? '' : bar.sense}</span>
        <BalanceCell bar={bar} isHatched={line.isSolved} />
      </span>
      <span
        role="cell"
        className={classNames(
          'py-1.5 pr-1 text-right leading-7 sm:whitespace-nowrap max-sm:col-start-3 max-sm:row-start-1',
          line.isExcluded && 'text-soft',
        )}
        title={
          line.runningKjPerMol === null
            ? undefined
            : `running balance ${rangeOn(scale, line.runningKjPerMol, true)} ${scale.unit}`
        }
      >
        {contribution === null
          ? '–'
          : line.isExcluded
            ? 'left out'
            : rangeOn(scale, contribution, true)}
      </span>
    </div>
  );
}
