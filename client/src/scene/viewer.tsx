import { useCallback, useState, type JSX } from 'react';

import { useMedia } from '#client/lib/use-media.ts';

import { defaultSceneView } from './model/scene-view.ts';
import { Compass } from './stage/compass.tsx';
import { StageFrames } from './stage/frames.ts';
import { Stage } from './stage/stage.tsx';
import { ToolRow } from './stage/tool-row.tsx';
import { useScene } from './stage/use-scene.ts';
import { useViewStore } from './stage/use-view-store.ts';
import type { LatticeViewerProps } from './viewer-props.ts';

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
