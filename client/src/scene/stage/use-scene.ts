import { useMemo } from 'react';

import { drawableRepeat, type Repeat } from '../model/block.ts';
import { stageInks } from '../model/colours.ts';
import {
  buildBlockModel,
  buildEdges,
  buildLitPairs,
  buildSolids,
  paletteOf,
  type BlockModel,
} from '../model/scene-model.ts';
import type { LatticeViewerProps } from '../viewer-props.ts';

/** Everything drawn, each part rebuilt only when its own inputs change. */
export function useScene(props: LatticeViewerProps) {
  const { cell, ionicRadiusA, ionScale, signMarks, theme, litPair, selectedIonIds } = props;
  const [na, nb, nc] = drawableRepeat(cell, props.repeat);
  const repeat = useMemo<Repeat>(() => [na, nb, nc], [na, nb, nc]);
  const model = useMemo(
    () => buildBlockModel(cell, repeat, ionicRadiusA),
    [cell, repeat, ionicRadiusA],
  );
  const solids = useMemo(
    () => buildSolids(model, ionScale, signMarks),
    [model, ionScale, signMarks],
  );
  const edges = useMemo(() => buildEdges(model, ionScale, theme), [model, ionScale, theme]);
  const picked = useMemo(() => pickedIndices(model, selectedIonIds), [model, selectedIonIds]);
  const { speciesA, speciesB, distanceA } = litPair ?? {};
  const litFrom = picked.length === 1 ? picked[0]! : null;
  const litPairs = useMemo(
    () =>
      speciesA === undefined || speciesB === undefined || distanceA === undefined
        ? null
        : buildLitPairs(model, solids, { speciesA, speciesB, distanceA }, litFrom, theme),
    [model, solids, speciesA, speciesB, distanceA, litFrom, theme],
  );
  const palette = useMemo(() => paletteOf(model, theme), [model, theme]);
  const { paper, foot } = stageInks[theme];
  const inks = useMemo(() => ({ palette, paper, foot }), [palette, paper, foot]);
  return { model, solids, edges, litPairs, palette, paper, foot, inks, picked, repeat };
}

/** Ids of ions that are not on show (another repeat, an edited cell) are passed over. */
function pickedIndices({ indexOf }: BlockModel, ids: readonly string[]): number[] {
  return ids.flatMap((id) => indexOf.get(id) ?? []);
}
