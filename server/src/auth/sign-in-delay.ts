const second = 1000;

/** What failed sign-ins are counted by. */
export type AttemptKind = 'account' | 'address' | 'browser';

interface Limit {
  /** Failures in a row before the first wait. */
  readonly free: number;
  /** Longest wait, in milliseconds. */
  readonly longestMs: number;
}

// The wait of an account stays short: whoever knows an address could otherwise shut its owner out.
// One guess a minute still takes longer than a lifetime for twelve characters.
const limits: Record<AttemptKind, Limit> = {
  account: { free: 5, longestMs: 60 * second },
  browser: { free: 5, longestMs: 60 * second },
  address: { free: 20, longestMs: 900 * second },
};

/** Failures this old are forgotten, in milliseconds. */
export const forgetAfterMs = 24 * 3600 * second;

/** How long to wait after so many failures in a row: nothing, then 1 s, 2 s, 4 s …, in ms. */
export function delayAfterMs(kind: AttemptKind, failures: number): number {
  const { free, longestMs } = limits[kind];
  return failures < free ? 0 : Math.min(longestMs, second * 2 ** (failures - free));
}
