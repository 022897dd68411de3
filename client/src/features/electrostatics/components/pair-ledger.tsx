import { useMemo, type CSSProperties, type JSX, type KeyboardEvent, type ReactNode } from 'react';

import type { PairLedger as Ledger, PairLedgerRow } from '#common/schemas/evaluation';
import { formatFixed, formatSigned, formatTidy } from '#common/units/format';
import { IonPairText } from '#client/components/chem/ion-text.tsx';
import { RunningLine, SenseBar } from '#client/features/electrostatics/components/sense-bar.tsx';
import {
  layOutLedger,
  ledgerDecimals,
  type LedgerBar,
} from '#client/features/electrostatics/model/ledger-layout.ts';
import { classNames } from '#client/lib/class-names.ts';

interface PairLedgerProps {
  ledger: Ledger;
  selectedKey: string | null;
  onSelect: (key: string | null) => void;
  /** Rows that the ions picked in the stage take part in. */
  touchedKeys: ReadonlySet<string>;
  /** Numbers of the remarks pinned to a row. */
  remarksByKey: ReadonlyMap<string, readonly number[]>;
  /** Decimals of the total that are certain. */
  totalDecimals: number;
  /** A newer reach is being worked out. */
  isBehind: boolean;
}

const rowLook =
  'relative col-span-full grid h-[31px] grid-cols-subgrid items-center border-b border-wash';
const gridLook =
  'grid grid-cols-[minmax(6.4rem,max-content)_max-content_max-content_minmax(5.5rem,1fr)_max-content] gap-x-2.5 md:gap-x-4';

function Head(): JSX.Element {
  const cell = 'text-small font-normal text-soft';
  return (
    <div role="rowgroup" className="col-span-full grid grid-cols-subgrid">
      <div
        role="row"
        className="col-span-full grid grid-cols-subgrid border-b border-line pb-1.5 whitespace-nowrap"
      >
        <span role="columnheader" className={classNames(cell, 'pl-2.5')}>
          ion pair
        </span>
        <span role="columnheader" className={cell}>
          d, Å
        </span>
        <span role="columnheader" className={cell} title="pairs per formula unit">
          n
        </span>
        <span role="columnheader" className={classNames(cell, 'flex justify-between gap-2')}>
          <span>binds</span> <span>opposes</span>
        </span>
        <span role="columnheader" className={classNames(cell, 'text-right')}>
          eV
        </span>
      </div>
    </div>
  );
}

interface LineProps {
  row: PairLedgerRow;
  bar: LedgerBar;
  index: number;
  decimals: number;
  isSelected: boolean;
  isTouched: boolean;
  canFocus: boolean;
  remarks: readonly number[];
  onToggle: () => void;
}

function Line({ row, bar, index, decimals, remarks, ...state }: LineProps): JSX.Element {
  return (
    <div
      role="row"
      aria-selected={state.isSelected}
      tabIndex={state.canFocus ? 0 : -1}
      data-key={row.key}
      onClick={state.onToggle}
      title={`running balance ${formatSigned(row.runningEv, decimals)} eV`}
      style={{ gridRow: index + 1 }}
      className={classNames(
        rowLook,
        'cursor-pointer scroll-my-8 -outline-offset-2 hover:bg-raised/70',
        state.isSelected && 'bg-raised shadow-[inset_3px_0_0_var(--ink)]',
        !state.isSelected && state.isTouched && 'shadow-[inset_3px_0_0_var(--faint)]',
      )}
    >
      <span role="gridcell" className="flex items-center gap-1.5 pl-2.5 whitespace-nowrap">
        <IonPairText speciesA={row.speciesA} speciesB={row.speciesB} />
        {remarks.map((number) => (
          <span
            key={number}
            className="grid size-4.5 place-items-center rounded-full rounded-bl-xs bg-ink text-[12px] leading-none font-bold text-paper"
          >
            <span className="sr-only">remark </span>
            {number}
          </span>
        ))}
      </span>
      <span role="gridcell" className="text-small text-soft">
        {formatFixed(row.distanceA, 3)}
      </span>
      <span role="gridcell" className="text-small text-soft">
        {formatTidy(row.pairsPerFormulaUnit, 2)}
      </span>
      <span role="gridcell" className="h-full">
        <span className="sr-only">{bar.sense}</span>
        <SenseBar bar={bar} />
      </span>
      <span role="gridcell" className="text-right">
        {formatSigned(row.contributionEv, decimals)}
      </span>
    </div>
  );
}

function ClosingLine({
  name,
  note,
  bar,
  text,
  style,
  isHatched,
}: {
  name: string;
  note: string;
  bar: LedgerBar;
  text: string;
  style: CSSProperties;
  isHatched: boolean;
}): JSX.Element {
  return (
    <div role="row" className={classNames(rowLook, 'text-soft')} style={style} title={note}>
      <span role="gridcell" className="col-span-3 pl-2.5 whitespace-nowrap">
        {name}
      </span>
      <span role="gridcell" className="h-full">
        <span className="sr-only">{bar.sense}</span>
        <SenseBar bar={bar} isHatched={isHatched} />
      </span>
      <span role="gridcell" className="text-right text-ink">
        {text}
      </span>
    </div>
  );
}

