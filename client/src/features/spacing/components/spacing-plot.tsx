import { useId, useMemo, useRef, type JSX, type PointerEvent } from 'react';

import type { SpacingPoint } from '#common/physics/energetics/spacing-curve';
import type { ValueRange } from '#common/schemas/energetics';
import { EV_IN_KJ_PER_MOL } from '#common/units/constants';
import { formatTidy } from '#common/units/format';
import {
  pathOf,
  plotFrame,
  spacingAt,
  ticks,
  xOf,
  yOf,
  type PlotFrame,
} from '#client/features/spacing/model/plot-frame.ts';
import type { EnergyScale } from '#client/lib/energy-unit.ts';

interface SpacingPlotProps {
  width: number;
  /** One curve, or those of both ends of a range. */
  curves: readonly (readonly SpacingPoint[])[];
  /** The spacing the marker stands at, and its energies. */
  marker: SpacingPoint;
  equilibriumSpacingA: ValueRange;
  givenSpacingA: number;
  scale: EnergyScale;
  onMove: (spacingA: number) => void;
}

const height = 320;

function Axes({ frame, scale }: { frame: PlotFrame; scale: EnergyScale }): JSX.Element {
  const unitEv = energyInEv(scale);
  const energies = ticks(frame.lowEv / unitEv, frame.highEv / unitEv, 6);
  const spacings = ticks(frame.fromA, frame.toA, Math.max(3, Math.round(frame.width / 110)));
  const bottom = frame.height - frame.bottom;
  return (
    <g className="fill-soft text-[12px]">
      {energies.map((value) => (
        <text key={value} x={frame.left - 8} y={yOf(frame, value * unitEv) + 4} textAnchor="end">
          {formatTidy(value, 3)}
        </text>
      ))}
      {spacings.map((value) => (
        <g key={value}>
          <line
            x1={xOf(frame, value)}
            x2={xOf(frame, value)}
            y1={bottom}
            y2={bottom + 4}
            className="stroke-faint"
          />
          <text x={xOf(frame, value)} y={bottom + 18} textAnchor="middle">
            {formatTidy(value, 3)}
          </text>
        </g>
      ))}
      <line
        x1={frame.left}
        x2={frame.width - frame.right}
        y1={bottom}
        y2={bottom}
        className="stroke-line"
      />
      <line
        x1={frame.left}
        x2={frame.width - frame.right}
        y1={yOf(frame, 0)}
        y2={yOf(frame, 0)}
        className="stroke-faint"
      />
      <text x={frame.width - frame.right} y={frame.height - 2} textAnchor="end">
        r, Å
      </text>
      <text x={frame.left - 8} y={10} textAnchor="end">
        {scale.unit}
      </text>
    </g>
  );
}

const energyInEv = ({ kjPerMol }: EnergyScale): number => kjPerMol / EV_IN_KJ_PER_MOL;

function Curves({
  frame,
  curves,
}: {
  frame: PlotFrame;
  curves: SpacingPlotProps['curves'];
}): JSX.Element {
  const [first = [], second] = curves;
  const band =
    second === undefined
      ? null
      : `${pathOf(frame, first, ({ netEv }) => netEv)}${pathOf(
          frame,
          second.toReversed(),
          ({ netEv }) => netEv,
        ).replace('M', 'L')}Z`;
  return (
    <g fill="none" strokeLinejoin="round">
      {band !== null && <path d={band} className="fill-ink opacity-20" />}
      <path
        d={pathOf(frame, first, (p) => p.attractionEv)}
        className="stroke-bind"
        strokeWidth="2"
      />
      {curves.map((curve, k) => (
        <path
          key={k}
          d={pathOf(frame, curve, (p) => p.repulsionEv)}
          className="stroke-oppose"
          strokeWidth="2"
        />
      ))}
      {curves.map((curve, k) => (
        <path
          key={k}
          d={pathOf(frame, curve, (p) => p.netEv)}
          className="stroke-ink"
          strokeWidth="2.5"
        />
      ))}
    </g>
  );
}

/** Energy against spacing: attraction, repulsion and their sum, with a marker to move along. */
export function SpacingPlot(props: SpacingPlotProps): JSX.Element {
  const { width, curves, marker, equilibriumSpacingA: rest, givenSpacingA, scale, onMove } = props;
  const clipId = useId();
  const drawing = useRef<SVGSVGElement>(null);
  const frame = useMemo(() => plotFrame(width, height, curves), [width, curves]);
  const move = (event: PointerEvent): void => {
    if (event.buttons % 2 === 1) {
      const left = drawing.current?.getBoundingClientRect().left ?? 0;
      onMove(spacingAt(frame, event.clientX - left));
    }
  };
  const x = xOf(frame, marker.spacingA);
  const restX = [xOf(frame, rest.low), xOf(frame, rest.high)] as const;
  return (
    <svg
      ref={drawing}
      width={width}
      height={height}
      role="img"
      aria-label={
        `Energy against spacing. Attraction, repulsion and net energy from ${frame.fromA.toFixed(2)} ` +
        `to ${frame.toA.toFixed(2)} Å; the net energy is least at ${rest.low.toFixed(3)} Å.`
      }
      className="block cursor-ew-resize touch-pan-y select-none"
      onPointerDown={(event) => {
        drawing.current?.setPointerCapture?.(event.pointerId);
        move(event);
      }}
      onPointerMove={move}
    >
      <clipPath id={clipId}>
        <rect
          x={frame.left}
          y={frame.top - 4}
          width={width - frame.left - frame.right}
          height={height - frame.top - frame.bottom + 4}
        />
      </clipPath>
      <Axes frame={frame} scale={scale} />
      <g clipPath={`url(#${clipId})`}>
        <rect
          x={restX[0] - 0.5}
          width={Math.max(1, restX[1] - restX[0])}
          y={frame.top}
          height={height - frame.top - frame.bottom}
          className="fill-holds opacity-60"
        />
        <line
          x1={xOf(frame, givenSpacingA)}
          x2={xOf(frame, givenSpacingA)}
          y1={frame.top}
          y2={height - frame.bottom}
          strokeDasharray="3 4"
          className="stroke-faint"
        />
        <Curves frame={frame} curves={curves} />
        <line x1={x} x2={x} y1={frame.top} y2={height - frame.bottom} className="stroke-ink" />
        <circle
          cx={x}
          cy={yOf(frame, marker.attractionEv)}
          r="4"
          className="fill-bind stroke-paper"
        />
        <circle
          cx={x}
          cy={yOf(frame, marker.repulsionEv)}
          r="4"
          className="fill-oppose stroke-paper"
        />
        <circle
          cx={x}
          cy={yOf(frame, marker.netEv)}
          r="5.5"
          className="fill-ink stroke-paper"
          strokeWidth="1.5"
        />
      </g>
    </svg>
  );
}
