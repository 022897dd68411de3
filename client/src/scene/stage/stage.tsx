import { useCallback, useId, useRef, useState, type JSX, type ReactNode } from 'react';

import { pickIon } from '../model/pick.ts';
import { viewPose } from '../model/scene-view.ts';
import type { LatticeViewerProps } from '../viewer-props.ts';
import { detectRenderer, type RendererKind } from './detect-renderer.ts';
import { EdgeLettersLayer } from './edge-letters-layer.tsx';
import type { StageFrames } from './frames.ts';
import { HoverTag } from './hover-tag.tsx';
import { PinsLayer } from './pins-layer.tsx';
import { RingsLayer } from './rings-layer.tsx';
import { StageCanvas } from './stage-canvas.tsx';
import { handleStageKey, keysText } from './stage-keys.ts';
import type { useScene } from './use-scene.ts';
import { useFit } from './use-fit.ts';
import { useStagePointer } from './use-stage-pointer.ts';
import type { ViewStore } from './view-store.ts';

interface StageProps extends LatticeViewerProps {
  store: ViewStore;
  frames: StageFrames;
  scene: ReturnType<typeof useScene>;
  onReset: () => void;
  /** Laid over the picture. */
  children?: ReactNode;
}

/** Picking by the ray through a point of the stage. */
function usePick({ store, frames, scene, ionScale }: StageProps) {
  return (x: number, y: number): number | null => {
    const projection = frames.latest;
    if (projection === null) {
      return null;
    }
    const aspect = projection.width / projection.height;
    const { eye } = viewPose(store.view, scene.solids.bounds, aspect);
    return pickIon(scene.model.block, ionScale, eye, projection.rayThrough(x, y));
  };
}

/** The selection after a click; shift adds or takes away. */
function selectionAfter(
  selected: readonly string[],
  id: string | null,
  isAdding: boolean,
): readonly string[] {
  if (id === null) {
    return isAdding ? selected : [];
  }
  if (!isAdding) {
    return [id];
  }
  return selected.includes(id) ? selected.filter((other) => other !== id) : [...selected, id];
}

/** Says what is selected, for those who hear the page. */
function spokenSelection({ selectedIonIds, describeIon }: StageProps): string {
  const names = selectedIonIds.map((id) => {
    const { title, detail } = describeIon(id);
    return detail === '' ? title : `${title}, ${detail}`;
  });
  return names.length === 0 ? 'No ion selected' : `Selected: ${names.join('; ')}`;
}

/** The picture with everything laid over it: one focusable element. */
export function Stage(props: StageProps): JSX.Element {
  const { store, frames, scene, ionScale, describeIon, selectedIonIds, onSelectionChange } = props;
  const { model, picked } = scene;
  const element = useRef<HTMLDivElement>(null);
  const [kind, setKind] = useState<RendererKind>(detectRenderer);
  const [hovered, setHovered] = useState<number | null>(null);
  const pick = usePick(props);
  const helpId = useId();
  const frameCount = useRef(0);

  useFit(element, store, { block: model.block, ionScale, bounds: scene.solids.bounds });
  useStagePointer(element, {
    store,
    onHover: (at) => setHovered(at === null ? null : pick(at.x, at.y)),
    onPick: (x, y, isAdding) => {
      const index = pick(x, y);
      const id = index === null ? null : (model.block.ids[index] ?? null);
      onSelectionChange(selectionAfter(selectedIonIds, id, isAdding));
    },
  });
  const onFrameDrawn = useCallback(() => {
    frameCount.current += 1;
    element.current?.setAttribute('data-frame', String(frameCount.current));
  }, []);
  const onContextLost = useCallback(() => setKind('cpu'), []);

  const tagged = hovered !== null && hovered < model.block.count ? hovered : picked.at(-1);
  const layer = { frames, model, ionScale };
  return (
    <div className="relative min-h-0 flex-1">
      <div
        ref={element}
        role="application"
        aria-roledescription="lattice view"
        aria-label={`Lattice of ${model.block.speciesKeys.length} ion kinds, ${model.block.count} ions on show`}
        aria-describedby={helpId}
        tabIndex={0}
        data-renderer={kind}
        data-frame={0}
        onKeyDown={(event) =>
          handleStageKey(event, {
            model,
            store,
            selectedIonIds,
            onSelectionChange,
            onReset: props.onReset,
          })
        }
        className={
          'absolute inset-0 touch-pan-y overflow-hidden bg-paper select-none focus-visible:-outline-offset-2 ' +
          (hovered === null ? 'cursor-grab active:cursor-grabbing' : 'cursor-pointer')
        }
      >
        <StageCanvas
          kind={kind}
          onContextLost={onContextLost}
          store={store}
          frames={frames}
          onFrameDrawn={onFrameDrawn}
          solids={scene.solids}
          edges={scene.edges}
          litPairs={scene.litPairs}
          palette={scene.palette}
          paper={scene.paper}
          foot={scene.foot}
          inks={scene.inks}
        />
        <EdgeLettersLayer {...layer} />
        <RingsLayer {...layer} picked={picked} />
        {tagged !== undefined && <HoverTag {...layer} ion={tagged} describeIon={describeIon} />}
        <PinsLayer {...layer} pins={props.pins} onPinClick={props.onPinClick} />
        {props.children}
      </div>
      <p id={helpId} className="sr-only">
        {keysText}
      </p>
      <p className="sr-only" role="status">
        {spokenSelection(props)}
      </p>
    </div>
  );
}