/** Up, down, Home and End go through the rows; Escape lets go. */
function useRowKeys(
  rows: readonly PairLedgerRow[],
  selectedKey: string | null,
  onSelect: (key: string | null) => void,
): (event: KeyboardEvent<HTMLDivElement>) => void {
  return (event) => {
    const focusedKey = document.activeElement?.getAttribute('data-key') ?? selectedKey;
    const at = rows.findIndex((row) => row.key === focusedKey);
    const targets: Record<string, number> = {
      ArrowDown: Math.min(at + 1, rows.length - 1),
      ArrowUp: Math.max(at - 1, 0),
      Home: 0,
      End: rows.length - 1,
    };
    const target = targets[event.key];
    if (target !== undefined) {
      event.preventDefault();
      const isFirst =
        selectedKey === null && (event.key === 'ArrowDown' || event.key === 'ArrowUp');
      const row = rows[isFirst ? Math.max(at, 0) : target];
      if (row !== undefined) {
        onSelect(row.key);
        const line = event.currentTarget.querySelector<HTMLElement>(
          `[data-key="${CSS.escape(row.key)}"]`,
        );
        line?.focus();
        line?.scrollIntoView({ block: 'nearest' });
      }
    } else if (event.key === 'Escape' && selectedKey !== null) {
      event.preventDefault();
      onSelect(null);
    } else if ((event.key === 'Enter' || event.key === ' ') && at >= 0) {
      event.preventDefault();
      const key = rows[at]?.key ?? null;
      onSelect(key === selectedKey ? null : key);
    }
  };
}

function Body({ children, isBehind }: { children: ReactNode; isBehind: boolean }): JSX.Element {
  return (
    <div
      role="rowgroup"
      className={classNames(
        'relative col-span-full grid auto-rows-[31px] grid-cols-subgrid overflow-x-clip transition-opacity duration-150',
        'wide:max-h-[max(20rem,calc(100dvh-31rem))] wide:overflow-y-auto',
        isBehind && 'opacity-60',
      )}
    >
      {children}
    </div>
  );
}

/** The account of what binds and what opposes, pair kind by pair kind, closed by what lies beyond. */
export function PairLedger(props: PairLedgerProps): JSX.Element {
  const { ledger, selectedKey, onSelect, touchedKeys, remarksByKey, totalDecimals } = props;
  const layout = useMemo(() => layOutLedger(ledger), [ledger]);
  const onKeyDown = useRowKeys(ledger.rows, selectedKey, onSelect);
  const decimals = Math.min(ledgerDecimals(layout.scaleEv), Math.max(0, totalDecimals));
  const bars = [...layout.rows, ...(layout.self === null ? [] : [layout.self]), layout.beyond];
  const focusable = ledger.rows.some((row) => row.key === selectedKey)
    ? selectedKey
    : (ledger.rows[0]?.key ?? null);
  return (
    <div role="grid" aria-label="Pair ledger" className={gridLook} onKeyDown={onKeyDown}>
      <Head />
      <Body isBehind={props.isBehind}>
        {ledger.rows.map((row, index) => (
          <Line
            key={row.key}
            row={row}
            bar={layout.rows[index]!}
            index={index}
            decimals={decimals}
            isSelected={row.key === selectedKey}
            isTouched={touchedKeys.has(row.key)}
            canFocus={row.key === focusable}
            remarks={remarksByKey.get(row.key) ?? []}
            onToggle={() => onSelect(row.key === selectedKey ? null : row.key)}
          />
        ))}
        {layout.self !== null && (
          <ClosingLine
            name="own neutral sphere"
            note="−k_e Σq²/(2R): the charge that makes each ion’s sphere neutral, at the ion itself."
            bar={layout.self}
            text={formatSigned(ledger.selfEv, decimals)}
            style={{ gridRow: ledger.rows.length + 1 }}
            isHatched={false}
          />
        )}
        <ClosingLine
          name="beyond reach"
          note="The periodic total less everything above: it closes the account."
          bar={layout.beyond}
          text={formatSigned(ledger.beyondEv, decimals)}
          style={{ gridRow: bars.length }}
          isHatched
        />
        <div
          aria-hidden
          className="pointer-events-none relative"
          style={{ gridColumn: 4, gridRow: `1 / span ${bars.length}` }}
        >
          <RunningLine bars={bars} rowCount={bars.length} />
        </div>
      </Body>
      <div role="rowgroup" className="col-span-full grid grid-cols-subgrid">
        <div role="row" className="col-span-full flex justify-between pt-3 pl-2.5 font-medium">
          <span role="rowheader">Total</span>
          <span role="gridcell">
            {formatFixed(ledger.totalEv, Math.min(decimals + 1, Math.max(0, totalDecimals)))} eV
          </span>
        </div>
      </div>
    </div>
  );
}
