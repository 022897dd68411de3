import type { ResolvedCell } from '#common/physics/resolved-cell';

import type { Repeat } from './model/block.ts';
import type { SceneTheme } from './model/colours.ts';
import type { LitPairKind } from './model/lit-pairs.ts';
import type { SceneView } from './model/scene-view.ts';
import type { ScenePin } from './stage/pins-layer.tsx';

/** What the stage is given, and what it reports back. */
export interface LatticeViewerProps {
  cell: ResolvedCell;
  /** Must be a stable function: the block is rebuilt when it changes. */
  ionicRadiusA: (speciesKey: string) => number;
  /** `${siteIndex}.${i}.${j}.${k}` each; the latest last. */
  selectedIonIds: readonly string[];
  onSelectionChange: (ids: readonly string[]) => void;
  /** Pairs to light: of the picked ion when one is picked, otherwise all of the block. */
  litPair: LitPairKind | null;
  pins: readonly ScenePin[];
  onPinClick?: (id: string) => void;
  repeat: Repeat;
  onRepeatChange?: (repeat: Repeat) => void;
  /** Share of the ionic radius that ions are drawn at, 0.2 … 1. */
  ionScale: number;
  onIonScaleChange?: (scale: number) => void;
  signMarks: boolean;
  onSignMarksChange?: (isOn: boolean) => void;
  /** null: the stage's own first view. */
  view: SceneView | null;
  /** Called when the camera has come to rest. */
  onViewChange?: (view: SceneView) => void;
  describeIon: (ionId: string) => { title: string; detail: string };
  theme: SceneTheme;
}
