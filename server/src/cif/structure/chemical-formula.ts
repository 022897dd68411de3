/**
 * Reads a chemical formula as CIF writes it (`Al2 Mg O4`, `C24 H12.5`): counts by element.
 * @returns null when it holds anything else, brackets for instance
 */
export function readChemicalFormula(text: string): ReadonlyMap<string, number> | null {
  const counts = new Map<string, number>();
  for (const word of text.trim().split(/\s+/)) {
    const match = /^([A-Z][a-z]?)(\d+(?:\.\d+)?|\.\d+)?$/.exec(word);
    if (!match) {
      return null;
    }
    const element = match[1] === 'D' || match[1] === 'T' ? 'H' : match[1]!;
    counts.set(element, (counts.get(element) ?? 0) + Number(match[2] ?? '1'));
  }
  return counts;
}
