import { describe, expect, it } from 'vitest';

import { parseHex, speciesColours } from './colours.ts';
import { cellOf, periclase } from './test-cells.ts';

const cube = [4, 0, 0, 0, 4, 0, 0, 0, 4];
const at = (x: number): [number, number, number] => [x, 0, 0];

function brightness(hex: string): number {
  const [red, green, blue] = parseHex(hex);
  return red + green + blue;
}

describe('colours of ion kinds', () => {
  it('follow the sign of the charge, never the element', () => {
    const swapped = cellOf(cube, [
      { element: 'Mg', chargeE: -2, places: [at(0)] },
      { element: 'O', chargeE: 2, places: [at(0.5)] },
    ]);
    const usual = speciesColours(periclase, 'light');
    const odd = speciesColours(swapped, 'light');
    expect(usual.get('Mg+2')).toBe('#B5532A');
    expect(usual.get('O-2')).toBe('#1F7A7D');
    expect(odd.get('O+2')).toBe(usual.get('Mg+2'));
    expect(odd.get('Mg-2')).toBe(usual.get('O-2'));
  });

  it('deepen with charge, and are grey without', () => {
    const of = (chargeE: number): string =>
      [
        ...speciesColours(
          cellOf(cube, [{ element: 'X', chargeE, places: [at(0)] }]),
          'dark',
        ).values(),
      ][0]!;
    expect(brightness(of(1))).toBeGreaterThan(brightness(of(2)));
    expect(brightness(of(2))).toBeGreaterThan(brightness(of(4)));
    expect(of(0)).toBe('#B9B9AC');
  });

  it('differ for every kind of up to twelve of one sign, in both themes', () => {
    const rows = Array.from({ length: 12 }, (_, index) => ({
      element: `E${index}`,
      chargeE: 2,
      places: [at(index / 12)],
    }));
    for (const theme of ['light', 'dark'] as const) {
      expect(new Set(speciesColours(cellOf(cube, rows), theme).values()).size).toBe(12);
    }
  });
});
