import type { KeyboardEvent } from 'react';

import type { BlockModel } from '../model/scene-model.ts';
import { turned, viewDown, viewFrame, zoomed, type ViewAxis } from '../model/scene-view.ts';
import { nearestToViewer, walk, type WalkDirection } from '../model/walk.ts';
import type { ViewStore } from './view-store.ts';

export interface StageKeysOptions {
  readonly model: BlockModel;
  readonly store: ViewStore;
  readonly selectedIonIds: readonly string[];
  readonly onSelectionChange: (ids: readonly string[]) => void;
  readonly onReset: () => void;
}

const arrows: Readonly<Record<string, WalkDirection>> = {
  ArrowLeft: 'left',
  ArrowRight: 'right',
  ArrowUp: 'up',
  ArrowDown: 'down',
};
const turns: Readonly<Record<WalkDirection, readonly [number, number]>> = {
  left: [-10, 0],
  right: [10, 0],
  up: [0, 10],
  down: [0, -10],
};

/** What the keys do, for the stage's description. */
export const keysText =
  'Arrow keys walk from ion to ion, with Ctrl they add the next ion to the selection, with Shift they turn the view. ' +
  'Plus and minus zoom; A, B and C look along an axis; Home shows the whole block; Escape clears the selection.';

function step(options: StageKeysOptions, direction: WalkDirection, isAdding: boolean): void {
  const { model, store, selectedIonIds, onSelectionChange } = options;
  const frame = viewFrame(store.view);
  const from = model.indexOf.get(selectedIonIds.at(-1) ?? '');
  const next =
    from === undefined
      ? nearestToViewer(model.block, frame)
      : walk(model.block, from, frame, direction);
  const id = next === null ? undefined : model.block.ids[next];
  if (id === undefined) {
    return;
  }
  const kept = isAdding ? selectedIonIds.filter((other) => other !== id) : [];
  onSelectionChange([...kept, id]);
}

/** Acts on a key; true if it was one of the stage's. */
function act(event: KeyboardEvent, options: StageKeysOptions): boolean {
  const { store, model, onSelectionChange, onReset } = options;
  const direction = arrows[event.key];
  if (direction !== undefined) {
    if (event.shiftKey) {
      store.glideTo(turned(store.view, ...turns[direction]));
    } else {
      step(options, direction, event.ctrlKey || event.metaKey);
    }
    return true;
  }
  if (event.ctrlKey || event.metaKey || event.altKey) {
    return false;
  }
  switch (event.key) {
    case '+':
    case '=':
      store.glideTo(zoomed(store.view, 1.2));
      return true;
    case '-':
    case '_':
      store.glideTo(zoomed(store.view, 1 / 1.2));
      return true;
    case 'a':
    case 'b':
    case 'c':
      store.glideToFitted(viewDown(model.block.vectorsA, event.key satisfies ViewAxis));
      return true;
    case 'Home':
    case '0':
      onReset();
      return true;
    case 'Escape':
      onSelectionChange([]);
      return options.selectedIonIds.length > 0;
    default:
      return false;
  }
}

export function handleStageKey(event: KeyboardEvent, options: StageKeysOptions): void {
  if (event.target === event.currentTarget && act(event, options)) {
    event.preventDefault();
    event.stopPropagation();
  }
}
