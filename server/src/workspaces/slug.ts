const longest = 40;

/** The address name made from a workspace's name: `Kiln Lane` → `kiln-lane`. */
export function slugFrom(name: string): string {
  const letters = name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replaceAll('ß', 'ss')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, longest)
    .replace(/^-+|-+$/g, '');
  return letters === '' ? 'workspace' : letters;
}
