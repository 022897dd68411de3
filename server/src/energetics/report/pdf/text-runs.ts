import { THIN_SPACE } from '#common/units/format';

/** How a run of characters sits on its line. */
export type Rise = 'line' | 'raised' | 'lowered';

/** Characters of one font at one height. */
export interface TextRun {
  readonly text: string;
  /** Index into the family's files. */
  readonly font: number;
  readonly rise: Rise;
}

/** Which file of a family has a character. */
export type HasGlyph = (font: number, codePoint: number) => boolean;

const raised = new Map(
  [...'⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻'].map((sign, index) => [sign, [...'0123456789+−'][index]!]),
);
const lowered = new Map([...'₀₁₂₃₄₅₆₇₈₉'].map((sign, index) => [sign, String(index)]));

/** Signs the typeface lacks, in words. */
const spelled = new Map(
  [
    ...['α alpha', 'β beta', 'γ gamma', 'δ delta', 'ε epsilon', 'ζ zeta', 'η eta', 'θ theta'],
    ...['ι iota', 'κ kappa', 'λ lambda', 'μ mu', 'ν nu', 'ξ xi', 'π pi', 'ρ rho', 'σ sigma'],
    ...['τ tau', 'υ upsilon', 'φ phi', 'χ chi', 'ψ psi', 'ω omega', 'Γ Gamma', 'Δ Delta', 'Σ Sum'],
    ...['Ω Omega', 'Φ Phi', 'Ψ Psi', 'Λ Lambda', 'Π Pi', '≤ at_most', '≥ at_least', '≈ about'],
    ...['→ to', '√ root', '∞ infinity', '∂ d'],
  ].map((entry) => {
    const [sign = '', words = ''] = entry.split(' ');
    return [sign, words.replace('_', ' ')] as const;
  }),
);

const fontFor = (character: string, fonts: number, has: HasGlyph): number =>
  Array.from({ length: fonts }, (_, font) => font).findIndex((font) =>
    has(font, character.codePointAt(0)!),
  );

/** What stands for a character none of the fonts has: its letter without marks, else its code. */
function standIn(character: string, fonts: number, has: HasGlyph): string {
  const known = spelled.get(character);
  if (known !== undefined) {
    return known;
  }
  const bare = character.normalize('NFKD').replace(/\p{M}/gu, '');
  const isKnown = bare !== '' && [...bare].every((part) => fontFor(part, fonts, has) >= 0);
  const code = character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0');
  return isKnown ? bare : `[U+${code}]`;
}

interface Sign {
  readonly text: string;
  readonly font: number;
  readonly rise: Rise;
}

function signOf(character: string, fonts: number, has: HasGlyph): Sign {
  const up = raised.get(character);
  if (up !== undefined) {
    return { text: up, font: 0, rise: 'raised' };
  }
  const down = lowered.get(character);
  if (down !== undefined) {
    return { text: down, font: 0, rise: 'lowered' };
  }
  if (character === THIN_SPACE) {
    // The typeface's own is hardly one; a small word space parts the groups.
    return { text: ' ', font: 0, rise: 'lowered' };
  }
  const font = fontFor(character, fonts, has);
  return font >= 0
    ? { text: character, font, rise: 'line' }
    : { text: standIn(character, fonts, has), font: 0, rise: 'line' };
}

/** Characters that are no sign of their own: controls, direction marks, joiners. */
const unseen = /[\p{Cc}\p{Cf}\p{Cs}]/gu;

/**
 * Splits a text into runs the fonts can set. Raised and lowered digits are set small; what no font
 * has is spelled out, so that any name can be printed.
 * @param fonts how many files the family has, the preferred first
 */
export function textRuns(text: string, fonts: number, has: HasGlyph): TextRun[] {
  const runs: { text: string; font: number; rise: Rise }[] = [];
  for (const character of text
    .replace(/[\n\r\t]+/g, ' ')
    .replace(unseen, '')
    .normalize('NFC')) {
    const sign = signOf(character, fonts, has);
    const last = runs.at(-1);
    if (last !== undefined && last.font === sign.font && last.rise === sign.rise) {
      last.text += sign.text;
    } else {
      runs.push({ ...sign });
    }
  }
  return runs;
}
