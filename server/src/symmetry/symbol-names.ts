import type { TabulatedSetting } from './tabulated-settings.js';

/**
 * Symbols in use before the double glide got its letter `e` (International Tables A, 1992; de Wolff
 * et al., Acta Cryst. A48 (1992) 727), by Hall number. Each was compared with the operations an
 * independent library gives for the old symbol.
 */
const beforeDoubleGlide: Readonly<Record<number, string>> = {
  191: 'A b m 2',
  192: 'B m a 2',
  193: 'B 2 c m',
  194: 'C 2 m b',
  195: 'C m 2 a',
  196: 'A c 2 m',
  203: 'A b a 2',
  204: 'B b a 2',
  205: 'B 2 c b',
  206: 'C 2 c b',
  207: 'C c 2 a',
  208: 'A c 2 a',
  304: 'C m c a',
  305: 'C c m b',
  306: 'A b m a',
  307: 'A c a m',
  308: 'B b c m',
  309: 'B m a b',
  316: 'C m m a',
  317: 'C m m b',
  318: 'A b m m',
  319: 'A c m m',
  320: 'B m c m',
  321: 'B m a m',
  322: 'C c c a',
  323: 'C c c a',
  324: 'C c c b',
  325: 'C c c b',
  326: 'A b a a',
  327: 'A b a a',
  328: 'A c a a',
  329: 'A c a a',
  330: 'B b c b',
  331: 'B b c b',
  332: 'B b a b',
  333: 'B b a b',
};

/** A symbol and the setting mark people put behind it: `F d -3 m :2`, `R -3 m H`, `F d -3 m S`. */
export interface ReadSymbol {
  readonly key: string;
  /** `1`, `2`, `H`, `R`, or a monoclinic code; null when unmarked. */
  readonly mark: string | null;
}

/**
 * Takes a typed Hermann–Mauguin symbol apart. Spaces, underscores, `P 2(1)/c`, `P 2~1~/c`, capitals
 * and typographic minus signs are all the same symbol.
 */
export function readSymbol(text: string): ReadSymbol {
  let rest = text.trim().replace(/[−–]/g, '-');
  let mark: string | null = null;
  const colon = /^(.*?)\s*:\s*([-\w]+)$/.exec(rest);
  const spaced = /^(\S.*?)\s*([SZHR])$/.exec(rest);
  if (colon) {
    rest = colon[1]!;
    mark = colon[2]!;
  } else if (spaced && spaced[1]!.length > 1) {
    rest = spaced[1]!;
    mark = { S: '1', Z: '2', H: 'H', R: 'R' }[spaced[2] as 'S' | 'Z' | 'H' | 'R'];
  }
  if (mark !== null && /^[hr]$/.test(mark)) {
    mark = mark.toUpperCase();
  }
  const key = symbolKey(rest);
  // Protein files write `H -3 m` for the hexagonal axes of `R -3 m`.
  return key.startsWith('H') ? { key: `R${key.slice(1)}`, mark: mark ?? 'H' } : { key, mark };
}

function symbolKey(symbol: string): string {
  const compact = symbol.replace(/[\s_~()]/g, '');
  return compact.charAt(0).toUpperCase() + compact.slice(1).toLowerCase();
}

/** Every key by which a setting may be asked for. */
export function symbolKeysOf(tabulated: TabulatedSetting): readonly string[] {
  const { setting, fullSymbol } = tabulated;
  const keys = [setting.symbol, fullSymbol];
  if (setting.uniqueAxis !== null) {
    keys.push(fullSymbol.replace(/ 1(?= |$)/g, ''));
  }
  const old = beforeDoubleGlide[setting.hallNumber];
  if (old !== undefined) {
    keys.push(old);
  }
  if (setting.crystalSystem === 'cubic') {
    // Before 1983 the three-fold inversion axis of m3 and m3m was written 3: `F m 3 m`.
    keys.push(...keys.map((key) => key.replace(/^([A-Z] \S+) -3/, '$1 3')));
  }
  return [...new Set(keys.map(symbolKey))];
}
