import {
  BufferAttribute,
  Color,
  InstancedBufferAttribute,
  InstancedBufferGeometry,
  InstancedInterleavedBuffer,
  InterleavedBufferAttribute,
  PlaneGeometry,
  type BufferGeometry,
} from 'three';

import type { RibbonBatch, SphereBatch, StrutBatch } from '../model/drawing.ts';
import { parseHex } from '../model/colours.ts';

/** A colour in display values, as the shaders expect them (no conversion to linear light). */
export function displayColour(hex: string): Color {
  const [red, green, blue] = parseHex(hex);
  return new Color(red / 255, green / 255, blue / 255);
}

function coloursOf(
  indices: Uint8Array,
  palette: readonly string[],
  first: number,
  stride: number,
  count: number,
): InstancedBufferAttribute {
  const parsed = palette.map(parseHex);
  const colours = new Uint8Array(count * 3);
  for (let at = 0; at < count; at += 1) {
    colours.set(parsed[indices[at * stride + first]!] ?? [128, 128, 128], at * 3);
  }
  return new InstancedBufferAttribute(colours, 3, true);
}

/** One disc per ball. */
export function sphereGeometry(
  batch: SphereBatch,
  palette: readonly string[],
): InstancedBufferGeometry {
  const geometry = new InstancedBufferGeometry();
  const square = new PlaneGeometry(2, 2);
  geometry.setAttribute('position', square.getAttribute('position'));
  geometry.setIndex(square.getIndex());
  geometry.setAttribute('centre', new InstancedBufferAttribute(batch.centresA, 3));
  geometry.setAttribute('radius', new InstancedBufferAttribute(batch.radiiA, 1));
  geometry.setAttribute('colour', coloursOf(batch.colours, palette, 0, 1, batch.count));
  geometry.setAttribute('sign', new InstancedBufferAttribute(Float32Array.from(batch.signs), 1));
  geometry.instanceCount = batch.count;
  return geometry;
}

function setEnds(geometry: InstancedBufferGeometry, endsA: Float32Array): void {
  const ends = new InstancedInterleavedBuffer(endsA, 6);
  geometry.setAttribute('start', new InterleavedBufferAttribute(ends, 3, 0));
  geometry.setAttribute('finish', new InterleavedBufferAttribute(ends, 3, 3));
}

const roundSteps = 16;
const lengthSteps = 8;

/** A tube around z from 0 to 1: x and y are the direction outward, z the share of the length. */
function tubeInto(geometry: BufferGeometry): void {
  const points: number[] = [];
  const index: number[] = [];
  for (let along = 0; along <= lengthSteps; along += 1) {
    for (let round = 0; round < roundSteps; round += 1) {
      const angle = (round / roundSteps) * 2 * Math.PI;
      points.push(Math.cos(angle), Math.sin(angle), along / lengthSteps);
      if (along < lengthSteps) {
        const here = along * roundSteps + round;
        const next = along * roundSteps + ((round + 1) % roundSteps);
        index.push(here, here + roundSteps, next, next, here + roundSteps, next + roundSteps);
      }
    }
  }
  geometry.setAttribute('position', new BufferAttribute(Float32Array.from(points), 3));
  geometry.setIndex(index);
}

export function strutGeometry(
  batch: StrutBatch,
  palette: readonly string[],
): InstancedBufferGeometry {
  const geometry = new InstancedBufferGeometry();
  tubeInto(geometry);
  setEnds(geometry, batch.endsA);
  geometry.setAttribute('startColour', coloursOf(batch.colours, palette, 0, 2, batch.count));
  geometry.setAttribute('finishColour', coloursOf(batch.colours, palette, 1, 2, batch.count));
  geometry.instanceCount = batch.count;
  return geometry;
}

/** One strip per line: x runs from 0 to 1 along it, y from −1 to 1 across. */
export function ribbonGeometry(batch: RibbonBatch): InstancedBufferGeometry {
  const geometry = new InstancedBufferGeometry();
  const corners = Float32Array.from([0, -1, 0, 1, -1, 0, 1, 1, 0, 0, 1, 0]);
  geometry.setAttribute('position', new BufferAttribute(corners, 3));
  geometry.setIndex([0, 1, 2, 0, 2, 3]);
  setEnds(geometry, batch.endsA);
  geometry.instanceCount = batch.count;
  return geometry;
}
