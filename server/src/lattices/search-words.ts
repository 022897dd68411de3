const subscripts = '₀₁₂₃₄₅₆₇₈₉';

/**
 * What to look for: small letters, `CaF₂` as `caf2`, and a space group's symbol written with
 * spaces (`F m -3 m`) as its parts, which the symbol without spaces contains.
 */
export const searchWords = (text: string): string[] =>
  text
    .toLowerCase()
    .replace(/[₀-₉]/g, (digit) => String(subscripts.indexOf(digit)))
    .split(/\s+/)
    .filter((word) => word !== '');
