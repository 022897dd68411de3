import type { CSSProperties, JSX } from 'react';

import type { LedgerBar } from '#client/features/electrostatics/model/ledger-layout.ts';
import { classNames } from '#client/lib/class-names.ts';

/** Share of the column's half that the longest bar takes; the rest is air. */
const barReach = 0.96;

const percent = (at: number): string => `${(50 + 50 * barReach * at).toFixed(3)}%`;

const colours = { binds: 'var(--bind)', opposes: 'var(--oppose)', none: 'var(--line)' } as const;

function look({ from, to, sense }: LedgerBar, isHatched: boolean): CSSProperties {
  const colour = colours[sense];
  return {
    left: percent(from),
    // Never thinner than a hair: a small row still shows which way it pulls.
    width: `max(1px, ${(50 * barReach * (to - from)).toFixed(3)}%)`,
    background: isHatched
      ? `repeating-linear-gradient(45deg, ${colour} 0 3px, transparent 3px 6px)`
      : colour,
  };
}

/** One bar on the axis: left binds, right opposes. Hatched where it stands for a remainder. */
export function SenseBar({
  bar,
  isHatched = false,
  isThin = false,
}: {
  bar: LedgerBar;
  isHatched?: boolean;
  isThin?: boolean;
}): JSX.Element {
  return (
    <span className="relative block h-full" data-sense={bar.sense}>
      <span className="absolute inset-y-0 left-1/2 w-px bg-line" />
      {bar.sense !== 'none' && (
        <span
          className={classNames(
            'absolute top-1/2 -translate-y-1/2 rounded-[2px]',
            isThin ? 'h-2.5' : 'h-[15px]',
          )}
          style={look(bar, isHatched)}
        />
      )}
    </span>
  );
}

/** The balance as it runs down the rows: a fine stepped line over the bars. */
export function RunningLine({
  bars,
  className,
  rowCount,
}: {
  bars: readonly LedgerBar[];
  rowCount: number;
  className?: string;
}): JSX.Element {
  const at = (bar: LedgerBar): string => (bar.running * barReach).toFixed(5);
  const upright = bars.map((bar, row) => `M${at(bar)} ${row + 0.08}V${row + 0.92}`).join('');
  const across = bars
    .map((bar, row) => `${row === 0 ? 'M0 0' : ''}H${at(bar)}V${row + 1}`)
    .join('');
  return (
    <svg
      aria-hidden
      viewBox={`-1 0 2 ${Math.max(1, rowCount)}`}
      preserveAspectRatio="none"
      className={classNames(
        'pointer-events-none absolute inset-0 size-full overflow-visible',
        className,
      )}
    >
      <path d={across} fill="none" className="stroke-faint" vectorEffect="non-scaling-stroke" />
      <path
        d={upright}
        fill="none"
        className="stroke-ink"
        strokeWidth="2"
        vectorEffect="non-scaling-stroke"
      />
    </svg>
  );
}
