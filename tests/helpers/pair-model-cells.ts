import type { CellOperation, PairModelInput, PairTerm } from '#server/energetics/engine/contract';

import { seededNumbers } from './engine-cells.js';

/** A term of the size common in ionic solids; the constants are made up. */
export function pairTerm(
  speciesA: number,
  speciesB: number,
  prefactorEv: number,
  hardnessA: number,
  dispersionEvA6 = 0,
): PairTerm {
  return { speciesA, speciesB, prefactorEv, hardnessA, dispersionEvA6 };
}

/** Rows of the primitive cell of a face-centred cubic lattice. */
export function faceCentred(edgeA: number): number[] {
  const h = edgeA / 2;
  return [0, h, h, h, 0, h, h, h, 0];
}

/** Two ions of charges ±z in the rock-salt order. */
export function rockSalt(edgeA: number, pairs: readonly PairTerm[], charge = 1): PairModelInput {
  return {
    vectorsA: faceCentred(edgeA),
    fractional: [0, 0, 0, 0.5, 0.5, 0.5],
    chargesE: [charge, -charge],
    speciesIndex: [0, 1],
    pairs,
    cutoffA: 12,
  };
}

/** Repulsion between unlike ions alone, and between all pairs with dispersion. */
/** Criteria tight enough that the minimum itself is known to 10⁻⁹ Å. */
export const tight = {
  maxForceEvPerA: 1e-10,
  maxStressEvPerA3: 1e-11,
  energyChangeEvPerIon: 1e-8,
};

export const unlikeOnly = [pairTerm(0, 1, 1200, 0.32)];
export const allPairs = [
  pairTerm(0, 0, 420, 0.31, 1.2),
  pairTerm(0, 1, 1250, 0.32, 9),
  pairTerm(1, 1, 3400, 0.33, 70),
];

/** Fluorite, one formula unit. */
export function fluorite(edgeA = 5.46): PairModelInput {
  return {
    vectorsA: faceCentred(edgeA),
    fractional: [0, 0, 0, 0.25, 0.25, 0.25, 0.75, 0.75, 0.75],
    chargesE: [2, -1, -1],
    speciesIndex: [0, 1, 1],
    pairs: [pairTerm(0, 1, 1270, 0.3), pairTerm(1, 1, 1100, 0.28, 14)],
    cutoffA: 12,
  };
}

/** Rutile, two formula units; u is that of the anions. */
export function rutile(aA = 4.6, cA = 2.96, u = 0.305): PairModelInput {
  return {
    vectorsA: [aA, 0, 0, 0, aA, 0, 0, 0, cA],
    fractional: [
      [0, 0, 0],
      [0.5, 0.5, 0.5],
      [u, u, 0],
      [1 - u, 1 - u, 0],
      [0.5 + u, 0.5 - u, 0.5],
      [0.5 - u, 0.5 + u, 0.5],
    ].flat(),
    chargesE: [2.2, 2.2, -1.1, -1.1, -1.1, -1.1],
    speciesIndex: [0, 0, 1, 1, 1, 1],
    pairs: [pairTerm(0, 1, 17000, 0.195, 12), pairTerm(1, 1, 11800, 0.234, 30)],
    cutoffA: 12,
  };
}

const identity = [1, 0, 0, 0, 1, 0, 0, 0, 1];

/** The eight operations of P4₂/mnm about the fourfold axis, and their products with inversion. */
export function rutileOperations(): CellOperation[] {
  const h = [0.5, 0.5, 0.5];
  const none = [0, 0, 0];
  const proper: CellOperation[] = [
    { rotation: identity, translation: none },
    { rotation: [-1, 0, 0, 0, -1, 0, 0, 0, 1], translation: none },
    { rotation: [0, -1, 0, 1, 0, 0, 0, 0, 1], translation: h },
    { rotation: [0, 1, 0, -1, 0, 0, 0, 0, 1], translation: h },
    { rotation: [-1, 0, 0, 0, 1, 0, 0, 0, -1], translation: h },
    { rotation: [1, 0, 0, 0, -1, 0, 0, 0, -1], translation: h },
    { rotation: [0, 1, 0, 1, 0, 0, 0, 0, -1], translation: none },
    { rotation: [0, -1, 0, -1, 0, 0, 0, 0, -1], translation: none },
  ];
  return proper.flatMap(({ rotation, translation }) => [
    { rotation, translation },
    { rotation: rotation.map((value) => 0 - value), translation },
  ]);
}

/** All integer matrices that keep a lattice's metric, for a group that fixes the origin. */
export function pointOperations(vectorsA: ArrayLike<number>): CellOperation[] {
  const entries = [-1, 0, 1];
  const dot = (i: number, j: number) =>
    [0, 1, 2].reduce((sum, k) => sum + vectorsA[3 * i + k]! * vectorsA[3 * j + k]!, 0);
  const metric = (i: number, j: number) => dot(i, j);
  const found: CellOperation[] = [];
  const rotation = new Array<number>(9).fill(0);
  // Columns of W are the images of the axes in the old axes.
  const keeps = () =>
    [0, 1, 2].every((i) =>
      [0, 1, 2].every((j) => {
        let sum = 0;
        for (let k = 0; k < 3; k += 1) {
          for (let l = 0; l < 3; l += 1) {
            sum += rotation[3 * k + i]! * metric(k, l) * rotation[3 * l + j]!;
          }
        }
        return Math.abs(sum - metric(i, j)) < 1e-6;
      }),
    );
  const fill = (at: number) => {
    if (at === 9) {
      if (keeps()) {
        found.push({ rotation: [...rotation], translation: [0, 0, 0] });
      }
      return;
    }
    for (const entry of entries) {
      rotation[at] = entry;
      fill(at + 1);
    }
  };
  fill(0);
  return found;
}

