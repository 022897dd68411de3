import { displayRadiusA } from '#common/chemistry/ionic-radii';
import type { ResolvedCell, ResolvedSite } from '#common/physics/resolved-cell';
import type { ReportPicture } from '#common/schemas/report';

import { ionText } from './ion-text.js';

/** Warm for positive ions, cool for negative ones, by order of first appearance. */
const families = {
  cation: ['#B5532A', '#D08A2E', '#8F3B4A', '#C9A227', '#7A5230', '#D96F52'],
  anion: ['#1F7A7D', '#3E6FA3', '#4F8A5B', '#5B5FA8', '#2F9AA0', '#7396B8'],
} as const;
const neutralColour = '#9A9A8E';

/** Ions are drawn at this fraction of their radius, so that those behind show. */
const ionScale = 0.42;
/** More balls than this make a blot, not a picture. */
const ballLimit = 1_500;
/** Margin of the unit square. */
const margin = 0.03;
/** A coordinate this close to a face of the cell lies on it. */
const faceTolerance = 1e-5;

type Vector = readonly [number, number, number];

/** The view: turned about the upright axis, then tipped toward the eye, radians. */
const turn = -0.42;
const tip = 0.3;

/** Looks along −y with z up; returns right, up and toward the eye. */
function project([x, y, z]: Vector): Vector {
  const right = x * Math.cos(turn) - y * Math.sin(turn);
  const away = x * Math.sin(turn) + y * Math.cos(turn);
  const up = z * Math.cos(tip) + away * Math.sin(tip);
  const toward = z * Math.sin(tip) - away * Math.cos(tip);
  return [right, up, toward];
}

function placeAt(vectorsA: readonly number[], f: Vector): Vector {
  const at = (k: number) => f[0] * vectorsA[k]! + f[1] * vectorsA[3 + k]! + f[2] * vectorsA[6 + k]!;
  return [at(0), at(1), at(2)];
}

/** Colour of each ion kind, by the sign of its charge and its order in the cell. */
function coloursOf(cell: ResolvedCell): Map<string, string> {
  const colours = new Map<string, string>();
  const orders = { cation: 0, anion: 0 };
  for (const { speciesKey, chargeE } of cell.sites) {
    if (!colours.has(speciesKey)) {
      const sign = chargeE > 0 ? 'cation' : 'anion';
      const family = families[sign];
      colours.set(
        speciesKey,
        chargeE === 0 ? neutralColour : family[orders[sign] % family.length]!,
      );
      orders[sign] += chargeE === 0 ? 0 : 1;
    }
  }
  return colours;
}

/** Ions on a face are drawn on the opposite one too. */
function shifts(fraction: number): number[] {
  if (fraction > 1 - faceTolerance) {
    return [-1, 0];
  }
  return fraction < faceTolerance ? [0, 1] : [0];
}

function copiesOf(site: ResolvedSite): Vector[] {
  const [x, y, z] = site.fractional;
  return shifts(x).flatMap((i) =>
    shifts(y).flatMap((j) => shifts(z).map((k): Vector => [x + i, y + j, z + k])),
  );
}

function edgesOf(vectorsA: readonly number[]): [Vector, Vector][] {
  const corners = [0, 1, 2, 3, 4, 5, 6, 7].map((bits): Vector => [
    bits & 1,
    (bits >> 1) & 1,
    (bits >> 2) & 1,
  ]);
  return corners.flatMap((from, index) =>
    [1, 2, 4]
      .filter((bit) => (index & bit) === 0)
      .map((bit): [Vector, Vector] => [
        project(placeAt(vectorsA, from)),
        project(placeAt(vectorsA, corners[index | bit]!)),
      ]),
  );
}

/**
 * One unit cell in parallel projection, the c axis up, ions on the faces completed, sorted from back
 * to front.
 * @returns null for an empty cell and for one with more ions than a page can show
 */
export function latticePicture(cell: ResolvedCell): ReportPicture | null {
  const colours = coloursOf(cell);
  const balls = cell.sites.flatMap((site) => {
    const radius = displayRadiusA(site.element, site.chargeE).radiusA * ionScale;
    const colour = colours.get(site.speciesKey)!;
    return copiesOf(site).map((place) => ({
      at: project(placeAt(cell.vectorsA, place)),
      radius,
      colour,
    }));
  });
  if (balls.length === 0 || balls.length > ballLimit) {
    return null;
  }
  const edges = edgesOf(cell.vectorsA);
  const ends = [
    ...balls.map(({ at, radius }) => ({ at, radius })),
    ...edges.flat().map((at) => ({ at, radius: 0 })),
  ];
  const low = (k: 0 | 1) => Math.min(...ends.map(({ at, radius }) => at[k] - radius));
  const high = (k: 0 | 1) => Math.max(...ends.map(({ at, radius }) => at[k] + radius));
  const [left, right, bottom, top] = [low(0), high(0), low(1), high(1)];
  const scale = (1 - 2 * margin) / Math.max(right - left, top - bottom);
  const x = (at: Vector) => round(0.5 + (at[0] - (left + right) / 2) * scale);
  const y = (at: Vector) => round(0.5 - (at[1] - (bottom + top) / 2) * scale);
  return {
    balls: balls
      .toSorted((a, b) => a.at[2] - b.at[2])
      .map(({ at, radius, colour }) => ({
        x: x(at),
        y: y(at),
        radius: round(radius * scale),
        colour,
      })),
    edges: edges.map(([from, to]) => ({ x1: x(from), y1: y(from), x2: x(to), y2: y(to) })),
    legend: [...colours].map(([key, colour]) => ({ ion: ionText(key), colour })),
    description: `One unit cell seen slightly from above: ${[...colours.keys()].map(ionText).join(', ')}.`,
  };
}

const round = (value: number) => Number(value.toFixed(5));
