import type { ResolvedCell } from '#common/physics/resolved-cell';

export type SceneTheme = 'light' | 'dark';

/** Warm for positive ions, cool for negative ones; order of first appearance in the cell. */
const families: Record<SceneTheme, { cation: readonly string[]; anion: readonly string[] }> = {
  light: {
    cation: ['#B5532A', '#D08A2E', '#8F3B4A', '#C9A227', '#7A5230', '#D96F52'],
    anion: ['#1F7A7D', '#3E6FA3', '#4F8A5B', '#5B5FA8', '#2F9AA0', '#7396B8'],
  },
  dark: {
    cation: ['#DB7A4E', '#DFA95F', '#BC5F70', '#DDBC50', '#AC7747', '#E69A85'],
    anion: ['#3FA3A6', '#6792C4', '#74AE80', '#8386C2', '#47BCC3', '#9FB8D0'],
  },
};
const neutral: Record<SceneTheme, string> = { light: '#9A9A8E', dark: '#B9B9AC' };

/** Grounds and inks of the stage; paper and ink as the style sheet's tokens. */
export const stageInks: Record<SceneTheme, { paper: string; foot: string; ink: string }> = {
  light: { paper: '#F7F5F0', foot: '#EAE6DB', ink: '#18211F' },
  dark: { paper: '#101817', foot: '#182321', ink: '#EEF1EC' },
};

export type Rgb = readonly [number, number, number];

/** `#RRGGBB` as three numbers 0 … 255. */
export function parseHex(hex: string): Rgb {
  const value = Number.parseInt(hex.slice(1), 16);
  return [(value >> 16) & 255, (value >> 8) & 255, value & 255];
}

function formatHex(rgb: Rgb): string {
  return `#${rgb.map((part) => Math.round(part).toString(16).padStart(2, '0')).join('')}`.toUpperCase();
}

export function mix(a: Rgb, b: Rgb, share: number): Rgb {
  const at = (i: 0 | 1 | 2): number => a[i] + (b[i] - a[i]) * share;
  return [at(0), at(1), at(2)];
}

/** Doubly charged ions show the family's colour itself; more charge deepens it, less lightens it. */
function deepen(hex: string, chargeE: number): string {
  const steps = Math.max(-1, Math.min(3, Math.abs(chargeE) - 2));
  const toward: Rgb = steps > 0 ? [0, 0, 0] : [255, 255, 255];
  return formatHex(mix(parseHex(hex), toward, Math.abs(steps) * 0.07));
}

/** Beyond six kinds of a sign the family starts again, shifted toward grey. */
function familyColour(family: readonly string[], order: number): string {
  const hex = family[order % family.length]!;
  const round = Math.floor(order / family.length);
  return round === 0
    ? hex
    : formatHex(mix(parseHex(hex), [128, 128, 128], Math.min(0.6, 0.3 * round)));
}

/**
 * Colour of each ion kind as `#RRGGBB`, by the sign of its charge: never by element.
 * Within a sign by order of first appearance, deeper for larger charge.
 */
export function speciesColours(cell: ResolvedCell, theme: SceneTheme): Map<string, string> {
  const colours = new Map<string, string>();
  const orders = { cation: 0, anion: 0 };
  for (const { speciesKey, chargeE } of cell.sites) {
    if (colours.has(speciesKey)) {
      continue;
    }
    if (chargeE === 0) {
      colours.set(speciesKey, neutral[theme]);
      continue;
    }
    const sign = chargeE > 0 ? 'cation' : 'anion';
    const hex = familyColour(families[theme][sign], orders[sign]);
    orders[sign] += 1;
    colours.set(speciesKey, deepen(hex, chargeE));
  }
  return colours;
}