/** Those operations that keep the sites of a cell. */
export function fittingOperations(
  input: PairModelInput,
  operations: readonly CellOperation[],
): CellOperation[] {
  const count = input.chargesE.length;
  const at = (i: number) => [0, 1, 2].map((k) => input.fractional[3 * i + k]!);
  return operations.filter(({ rotation: w, translation: t }) =>
    Array.from({ length: count }, (_, i) => at(i)).every((x, i) =>
      Array.from({ length: count }, (_, j) => j).some(
        (j) =>
          input.speciesIndex[i] === input.speciesIndex[j] &&
          at(j).every((value, k) => {
            const image = w[3 * k]! * x[0]! + w[3 * k + 1]! * x[1]! + w[3 * k + 2]! * x[2]! + t[k]!;
            return Math.abs(image - value - Math.round(image - value)) < 1e-6;
          }),
      ),
    ),
  );
}

/** The ions moved by up to `sizeA` along each Cartesian axis; the same in every run. */
export function shaken(input: PairModelInput, sizeA: number, seed = 5): PairModelInput {
  const random = seededNumbers(seed);
  const moves = Float64Array.from(
    { length: 3 * input.chargesE.length },
    () => sizeA * (2 * random() - 1),
  );
  return moved(input, moves, new Float64Array(6));
}

/** (1 + ε) r + u for every ion: displacements in Å, strain in six components with γ = 2ε. */
export function moved(
  input: PairModelInput,
  displacementsA: ArrayLike<number>,
  strain: ArrayLike<number>,
): PairModelInput {
  const f = symmetric(Array.from(strain, (value, v) => (v < 3 ? 1 + value : value / 2)));
  const vectorsA = Array.from({ length: 9 }, (_, k) => {
    const [row, axis] = [3 * Math.floor(k / 3), k % 3];
    return [0, 1, 2].reduce((sum, l) => sum + input.vectorsA[row + l]! * f[3 * l + axis]!, 0);
  });
  const inverse = inverse3(vectorsA);
  const fractional = Array.from({ length: input.fractional.length }, (_, k) => {
    const [site, axis] = [3 * Math.floor(k / 3), k % 3];
    return [0, 1, 2].reduce(
      (sum, l) => sum + displacementsA[site + l]! * inverse[3 * l + axis]!,
      input.fractional[k]!,
    );
  });
  return { ...input, vectorsA, fractional };
}

/** Inverse of a row-major 3 × 3 matrix. */
export function inverse3(m: readonly number[]): number[] {
  const minor = (i: number, j: number) => {
    const [a, b] = [(i + 1) % 3, (i + 2) % 3];
    const [c, d] = [(j + 1) % 3, (j + 2) % 3];
    return m[3 * a + c]! * m[3 * b + d]! - m[3 * a + d]! * m[3 * b + c]!;
  };
  const determinant = [0, 1, 2].reduce((sum, j) => sum + m[j]! * minor(0, j), 0);
  return Array.from({ length: 9 }, (_, k) => minor(k % 3, Math.floor(k / 3)) / determinant);
}

/** Nine numbers of a symmetric tensor given by xx, yy, zz, yz, xz, xy. */
export function symmetric(components: ArrayLike<number>): number[] {
  return [0, 5, 4, 5, 1, 3, 4, 3, 2].map((at) => components[at]!);
}

/** The cell repeated along each axis, copy after copy. */
export function supercell(
  input: PairModelInput,
  times: readonly [number, number, number],
): PairModelInput {
  const images: number[][] = [];
  for (let i = 0; i < times[0]; i += 1) {
    for (let j = 0; j < times[1]; j += 1) {
      for (let k = 0; k < times[2]; k += 1) {
        images.push([i, j, k]);
      }
    }
  }
  const every = <T>(values: ArrayLike<T>) => images.flatMap(() => Array.from(values));
  return {
    ...input,
    vectorsA: Array.from(input.vectorsA, (value, k) => value * times[Math.floor(k / 3)]!),
    fractional: images.flatMap((image) =>
      Array.from(input.fractional, (x, k) => (x + image[k % 3]!) / times[k % 3]!),
    ),
    chargesE: every(input.chargesE),
    speciesIndex: every(input.speciesIndex),
  };
}

/** Rock salt of nearest distance 2.85 Å, a box of whole distances, every ion moved a little. */
export function shakenRockSalt(size: readonly [number, number, number]): PairModelInput {
  const places: number[][] = [];
  for (let x = 0; x < size[0]; x += 1) {
    for (let y = 0; y < size[1]; y += 1) {
      for (let z = 0; z < size[2]; z += 1) {
        places.push([x, y, z]);
      }
    }
  }
  const kinds = places.map(([x, y, z]) => (x! + y! + z!) % 2);
  const box = size.map((n) => 2.85 * n) as [number, number, number];
  return shaken(
    {
      vectorsA: [box[0], 0, 0, 0, box[1], 0, 0, 0, box[2]],
      fractional: places.flatMap((place) => place.map((at, k) => at / size[k]!)),
      chargesE: kinds.map((kind) => (kind === 0 ? 1 : -1)),
      speciesIndex: kinds,
      pairs: allPairs,
      cutoffA: 12,
    },
    0.08,
  );
}
