import { describe, expect, it } from 'vitest';

import { boundRadiusA, buildBlock, drawableRepeat, positionAt } from './block.ts';
import { findBonds } from './bonds.ts';
import { cellEdges, trimmedEdges } from './cell-edges.ts';
import { distanceA } from './ion-grid.ts';
import { formatIonId, ionPosition, parseIonId } from './ion-id.ts';
import { findLitPairs } from './lit-pairs.ts';
import { pinAnchor } from './pins.ts';
import { cellOf, periclase, periclaseRadiusA } from './test-cells.ts';
import { norm, subtract } from './vector.ts';

const block = buildBlock(periclase, [1, 1, 1], periclaseRadiusA);
const d0 = 4.212 / 2;

describe('the block', () => {
  it('shows ions on all faces of the cell: 27 for rock salt, 125 for 2 × 2 × 2', () => {
    expect(block.count).toBe(27);
    expect(buildBlock(periclase, [2, 2, 2], periclaseRadiusA).count).toBe(125);
  });

  it('puts each ion where its id says', () => {
    block.ids.forEach((id, index) => {
      const place = ionPosition(periclase, id)!;
      expect(norm(subtract(place, positionAt(block, index)))).toBeLessThan(1e-12);
    });
    expect(new Set(block.ids).size).toBe(27);
  });

  it('counts a coordinate just under 1 as lying on the face', () => {
    const nearly = cellOf(
      [4, 0, 0, 0, 4, 0, 0, 0, 4],
      [{ element: 'O', chargeE: -2, places: [[1 - 1e-8, 0.5, 0.5]] }],
    );
    const xs = buildBlock(nearly, [1, 1, 1], () => 1).positionsA.filter((_, at) => at % 3 === 0);
    expect([...xs].map((x) => Math.abs(Math.round(x)))).toEqual([0, 4]);
  });

  it('keeps the repeat drawable, taking from the longest side first', () => {
    expect(drawableRepeat(periclase, [2, 3, 1])).toEqual([2, 3, 1]);
    const many = { ...periclase, sites: Array.from({ length: 3000 }, () => periclase.sites[0]!) };
    expect(drawableRepeat(many, [4, 2, 1])).toEqual([2, 2, 1]);
    expect(drawableRepeat(periclase, [0, 99, Number.NaN])).toEqual([1, 8, 1]);
  });

  it('bounds every ion with its drawn radius', () => {
    const corner = (Math.sqrt(3) * 4.212) / 2;
    expect(boundRadiusA(block, 0.5)).toBeCloseTo(corner + 0.7, 10);
  });
});

describe('ion ids', () => {
  it('survive a round trip and refuse other text', () => {
    expect(parseIonId(formatIonId({ siteIndex: 12, cell: [-1, 0, 3] }))).toEqual({
      siteIndex: 12,
      cell: [-1, 0, 3],
    });
    for (const text of ['', '1.2.3', 'x.0.0.0', '1.0.0.0.0', '-1.0.0.0']) {
      expect(parseIonId(text)).toBeNull();
    }
    expect(ionPosition(periclase, '99.0.0.0')).toBeNull();
  });
});

describe('struts', () => {
  it('join unlike neighbours only: 54 in a rock salt cell with its faces', () => {
    // 3 × 3 × 3 places with steps along three axes: 3 · 2 · 9.
    const bonds = findBonds(block);
    expect(bonds).toHaveLength(54);
    for (const { from, to } of bonds) {
      expect(block.chargesE[from]! * block.chargesE[to]!).toBeLessThan(0);
      expect(distanceA(block, from, to)).toBeCloseTo(d0, 10);
    }
  });

  it('are absent where ions are too far apart or carry no charge', () => {
    const wide = { ...periclase, vectorsA: periclase.vectorsA.map((part) => part * 1.6) };
    expect(findBonds(buildBlock(wide, [1, 1, 1], periclaseRadiusA))).toEqual([]);
    const plain = cellOf(
      [3, 0, 0, 0, 3, 0, 0, 0, 3],
      [{ element: 'Ar', chargeE: 0, places: [[0, 0, 0]] }],
    );
    expect(findBonds(buildBlock(plain, [1, 1, 1], () => 2))).toEqual([]);
  });
});

describe('cell edges', () => {
  it('are twelve for a cell, each drawn once when repeated', () => {
    expect(cellEdges(block)).toHaveLength(12);
    const two = cellEdges(buildBlock(periclase, [2, 1, 1], periclaseRadiusA));
    expect(two).toHaveLength(20);
    const keys = two.map(({ from, to }) => [...from, ...to].map((v) => v.toFixed(6)).join());
    expect(new Set(keys).size).toBe(20);
    expect(two.filter(({ isFirstCell }) => isFirstCell)).toHaveLength(12);
  });

  it('leave the inside of ions free', () => {
    const open = trimmedEdges(cellEdges(block), block, 0.5);
    // Two gaps beside the ion halfway: each edge falls into two pieces.
    expect(open).toHaveLength(24);
    const length = norm(subtract(open[0]!.to, open[0]!.from));
    expect(length).toBeCloseTo(d0 - 0.7 - 0.36, 10);
  });
});

describe('lit pairs', () => {
  const kind = { speciesA: 'Mg+2', speciesB: 'O-2', distanceA: d0 * Math.sqrt(3) };

  it('are those of the picked ion: eight at √3 d₀ around the middle one', () => {
    const middle = block.ids.indexOf('5.0.0.0');
    const pairs = findLitPairs(block, kind, middle);
    expect(pairs).toHaveLength(8);
    expect(pairs.every(({ from }) => from === middle)).toBe(true);
  });

  it('are all of the block when none is picked, each once', () => {
    // Each of the 8 small cubes has 4 body diagonals.
    expect(findLitPairs(block, kind, null)).toHaveLength(32);
  });

  it('are none for a distance or kind that does not occur', () => {
    expect(findLitPairs(block, { ...kind, distanceA: 3 }, null)).toEqual([]);
    expect(findLitPairs(block, { ...kind, speciesA: 'O-2' }, null)).toEqual([]);
  });
});

describe('pins', () => {
  it('stand on an ion with their label, on a pair, or on the block', () => {
    const onSite = pinAnchor(periclase, block, { siteLabel: 'Mg1', pair: null });
    expect(periclase.sites[block.siteIndices[onSite.ion!]!]!.label).toBe('Mg1');
    const pair = { speciesA: 'Mg+2', speciesB: 'O-2', distanceA: d0 };
    const onPair = pinAnchor(periclase, block, { siteLabel: null, pair });
    expect(onPair.ion).toBeNull();
    const nearest = block.ids.map((_, index) =>
      norm(subtract(positionAt(block, index), onPair.at)),
    );
    expect(Math.min(...nearest)).toBeCloseTo(d0 / 2, 10);
    const lost = pinAnchor(periclase, block, { siteLabel: 'gone', pair: null });
    expect(lost).toEqual({ at: [0, 0, 4.212], ion: null });
  });
});
