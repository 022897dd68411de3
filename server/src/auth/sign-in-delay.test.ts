import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { delayAfterMs, type AttemptKind } from './sign-in-delay.js';

const kinds: AttemptKind[] = ['account', 'address', 'browser'];

describe('delayAfterMs', () => {
  it('lets a few slips pass', () => {
    expect(kinds.map((kind) => delayAfterMs(kind, 4))).toEqual([0, 0, 0]);
  });

  it('never shrinks with more failures and is never endless', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...kinds),
        fc.integer({ min: 0, max: 1_000_000 }),
        (kind, failures) => {
          const delay = delayAfterMs(kind, failures);
          expect(delay).toBeLessThanOrEqual(delayAfterMs(kind, failures + 1));
          expect(delay).toBeLessThanOrEqual(15 * 60_000);
        },
      ),
    );
  });

  it('keeps the wait of an account to a minute, which a stranger can cause', () => {
    expect(delayAfterMs('account', 10_000)).toBe(60_000);
  });
});
