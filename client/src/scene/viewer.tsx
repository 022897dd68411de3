import { useCallback, useState, type JSX } from 'react';

import { useMedia } from '#client/lib/use-media.ts';
import type { ResolvedCell } from '#common/physics/resolved-cell';

import type { Repeat } from './model/block.ts';
import type { SceneTheme } from './model/colours.ts';
import type { LitPairKind } from './model/lit-pairs.ts';
import { defaultSceneView, type SceneView } from './model/scene-view.ts';
import { Compass } from './stage/compass.tsx';
import { StageFrames } from './stage/frames.ts';
import type { ScenePin } from './stage/pins-layer.tsx';
import { Stage } from './stage/stage.tsx';
import { ToolRow } from './stage/tool-row.tsx';
import { useScene } from './stage/use-scene.ts';
import { useViewStore } from './stage/use-view-store.ts';

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

/**
 * The stage: a block of the lattice to turn, zoom and pick from, with its controls in a row
 * below. Fills the height it is given. A control whose handler is missing is left out.
 */
export function LatticeViewer(props: LatticeViewerProps): JSX.Element {
  const store = useViewStore(props.view, props.onViewChange);
  const scene = useScene(props);
  const { vectorsA } = props.cell;
  const onReset = useCallback(() => store.glideToFitted(defaultSceneView), [store]);
  const [frames] = useState(() => new StageFrames());
  // A small stage has no corner to spare: the compass then stands below it.
  const isNarrow = useMedia('(max-width: 559px)');
  const compass = (className: string): JSX.Element => (
    <Compass frames={frames} store={store} vectorsA={vectorsA} className={className} />
  );
  const isRepeatCut = scene.repeat.some((count, axis) => count !== props.repeat[axis]);
  return (
    <div className="flex h-full min-h-0 min-w-0 flex-col">
      <Stage {...props} store={store} frames={frames} scene={scene} onReset={onReset}>
        {!isNarrow && compass('absolute top-2 right-2 size-18')}
      </Stage>
      <ToolRow
        store={store}
        vectorsA={vectorsA}
        repeat={scene.repeat}
        isRepeatCut={isRepeatCut}
        onRepeatChange={props.onRepeatChange}
        ionScale={props.ionScale}
        onIonScaleChange={props.onIonScaleChange}
        signMarks={props.signMarks}
        onSignMarksChange={props.onSignMarksChange}
        onFreeView={onReset}
        onReset={onReset}
      >
        {isNarrow && compass('ml-auto size-14')}
      </ToolRow>
    </div>
  );
}
