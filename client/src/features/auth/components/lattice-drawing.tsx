import type { JSX } from 'react';

type Place = readonly [number, number, number];

interface DrawnIon {
  key: string;
  place: Place;
  x: number;
  y: number;
  depth: number;
  radius: number;
  isCation: boolean;
}

interface Projected {
  x: number;
  y: number;
  depth: number;
  scale: number;
}

interface DrawnBond {
  key: string;
  depth: number;
  /** From the surface of either ion to the middle. */
  halves: readonly { from: Projected; to: Projected; isCation: boolean }[];
}

const turn = 0.56;
const tilt = 0.38;
const scale = 118;
const viewDistance = 9;
const radiusOf = (isCation: boolean): number => (isCation ? 0.2 : 0.31);

/** Perspective drawing of a point of the block −1 … 1. */
function project([x, y, z]: Place): Projected {
  const across = x * Math.cos(turn) + z * Math.sin(turn);
  const toward = -x * Math.sin(turn) + z * Math.cos(turn);
  const up = y * Math.cos(tilt) - toward * Math.sin(tilt);
  const depth = y * Math.sin(tilt) + toward * Math.cos(tilt);
  const near = (scale * viewDistance) / (viewDistance - depth);
  return { x: across * near, y: -up * near, depth, scale: near };
}

function drawIons(): DrawnIon[] {
  const steps = [-1, 0, 1];
  return steps.flatMap((i) =>
    steps.flatMap((j) =>
      steps.map((k) => {
        const place = [i, j, k] as const;
        const { x, y, depth, scale: near } = project(place);
        const isCation = (i + j + k) % 2 !== 0;
        const radius = radiusOf(isCation) * near;
        return { key: place.join('.'), place, x, y, depth, radius, isCation };
      }),
    ),
  );
}

const along = (from: Place, to: Place, part: number): Place => [
  from[0] + (to[0] - from[0]) * part,
  from[1] + (to[1] - from[1]) * part,
  from[2] + (to[2] - from[2]) * part,
];

function drawBond(one: DrawnIon, other: DrawnIon): DrawnBond {
  const half = (from: DrawnIon, to: DrawnIon): DrawnBond['halves'][number] => ({
    // A little inside the surface, so that no gap shows.
    from: project(along(from.place, to.place, radiusOf(from.isCation) * 0.94)),
    to: project(along(from.place, to.place, 0.5)),
    isCation: from.isCation,
  });
  return {
    key: `${one.key}-${other.key}`,
    depth: (one.depth + other.depth) / 2,
    halves: [half(one, other), half(other, one)],
  };
}

function drawBonds(ions: readonly DrawnIon[]): DrawnBond[] {
  const at = new Map(ions.map((ion) => [ion.key, ion]));
  return ions.flatMap((ion) => {
    const [i, j, k] = ion.place;
    const ahead = [`${i + 1}.${j}.${k}`, `${i}.${j + 1}.${k}`, `${i}.${j}.${k + 1}`];
    return ahead.flatMap((key) => {
      const other = at.get(key);
      return other === undefined ? [] : [drawBond(ion, other)];
    });
  });
}

const ions = drawIons();
const parts = [
  ...ions.map((ion) => ({ kind: 'ion' as const, depth: ion.depth, ion })),
  ...drawBonds(ions).map((bond) => ({ kind: 'bond' as const, depth: bond.depth, bond })),
].sort((one, other) => one.depth - other.depth);

/** Farther parts fade toward the paper. */
const fade = (depth: number): number => Math.min(1, 0.68 + 0.24 * depth);

function Bond({ bond }: { bond: DrawnBond }): JSX.Element {
  return (
    <g opacity={fade(bond.depth)}>
      {bond.halves.map(({ from, to, isCation }) => (
        <line
          key={String(isCation)}
          x1={from.x}
          y1={from.y}
          x2={to.x}
          y2={to.y}
          strokeWidth={0.062 * from.scale}
          className={isCation ? 'stroke-oppose' : 'stroke-bind'}
        />
      ))}
    </g>
  );
}

function Ion({ ion }: { ion: DrawnIon }): JSX.Element {
  return (
    <g>
      <circle cx={ion.x} cy={ion.y} r={ion.radius} className="fill-wash" />
      <g opacity={fade(ion.depth)}>
        <circle
          cx={ion.x}
          cy={ion.y}
          r={ion.radius}
          className={ion.isCation ? 'fill-oppose' : 'fill-bind'}
        />
        <circle cx={ion.x} cy={ion.y} r={ion.radius} fill="url(#ion-shade)" />
        <circle cx={ion.x} cy={ion.y} r={ion.radius} fill="url(#ion-light)" />
      </g>
    </g>
  );
}

/** A block of the rock salt structure; decoration only. */
export function LatticeDrawing({ className }: { className?: string }): JSX.Element {
  return (
    <svg aria-hidden viewBox="-216 -216 432 432" className={className}>
      <defs>
        <radialGradient id="ion-shade" cx="36%" cy="30%" r="78%">
          <stop offset="35%" stopColor="#0d1716" stopOpacity="0" />
          <stop offset="100%" stopColor="#0d1716" stopOpacity="0.62" />
        </radialGradient>
        <radialGradient id="ion-light" cx="34%" cy="27%" r="30%">
          <stop offset="0%" stopColor="#ffffff" stopOpacity="0.5" />
          <stop offset="100%" stopColor="#ffffff" stopOpacity="0" />
        </radialGradient>
      </defs>
      {parts.map((part) =>
        part.kind === 'ion' ? (
          <Ion key={part.ion.key} ion={part.ion} />
        ) : (
          <Bond key={part.bond.key} bond={part.bond} />
        ),
      )}
    </svg>
  );
}
