import type { ResolvedCell } from '#common/physics/resolved-cell';
import { formatIonId } from '#client/scene/model/ion-id.ts';
import { dot, placeAt, type Vector } from '#client/scene/model/vector.ts';

/** Toward the eye of the first view: what lies far along it stands in front. */
const front: Vector = [0.55, 0.35, 0.9];
const onFace = 1e-6;

/** The ion of a site that one sees best in the first view; null where no site has the label. */
export function frontIonId(cell: ResolvedCell, label: string): string | null {
  let best: { id: string; height: number } | null = null;
  cell.sites.forEach((site, siteIndex) => {
    if (site.label !== label) {
      return;
    }
    // A site on a face, an edge or a corner is also drawn on the far side of the cell.
    const shift = site.fractional.map((at) => (at < onFace ? 1 : 0));
    const [i = 0, j = 0, k = 0] = shift;
    const [x, y, z] = site.fractional;
    const height = dot(placeAt(cell.vectorsA, x + i, y + j, z + k), front);
    if (best === null || height > best.height + onFace) {
      best = { id: formatIonId({ siteIndex, cell: [i, j, k] }), height };
    }
  });
  return (best as { id: string } | null)?.id ?? null;
}
