import type { JSX } from 'react';

interface DrawnIon {
  key: string;
  x: number;
  y: number;
  depth: number;
  radius: number;
  isCation: boolean;
}

interface DrawnBond {
  key: string;
  from: DrawnIon;
  to: DrawnIon;
  depth: number;
}

const turn = 0.56;
const tilt = 0.38;
const scale = 118;
const viewDistance = 9;

/** Perspective drawing of a point of the block −1 … 1. */
function project(
  x: number,
  y: number,
  z: number,
): { x: number; y: number; depth: number; f: number } {
  const across = x * Math.cos(turn) + z * Math.sin(turn);
  const toward = -x * Math.sin(turn) + z * Math.cos(turn);
  const up = y * Math.cos(tilt) - toward * Math.sin(tilt);
  const depth = y * Math.sin(tilt) + toward * Math.cos(tilt);
  const f = viewDistance / (viewDistance - depth);
  return { x: across * scale * f, y: -up * scale * f, depth, f };
}

function drawIons(): DrawnIon[] {
  const steps = [-1, 0, 1];
  return steps.flatMap((i) =>
    steps.flatMap((j) =>
      steps.map((k) => {
        const place = project(i, j, k);
        const isCation = (i + j + k) % 2 !== 0;
        return {
          key: `${i}.${j}.${k}`,
          x: place.x,
          y: place.y,
          depth: place.depth,
          radius: (isCation ? 0.2 : 0.31) * scale * place.f,
          isCation,
        };
      }),
    ),
  );
}

function drawBonds(ions: readonly DrawnIon[]): DrawnBond[] {
  const at = new Map(ions.map((ion) => [ion.key, ion]));
  return ions.flatMap((from) => {
    const [i = 0, j = 0, k = 0] = from.key.split('.').map(Number);
    const ahead = [`${i + 1}.${j}.${k}`, `${i}.${j + 1}.${k}`, `${i}.${j}.${k + 1}`];
    return ahead.flatMap((key) => {
      const to = at.get(key);
      return to === undefined
        ? []
        : [{ key: `${from.key}-${key}`, from, to, depth: Math.min(from.depth, to.depth) - 0.01 }];
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
  const { from, to } = bond;
  const middle = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
  const half = (end: DrawnIon): JSX.Element => (
    <line
      x1={end.x}
      y1={end.y}
      x2={middle.x}
      y2={middle.y}
      strokeWidth="8"
      className={end.isCation ? 'stroke-oppose' : 'stroke-bind'}
    />
  );
  return (
    <g opacity={fade(bond.depth) * 0.85}>
      {half(from)}
      {half(to)}
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
    <svg aria-hidden viewBox="-250 -250 500 500" className={className}>
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
