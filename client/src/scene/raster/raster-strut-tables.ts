import type { Rgb } from '../model/colours.ts';
import { strutTaper } from '../model/drawing.ts';
import { shade } from '../model/light.ts';
import { pack } from './raster-buffer.ts';

/** What the light on a strut depends on: its direction in the viewer's frame, unit length. */
export interface StrutDirection {
  readonly ax: number;
  readonly ay: number;
  readonly az: number;
}

export const acrossSteps = 32;

/** Brightness, gloss and bulge across a strut, from one side to the other. */
export interface AcrossTable {
  readonly bodies: Float32Array;
  readonly glosses: Float32Array;
  /** Height of the surface over the axis toward the eye, in radii. */
  readonly fronts: Float32Array;
  /** The same across the axis, before it is tilted. */
  readonly bulges: Float32Array;
  /** Colour tables of slim struts in this direction, by their fades and colours. */
  readonly slims: Map<number, Uint32Array>;
}

const tableLimit = 4096;
const directionSteps = 48;

/** The normal turns from one side over the front to the other side. */
function buildAcross(ax: number, ay: number, az: number): AcrossTable {
  const flat = Math.sqrt(Math.max(1e-6, 1 - az * az));
  // The screen's y points down: across runs to the right of the strut's direction.
  const [sideX, sideY] = [ay / flat, -ax / flat];
  const table = {
    bodies: new Float32Array(acrossSteps + 1),
    glosses: new Float32Array(acrossSteps + 1),
    fronts: new Float32Array(acrossSteps + 1),
    bulges: new Float32Array(acrossSteps + 1),
    slims: new Map<number, Uint32Array>(),
  };
  for (let step = 0; step <= acrossSteps; step += 1) {
    const u = (step / acrossSteps) * 2 - 1;
    const w = Math.sqrt(Math.max(0, 1 - u * u));
    const { body, gloss } = shade(
      u * sideX - (w * az * ax) / flat,
      u * sideY - (w * az * ay) / flat,
      w * flat,
    );
    table.bodies[step] = body;
    table.glosses[step] = 255 * gloss;
    table.fronts[step] = w * flat;
    table.bulges[step] = w;
  }
  return table;
}

/** Below 2³⁰, so that maps find it quickly. */
function directionKey({ ax, ay, az }: StrutDirection): number {
  const x = Math.round((ax + 1) * directionSteps);
  const y = Math.round((ay + 1) * directionSteps);
  const z = Math.round((az + 1) * directionSteps);
  return (x * 128 + y) * 128 + z;
}

/** Radius along a strut: full at its ends, slimmer halfway. */
export function strutProfile(t: number): number {
  const fromMiddle = 2 * t - 1;
  return 1 - strutTaper * (1 - fromMiddle * fromMiddle);
}

/** The first end's colour gives way to the other's around the middle. */
function otherShare(t: number): number {
  const step = t < 0.34 ? 0 : t > 0.66 ? 1 : (t - 0.34) / 0.32;
  return step * step * (3 - 2 * step);
}

/** Struts are darker where they enter a ball. */
function contactShade(t: number): number {
  const fromEnd = t < 0.5 ? t : 1 - t;
  return fromEnd < 0.2 ? 0.8 + fromEnd : 1;
}

/** Ends of a strut: colours by index and value, and how far each is faded. */
export interface StrutEnds {
  firstColour: number;
  lastColour: number;
  one: Rgb;
  other: Rgb;
  paper: Rgb;
  fade0: number;
  fade1: number;
}

/** Colour of a strut at a step across and a share of its length. */
export function strutColour(across: AcrossTable, ends: StrutEnds, step: number, t: number): number {
  const { one, other, paper } = ends;
  const share = otherShare(t);
  const body = across.bodies[step]! * contactShade(t);
  const gloss = across.glosses[step]!;
  const fade = ends.fade0 + (ends.fade1 - ends.fade0) * t;
  const red = Math.min(255, (one[0] + (other[0] - one[0]) * share) * body + gloss);
  const green = Math.min(255, (one[1] + (other[1] - one[1]) * share) * body + gloss);
  const blue = Math.min(255, (one[2] + (other[2] - one[2]) * share) * body + gloss);
  return pack(
    red + (paper[0] - red) * fade,
    green + (paper[1] - green) * fade,
    blue + (paper[2] - blue) * fade,
  );
}

/** Slim struts are many: their colours come from tables of this size. */
export const slimAcross = 8;
export const slimAlong = 16;
const slimFades = 24;

/** Tables for struts. Those of a crystal share few directions; emptied when the inks change. */
export class StrutTables {
  private readonly directions = new Map<number, AcrossTable>();

  clear(): void {
    this.directions.clear();
  }

  across(direction: StrutDirection): AcrossTable {
    const key = directionKey(direction);
    let table = this.directions.get(key);
    if (table === undefined) {
      if (this.directions.size >= tableLimit) {
        this.directions.clear();
      }
      table = buildAcross(direction.ax, direction.ay, direction.az);
      this.directions.set(key, table);
    }
    return table;
  }

  /** `slimAlong + 1` rows of `slimAcross + 1` colours. */
  slim(across: AcrossTable, ends: StrutEnds): Uint32Array {
    const fade0 = Math.round(ends.fade0 * slimFades);
    const fade1 = Math.round(ends.fade1 * slimFades);
    const fades = fade0 * (slimFades + 1) + fade1;
    const key = fades * 65536 + ends.firstColour * 256 + ends.lastColour;
    let table = across.slims.get(key);
    if (table === undefined) {
      table = buildSlim(across, { ...ends, fade0: fade0 / slimFades, fade1: fade1 / slimFades });
      across.slims.set(key, table);
    }
    return table;
  }
}

function buildSlim(across: AcrossTable, ends: StrutEnds): Uint32Array {
  const table = new Uint32Array((slimAlong + 1) * (slimAcross + 1));
  for (let at = 0; at < table.length; at += 1) {
    const step = (at % (slimAcross + 1)) * (acrossSteps / slimAcross);
    const t = Math.floor(at / (slimAcross + 1)) / slimAlong;
    table[at] = strutColour(across, ends, step, t);
  }
  return table;
}
