/** A place or direction in Cartesian Å (or without unit, where it is a direction). */
export type Vector = readonly [number, number, number];

export function subtract(a: Vector, b: Vector): Vector {
  return [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
}

export function addScaled(a: Vector, b: Vector, factor: number): Vector {
  return [a[0] + b[0] * factor, a[1] + b[1] * factor, a[2] + b[2] * factor];
}

export function dot(a: Vector, b: Vector): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}

export function norm(a: Vector): number {
  return Math.sqrt(dot(a, a));
}

export function normalise(a: Vector): Vector {
  const length = norm(a) || 1;
  return [a[0] / length, a[1] / length, a[2] / length];
}

/** Cartesian place of fractional coordinates; `vectors` holds a, b, c as rows. */
export function placeAt(vectors: readonly number[], x: number, y: number, z: number): Vector {
  const [ax = 0, ay = 0, az = 0, bx = 0, by = 0, bz = 0, cx = 0, cy = 0, cz = 0] = vectors;
  return [x * ax + y * bx + z * cx, x * ay + y * by + z * cy, x * az + y * bz + z * cz];
}

/** Row 0, 1 or 2 of the cell vectors: a, b or c. */
export function cellVector(vectors: readonly number[], axis: 0 | 1 | 2): Vector {
  const at = axis * 3;
  return [vectors[at] ?? 0, vectors[at + 1] ?? 0, vectors[at + 2] ?? 0];
}
