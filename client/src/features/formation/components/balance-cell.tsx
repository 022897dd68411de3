import type { CSSProperties, JSX } from 'react';

import type { BalanceBar } from '#client/features/formation/model/balance.ts';

/** Share of the half axis that the longest bar takes; the rest is air. */
const reach = 0.96;
const at = (value: number): string => `${(50 + 50 * reach * value).toFixed(3)}%`;
const across = (from: number, to: number): CSSProperties => ({
  left: at(Math.min(from, to)),
  width: `max(1px, ${(50 * reach * Math.abs(to - from)).toFixed(3)}%)`,
});

const colours = { binds: 'var(--bind)', opposes: 'var(--oppose)', none: 'var(--line)' } as const;

/** One line's bar on the axis, hatched where it is solved or spans a range, and the running balance. */
export function BalanceCell({
  bar,
  isHatched,
}: {
  bar: BalanceBar;
  isHatched: boolean;
}): JSX.Element {
  const colour = colours[bar.sense];
  const hatch = `repeating-linear-gradient(45deg, ${colour} 0 3px, transparent 3px 6px)`;
  const solid = isHatched ? hatch : colour;
  const { before, after } = bar;
  const isRange = bar.whole.low < bar.certain.low || bar.whole.high > bar.certain.high;
  const look = 'absolute top-1/2 h-[15px] -translate-y-1/2 rounded-[2px]';
  return (
    <span aria-hidden data-sense={bar.sense} className="relative block h-full min-h-6">
      <span className="absolute inset-y-0 left-1/2 w-px bg-line" />
      {bar.sense !== 'none' && (
        <>
          {isRange && (
            <span
              className={look}
              style={{ ...across(bar.whole.low, bar.whole.high), background: hatch }}
            />
          )}
          <span
            className={look}
            style={{ ...across(bar.certain.low, bar.certain.high), background: solid }}
          />
        </>
      )}
      {before !== null && after !== null && (
        <>
          <span className="absolute top-0 h-px bg-faint" style={across(before, after)} />
          <span
            className="absolute inset-y-0.5 w-0.5 -translate-x-1/2 bg-ink"
            style={{ left: at(after) }}
          />
        </>
      )}
    </span>
  );
}
