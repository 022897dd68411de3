import {
  breseOKeeffeData,
  brownAltermattData,
  rememberedBondValenceData,
} from '#common/chemistry/bond-valence-data';
import {
  ionKey,
  noOverrides,
  ownOr,
  type DataOverrides,
  type Sourced,
  type SourceStatus,
} from '#common/chemistry/sourced';

/** b in Å, for every pair of the tables. */
const usualBA = 0.37;

function readList(text: string, source: string, status: SourceStatus): [string, Sourced][] {
  return text.split(';').flatMap((group) => {
    const [anion, ...entries] = group.trim().split(/\s+/) as [string, ...string[]];
    return entries.map((entry): [string, Sourced] => {
      const [cation, r0A] = entry.split('=') as [string, string];
      return [`${cation}|${anion.replace(':', '')}`, { value: Number(r0A), source, status }];
    });
  });
}

const r0ByPair = new Map([
  ...readList(
    rememberedBondValenceData,
    'Brown & Altermatt (1985) or Brese & O’Keeffe (1991), from memory',
    'from-memory',
  ),
  ...readList(brownAltermattData, 'Brown & Altermatt (1985) Acta Cryst. B41, 244', 'single-source'),
  ...readList(breseOKeeffeData, 'Brese & O’Keeffe (1991) Acta Cryst. B47, 192', 'single-source'),
]);

/** The parameters of s = exp((R₀ − R)/b). */
export interface BondValenceParameters {
  readonly r0A: Sourced;
  readonly bA: Sourced;
}

/**
 * Bond-valence parameters of a cation and an anion, Å.
 * @returns null for a pair without R₀; a workspace that gives R₀ alone gets b = 0.37 Å
 */
export function bondValenceParameters(
  cation: string,
  cationChargeE: number,
  anion: string,
  anionChargeE: number,
  overrides: DataOverrides = noOverrides,
): BondValenceParameters | null {
  const pair = `${ionKey(cation, cationChargeE)}|${ionKey(anion, anionChargeE)}`;
  const shipped = r0ByPair.get(pair) ?? null;
  const r0A = ownOr(overrides, `bond-valence-r0:${pair}`, shipped);
  if (r0A === null) {
    return null;
  }
  const usual: Sourced =
    shipped === null
      ? { value: usualBA, source: 'The usual 0.37 Å; common practice', status: 'from-memory' }
      : { ...shipped, value: usualBA };
  return { r0A, bA: ownOr(overrides, `bond-valence-b:${pair}`, usual) ?? usual };
}

/** Keys of every shipped R₀ and b. */
export const bondValenceKeys: readonly string[] = [...r0ByPair.keys()].flatMap((pair) => [
  `bond-valence-r0:${pair}`,
  `bond-valence-b:${pair}`,
]);
