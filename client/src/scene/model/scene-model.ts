import type { ResolvedCell } from '#common/physics/resolved-cell';

import { boundRadiusA, buildBlock, type Block, type Repeat } from './block.ts';
import { findBonds, type Bond } from './bonds.ts';
import { cellEdges, trimmedEdges, type CellEdge } from './cell-edges.ts';
import { speciesColours, stageInks, type SceneTheme } from './colours.ts';
import {
  edgeBatch,
  litPairBatch,
  sphereBatch,
  strutBatch,
  strutRadiusA,
  type RibbonBatch,
  type SphereBatch,
  type StrutBatch,
} from './drawing.ts';
import { findLitPairs, type LitPairKind } from './lit-pairs.ts';
import type { Vector } from './vector.ts';

/** What the block consists of: changes with the cell and the repeat only. */
export interface BlockModel {
  readonly cell: ResolvedCell;
  readonly block: Block;
  readonly bonds: readonly Bond[];
  readonly edges: readonly CellEdge[];
  readonly indexOf: ReadonlyMap<string, number>;
}

export function buildBlockModel(
  cell: ResolvedCell,
  repeat: Repeat,
  radiusOf: (speciesKey: string) => number,
): BlockModel {
  const block = buildBlock(cell, repeat, radiusOf);
  return {
    cell,
    block,
    bonds: findBonds(block),
    edges: cellEdges(block),
    indexOf: new Map(block.ids.map((id, index) => [id, index])),
  };
}

/** Balls, struts and edges as they are drawn. */
export interface SolidModel {
  readonly spheres: SphereBatch;
  readonly struts: StrutBatch;
  readonly bounds: { readonly centreA: Vector; readonly radiusA: number };
}

export function buildSolids(
  { block, bonds }: BlockModel,
  ionScale: number,
  signMarks: boolean,
): SolidModel {
  const spheres = sphereBatch(block, ionScale, signMarks);
  return {
    spheres,
    struts: strutBatch(block, spheres, bonds, ionScale),
    bounds: { centreA: block.centreA, radiusA: boundRadiusA(block, ionScale) },
  };
}

/** Edges of the first cell in ink; those of the other cells fainter. */
export function buildEdges(
  { block, edges }: BlockModel,
  ionScale: number,
  theme: SceneTheme,
): RibbonBatch[] {
  const style = {
    widthPx: 1.25,
    colour: stageInks[theme].ink,
    hiddenOpacity: 0,
    isDotted: false,
    biasA: strutRadiusA * 1.3,
  };
  const open = trimmedEdges(edges, block, ionScale);
  const first = open.filter(({ isFirstCell }) => isFirstCell);
  const others = open.filter(({ isFirstCell }) => !isFirstCell);
  return [
    edgeBatch(first, { ...style, opacity: 0.72 }),
    ...(others.length === 0 ? [] : [edgeBatch(others, { ...style, opacity: 0.22 })]),
  ];
}

export function buildLitPairs(
  { block }: BlockModel,
  { spheres }: SolidModel,
  kind: LitPairKind,
  picked: number | null,
  theme: SceneTheme,
): RibbonBatch {
  return litPairBatch(block, spheres, findLitPairs(block, kind, picked), {
    widthPx: 3,
    colour: stageInks[theme].ink,
    opacity: 1,
    hiddenOpacity: 0.45,
    isDotted: true,
    biasA: strutRadiusA * 1.8,
  });
}

/** Colours in the order the batches index them. */
export function paletteOf({ cell, block }: BlockModel, theme: SceneTheme): string[] {
  const colours = speciesColours(cell, theme);
  return block.speciesKeys.map((key) => colours.get(key) ?? '#808080');
}
