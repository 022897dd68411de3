import type { Annotation, AnnotationAnchor } from '#common/schemas/review';
import { formatFixed } from '#common/units/format';
import { speciesText } from '#client/components/chem/species-key.ts';

/** A ledger row as its key names it. */
export interface PairOfKey {
  readonly speciesA: string;
  readonly speciesB: string;
  readonly distanceA: number;
}

/** Reads a row's key, `Mg+2|O-2|2.106`; null where it is none. */
export function parsePairKey(key: string): PairOfKey | null {
  const [speciesA, speciesB, distance] = key.split('|');
  const distanceA = Number(distance);
  return speciesA === undefined || speciesB === undefined || !Number.isFinite(distanceA)
    ? null
    : { speciesA, speciesB, distanceA };
}

/** What a remark is pinned to, in words. */
export function anchorWords(anchor: AnnotationAnchor): string {
  switch (anchor.kind) {
    case 'revision':
      return 'the whole revision';
    case 'site':
      return `site ${anchor.label}`;
    case 'pair': {
      const pair = parsePairKey(anchor.key);
      return pair === null
        ? `pair ${anchor.key}`
        : `${speciesText(pair.speciesA)} – ${speciesText(pair.speciesB)} at ${formatFixed(pair.distanceA, 3)} Å`;
    }
  }
}

/** Numbers of the open remarks by ledger row. */
export function remarksByPair(
  annotations: readonly Annotation[],
): ReadonlyMap<string, readonly number[]> {
  const map = new Map<string, number[]>();
  for (const { anchor, number, resolvedAt } of annotations) {
    if (anchor.kind === 'pair' && resolvedAt === null) {
      map.set(anchor.key, [...(map.get(anchor.key) ?? []), number]);
    }
  }
  return map;
}
