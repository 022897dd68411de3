import type { LatticeParameters } from '#common/physics/resolved-cell';

/** Three rows a, b, c (or a*, b*, c*) of Cartesian components, row-major: nine numbers. */
export type CellVectors = readonly number[];

const radiansPerDegree = Math.PI / 180;

/** Cosine of an angle in degrees, exact where the angle is a right one or one of 60° and 120°. */
function cosineOfDegrees(angleDeg: number): number {
  if (angleDeg === 90) {
    return 0;
  }
  if (angleDeg === 60) {
    return 0.5;
  }
  if (angleDeg === 120) {
    return -0.5;
  }
  return Math.cos(angleDeg * radiansPerDegree);
}

/**
 * Cell vectors in Å from lattice parameters: a along x, b in the xy plane, c above it.
 * Standard crystallographic orientation, International Tables for Crystallography Vol. B, 3.3.1.
 *
 * @returns rows a, b, c; NaN where the angles can't close a cell
 */
export function cellVectors(lattice: LatticeParameters): number[] {
  const { aA, bA, cA } = lattice;
  const cosAlpha = cosineOfDegrees(lattice.alphaDeg);
  const cosBeta = cosineOfDegrees(lattice.betaDeg);
  const cosGamma = cosineOfDegrees(lattice.gammaDeg);
  const sinGamma = Math.sqrt(1 - cosGamma * cosGamma);
  const cy = (cosAlpha - cosBeta * cosGamma) / sinGamma;
  const cz = Math.sqrt(1 - cosBeta * cosBeta - cy * cy);
  return [aA, 0, 0, bA * cosGamma, bA * sinGamma, 0, cA * cosBeta, cA * cy, cA * cz];
}

/** Determinant of a row-major 3 × 3 matrix. */
export function determinant(matrix: readonly number[]): number {
  const [a, b, c, d, e, f, g, h, i] = matrix as [
    number,
    number,
    number,
    number,
    number,
    number,
    number,
    number,
    number,
  ];
  return a * (e * i - f * h) + b * (f * g - d * i) + c * (d * h - e * g);
}

/** Volume |a · (b × c)| in Å³. */
export function cellVolumeA3(vectors: CellVectors): number {
  return Math.abs(determinant(vectors));
}

/** Cartesian position in Å of fractional coordinates: r = x a + y b + z c. */
export function fractionalToCartesian(
  vectors: CellVectors,
  fractional: readonly number[],
): [number, number, number] {
  const [x, y, z] = fractional as [number, number, number];
  return [
    x * vectors[0]! + y * vectors[3]! + z * vectors[6]!,
    x * vectors[1]! + y * vectors[4]! + z * vectors[7]!,
    x * vectors[2]! + y * vectors[5]! + z * vectors[8]!,
  ];
}

/**
 * Reciprocal vectors with the factor 2π, in Å⁻¹: a* = 2π b × c / V and so on, so that
 * a_i · a*_j = 2π δ_ij.
 */
export function reciprocalVectors(vectors: CellVectors): number[] {
  const row = (i: number): [number, number, number] => [
    vectors[3 * i]!,
    vectors[3 * i + 1]!,
    vectors[3 * i + 2]!,
  ];
  const [a, b, c] = [row(0), row(1), row(2)];
  const cross = (u: readonly number[], v: readonly number[]) => [
    u[1]! * v[2]! - u[2]! * v[1]!,
    u[2]! * v[0]! - u[0]! * v[2]!,
    u[0]! * v[1]! - u[1]! * v[0]!,
  ];
  const bc = cross(b, c);
  const signedVolume = a[0] * bc[0]! + a[1] * bc[1]! + a[2] * bc[2]!;
  const factor = (2 * Math.PI) / signedVolume;
  return [...bc, ...cross(c, a), ...cross(a, b)].map((component) => component * factor);
}

/** Fractional coordinates of a Cartesian position in Å: x = r · a* / 2π. */
export function cartesianToFractional(
  vectors: CellVectors,
  cartesian: readonly number[],
): [number, number, number] {
  const reciprocal = reciprocalVectors(vectors);
  const along = (i: number) =>
    (cartesian[0]! * reciprocal[3 * i]! +
      cartesian[1]! * reciprocal[3 * i + 1]! +
      cartesian[2]! * reciprocal[3 * i + 2]!) /
    (2 * Math.PI);
  return [along(0), along(1), along(2)];
}
