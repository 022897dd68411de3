import { describe, expect, it } from 'vitest';

import { formatAge } from '#client/lib/relative-age.ts';

const now = Date.parse('2026-12-01T12:00:00Z');

describe('formatAge', () => {
  it.each([
    ['2026-12-01T11:59:40Z', 'just now'],
    ['2026-12-01T11:45:00Z', '15 minutes ago'],
    ['2026-12-01T10:00:00Z', '2 hours ago'],
    ['2026-11-30T11:00:00Z', 'yesterday'],
    ['2026-11-20T12:00:00Z', 'last week'],
    ['2024-11-01T12:00:00Z', '2 years ago'],
    ['2026-12-04T13:00:00Z', 'in 3 days'],
    ['2026-12-01T14:00:00+02:00', 'just now'],
  ])('%s is %s', (at, words) => {
    expect(formatAge(at, now)).toBe(words);
  });
});
