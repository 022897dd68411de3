import { RotateCcw } from 'lucide-react';
import { useSyncExternalStore, type JSX, type ReactNode } from 'react';

import { IconButton } from '#client/components/button.tsx';
import { Segmented } from '#client/components/segmented.tsx';

import type { Repeat } from '../model/block.ts';
import { alignedAxis, viewDown, type ViewAxis } from '../model/scene-view.ts';
import { RepeatControl } from './repeat-control.tsx';
import type { ViewStore } from './view-store.ts';

interface ToolRowProps {
  store: ViewStore;
  vectorsA: readonly number[];
  repeat: Repeat;
  isRepeatCut: boolean;
  onRepeatChange: ((repeat: Repeat) => void) | undefined;
  ionScale: number;
  onIonScaleChange: ((scale: number) => void) | undefined;
  signMarks: boolean;
  onSignMarksChange: ((isOn: boolean) => void) | undefined;
  onFreeView: () => void;
  onReset: () => void;
  /** Stands beside the directions. */
  children?: ReactNode;
}

const directions = (['a', 'b', 'c', 'free'] as const).map((value) => ({
  value,
  label: value === 'free' ? 'free' : <i className="font-medium">{value}</i>,
  title: value === 'free' ? 'Turn freely' : `Look along ${value}`,
}));

/** The stage's controls, in a row below the picture. */
export function ToolRow(props: ToolRowProps): JSX.Element {
  const { store, vectorsA, ionScale, signMarks } = props;
  const direction = useSyncExternalStore(store.subscribe, () => alignedAxis(vectorsA, store.view));
  const look = (next: ViewAxis | 'free'): void => {
    if (next === 'free') {
      props.onFreeView();
    } else {
      store.glideToFitted(viewDown(vectorsA, next));
    }
  };
  return (
    <div className="flex flex-wrap items-center gap-x-5 gap-y-2 py-2 text-small text-soft">
      <Segmented label="View along" options={directions} value={direction} onChange={look} />
      <IconButton
        label="Show the whole block"
        icon={<RotateCcw aria-hidden className="size-4" />}
        onClick={props.onReset}
        className="-ml-3"
      />
      {props.children}
      {props.onRepeatChange !== undefined && (
        <RepeatControl
          repeat={props.repeat}
          isCut={props.isRepeatCut}
          onChange={props.onRepeatChange}
        />
      )}
      {props.onSignMarksChange !== undefined && (
        <label className="flex items-center gap-2">
          <input
            type="checkbox"
            checked={signMarks}
            onChange={(event) => props.onSignMarksChange?.(event.target.checked)}
            className="size-4 accent-ink"
          />
          Sign marks
        </label>
      )}
      {props.onIonScaleChange !== undefined && (
        <label className="flex items-center gap-2">
          Ions
          <input
            type="range"
            min={0.2}
            max={1}
            step={0.05}
            value={ionScale}
            onChange={(event) => props.onIonScaleChange?.(event.target.valueAsNumber)}
            className="w-24 accent-ink"
            aria-valuetext={`${ionScale.toFixed(2)} of the ionic radius`}
          />
          <span className="font-medium whitespace-nowrap text-ink">
            {ionScale.toFixed(2)} of radius
          </span>
        </label>
      )}
    </div>
  );
}
