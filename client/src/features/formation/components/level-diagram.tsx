import { useMemo, type JSX } from 'react';

import type { FormationLedger } from '#common/physics/energetics/formation-ledger';
import { formationLevels } from '#common/physics/energetics/formation-levels';
import { middleOf } from '#common/physics/energetics/formation-line';
import { rangeOn } from '#client/features/formation/model/energy-scale.ts';
import type { EnergyScale } from '#client/lib/energy-unit.ts';
import {
  layOutLevels,
  type LevelLayout,
  type Riser,
  type Tread,
} from '#client/features/formation/model/level-layout.ts';
import { stageWords } from '#client/features/formation/model/words.ts';
import { useWidth } from '#client/lib/use-width.ts';

interface DiagramProps {
  ledger: FormationLedger;
  scale: EnergyScale;
  lit: string | null;
  onLight: (key: string | null) => void;
}

function TreadMark({ tread, scale }: { tread: Tread; scale: EnergyScale }): JSX.Element {
  const { from, to, y, top, spread, group, isLabelledAbove } = tread;
  const middle = (from + to) / 2;
  // The outermost words keep to the edges of the drawing.
  const isLast = group.rises.length === 0;
  const anchor = from === 0 ? 'start' : isLast ? 'end' : 'middle';
  const labelX = from === 0 ? 0 : isLast ? to : middle;
  const words = stageWords[group.stage].split(' ');
  const energy = middleOf(group.energyKjPerMol);
  const number = rangeOn(scale, { low: energy, high: energy }, true);
  const lines = [number, ...words];
  const first = isLabelledAbove ? y - 8 - 15 * (lines.length - 1) : y + 18;
  return (
    <g>
      {spread > 2 && (
        <rect x={from} y={top} width={to - from} height={spread} className="fill-ink opacity-15" />
      )}
      <line x1={from} x2={to} y1={y} y2={y} className="stroke-ink" strokeWidth="3" />
      {lines.map((line, at) => (
        <text
          key={line}
          x={labelX}
          y={first + 15 * at}
          textAnchor={anchor}
          className={at === 0 ? 'fill-ink text-[13px] font-medium' : 'fill-soft text-[13px]'}
        >
          {line}
        </text>
      ))}
    </g>
  );
}

/** Narrower bars, px, stand too close for their numbers. */
const roomForNumber = 7;

function RiserMark({
  riser,
  isLit,
  onLight,
}: {
  riser: Riser;
  isLit: boolean;
  onLight: (key: string | null) => void;
}): JSX.Element {
  const { x, width, from, to, number, rise } = riser;
  const isUp = to <= from;
  const isBinding = to > from;
  const end = isUp ? to - 5 : to + 14;
  return (
    <g
      onPointerEnter={() => onLight(rise.line.key)}
      onPointerLeave={() => onLight(null)}
      data-riser={rise.line.key}
    >
      <title>{rise.line.name}</title>
      <rect
        x={x - width / 2}
        y={Math.min(from, to)}
        width={width}
        height={Math.max(1, Math.abs(to - from))}
        rx="2"
        className={
          isLit
            ? `${isBinding ? 'fill-bind' : 'fill-oppose'} stroke-ink`
            : isBinding
              ? 'fill-bind'
              : 'fill-oppose'
        }
        strokeWidth="2"
        style={
          rise.line.isSolved
            ? { fill: `url(#formation-${isBinding ? 'bind' : 'oppose'})` }
            : undefined
        }
      />
      {width >= roomForNumber && (
        <text x={x} y={end} textAnchor="middle" className="fill-soft text-[12px]">
          {number}
        </text>
      )}
    </g>
  );
}

/** Fine lines that carry each level on to the next riser. */
function Carries({ layout }: { layout: LevelLayout }): JSX.Element {
  return (
    <>
      {layout.risers.map(({ rise, x, to }, at) => {
        const next = layout.risers[at + 1];
        const tread = layout.treads.find(
          ({ from }) => from > x && (next === undefined || from < next.x),
        );
        const end = tread?.from ?? next?.x ?? x;
        return (
          <line key={rise.line.key} x1={x} x2={end} y1={to} y2={to} className="stroke-faint" />
        );
      })}
      {layout.treads.map(({ group, to, y }) => {
        const next = layout.risers.find(({ x }) => x > to);
        return group.rises.length > 0 && next !== undefined ? (
          <line key={group.stage} x1={to} x2={next.x} y1={y} y2={y} className="stroke-faint" />
        ) : null;
      })}
    </>
  );
}

function Hatches(): JSX.Element {
  return (
    <defs>
      {(['bind', 'oppose'] as const).map((sense) => (
        <pattern
          key={sense}
          id={`formation-${sense}`}
          width="6"
          height="6"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <rect width="3" height="6" className={sense === 'bind' ? 'fill-bind' : 'fill-oppose'} />
        </pattern>
      ))}
    </defs>
  );
}

/** The account as a stair of levels: what costs energy climbs, what gives it off goes down. */
export function LevelDiagram({ ledger, scale, lit, onLight }: DiagramProps): JSX.Element | null {
  const [box, width] = useWidth(520);
  const height = width < 480 ? 340 : 380;
  const groups = useMemo(() => formationLevels(ledger), [ledger]);
  const layout = useMemo(() => {
    const numbers = new Map(ledger.lines.map(({ key }, at) => [key, at + 1]));
    return groups && layOutLevels(groups, numbers, width, height);
  }, [groups, ledger, width, height]);
  if (layout === null || groups === null) {
    return null;
  }
  // On a phone a level is as wide as five digits.
  const shortScale = width < 480 ? { ...scale, decimals: Math.max(0, scale.decimals - 1) } : scale;
  const spoken = groups
    .map(
      ({ stage, energyKjPerMol }) => `${stageWords[stage]} ${rangeOn(scale, energyKjPerMol, true)}`,
    )
    .join(', ');
  return (
    <figure className="mt-7">
      <figcaption className="mb-1 text-small text-soft">
        Levels, {scale.unit} per formula unit, counted from the elements; each bar is a line of the
        account, in its order.
      </figcaption>
      <div ref={box}>
        <svg
          // Drawn anew for another width: Chromium keeps rounded bars where they stood.
          key={width}
          role="img"
          aria-label={`Levels in ${scale.unit}: ${spoken}.`}
          width={width}
          height={height}
          viewBox={`0 0 ${width} ${height}`}
          className="block max-w-full"
        >
          <Hatches />
          <line x1="0" x2={width} y1={layout.zeroY} y2={layout.zeroY} className="stroke-line" />
          <Carries layout={layout} />
          {layout.risers.map((riser) => (
            <RiserMark
              key={riser.rise.line.key}
              riser={riser}
              isLit={lit === riser.rise.line.key}
              onLight={onLight}
            />
          ))}
          {layout.treads.map((tread) => (
            <TreadMark key={tread.group.stage} tread={tread} scale={shortScale} />
          ))}
        </svg>
      </div>
    </figure>
  );
}
