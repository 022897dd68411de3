import type { EngineInput } from '#server/electrostatics/engine/contract';
import type { ReferenceLattice } from '../fixtures/madelung/lattices.js';

/** Numbers in [0, 1) that are the same in every run: a linear congruential generator. */
export function seededNumbers(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    // Multiplier and increment of Numerical Recipes, 3rd ed., 7.1.
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** A reference lattice as the engine takes it, one class per species. */
export function inputOf(lattice: ReferenceLattice, toleranceRelative: number): EngineInput {
  const kinds = [...new Set(lattice.species)];
  return {
    vectorsA: lattice.vectors,
    fractional: lattice.fractional,
    chargesE: lattice.charges,
    speciesIndex: Int32Array.from(lattice.species, (kind) => kinds.indexOf(kind)),
    speciesCount: kinds.length,
    toleranceRelative,
    uniformBackground: lattice.isCharged,
  };
}

/**
 * Rock salt of n × n × n cubes of eight ions, nearest distance 2.1 Å, each ion moved by up to a
 * given part of it along each axis.
 */
export function displacedRockSalt(
  n: number,
  toleranceRelative: number,
  displacement = 0.1,
): EngineInput {
  const random = seededNumbers(2024);
  const edge = 2 * n;
  const fractional: number[] = [];
  const kinds: number[] = [];
  for (let x = 0; x < edge; x += 1) {
    for (let y = 0; y < edge; y += 1) {
      for (let z = 0; z < edge; z += 1) {
        const at = (whole: number) => (whole + displacement * (2 * random() - 1)) / edge;
        fractional.push(at(x), at(y), at(z));
        kinds.push((x + y + z) % 2);
      }
    }
  }
  const lengthA = 2.1 * edge;
  return {
    vectorsA: [lengthA, 0, 0, 0, lengthA, 0, 0, 0, lengthA],
    fractional: Float64Array.from(fractional),
    chargesE: Float64Array.from(kinds, (kind) => (kind === 0 ? 1 : -1)),
    speciesIndex: Int32Array.from(kinds),
    speciesCount: 2,
    toleranceRelative,
  };
}

/** Rows a, b, c from edges and angles in degrees, a along x. */
export function vectorsFrom(
  [a, b, c]: readonly [number, number, number],
  [alpha, beta, gamma]: readonly [number, number, number],
): number[] {
  const cos = (degrees: number) => Math.cos((degrees * Math.PI) / 180);
  const sinGamma = Math.sqrt(1 - cos(gamma) ** 2);
  const cy = (cos(alpha) - cos(beta) * cos(gamma)) / sinGamma;
  const cz = Math.sqrt(1 - cos(beta) ** 2 - cy ** 2);
  return [a, 0, 0, b * cos(gamma), b * sinGamma, 0, c * cos(beta), c * cy, c * cz];
}

/** A cell of any shape with ions of charges ±1 and ±2 put at random, not too close together. */
export function randomCell(
  vectorsA: readonly number[],
  count: number,
  toleranceRelative: number,
  seed = 7,
): EngineInput {
  const random = seededNumbers(seed);
  const kinds = Array.from({ length: count }, (_, i) => (i % 4) as 0 | 1 | 2 | 3);
  const charges = [1, -1, 2, -2];
  const rest = kinds.slice(0, count - (count % 4));
  return {
    vectorsA,
    fractional: Float64Array.from({ length: 3 * rest.length }, random),
    chargesE: Float64Array.from(rest, (kind) => charges[kind]!),
    speciesIndex: Int32Array.from(rest),
    speciesCount: 4,
    toleranceRelative,
  };
}

/** The cell repeated along each axis. */
export function repeated(
  input: EngineInput,
  times: readonly [number, number, number],
): EngineInput {
  const [na, nb, nc] = times;
  const count = input.chargesE.length;
  const images: [number, number, number][] = [];
  for (let i = 0; i < na; i += 1) {
    for (let j = 0; j < nb; j += 1) {
      for (let k = 0; k < nc; k += 1) {
        images.push([i, j, k]);
      }
    }
  }
  const copy = <T>(value: (site: number) => T) =>
    images.flatMap(() => Array.from({ length: count }, (_, site) => value(site)));
  return {
    ...input,
    vectorsA: input.vectorsA.map((value, k) => value * times[Math.floor(k / 3)]!),
    fractional: Float64Array.from(
      images.flatMap((image) =>
        [...input.fractional].map((f, k) => (f + image[k % 3]!) / times[k % 3]!),
      ),
    ),
    chargesE: Float64Array.from(copy((site) => input.chargesE[site]!)),
    speciesIndex: Int32Array.from(copy((site) => input.speciesIndex[site]!)),
  };
}

/** Σq²/d₀, the size a tolerance is relative to, in e²/Å. */
export function toleranceScale(input: EngineInput, shortestDistanceA: number): number {
  return input.chargesE.reduce((sum, q) => sum + q * q, 0) / shortestDistanceA;
}
