import { describe, expect, it } from 'vitest';

import { id } from '#common/schemas/shared';

import { uuidV7 } from './uuid-v7.js';

describe('uuidV7', () => {
  it('has the layout of RFC 9562: time, version 7, variant 10', () => {
    // The time of the example in RFC 9562, appendix A.6: 0x017F22E279B0. Later ids of this process
    // must not run backwards, so the example's time is only right for the first one made.
    const made = uuidV7(0x017f22e279b0);
    expect(made).toMatch(/^017f22e2-79b0-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
    expect(id.safeParse(made).success).toBe(true);
  });

  it('sorts as it was made and never repeats, within a millisecond and when the clock steps back', () => {
    const now = Date.now();
    const made = Array.from({ length: 20_000 }, (_, index) => uuidV7(now - (index % 3)));
    expect([...made].sort()).toEqual(made);
    expect(new Set(made).size).toBe(made.length);
  });
});
