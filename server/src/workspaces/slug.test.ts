import { describe, expect, it } from 'vitest';

import { slug } from '#common/schemas/shared';

import { slugFrom } from './slug.js';

describe('slugFrom', () => {
  it.each([
    ['Kiln Lane', 'kiln-lane'],
    ['  Größe & Öfen  ', 'grosse-ofen'],
    ['A/B  test', 'a-b-test'],
    ['窯', 'workspace'],
    ['---', 'workspace'],
  ])('%s → %s', (name, expected) => {
    expect(slugFrom(name)).toBe(expected);
    expect(slug.safeParse(slugFrom(name)).success).toBe(true);
  });

  it('fits the contract however long the name, with room for a number', () => {
    const made = slugFrom('very long name of a ceramics group '.repeat(5));
    expect(slug.safeParse(`${made}-1000`).success).toBe(true);
  });
});
