import type { Block } from './block.ts';

/** Boxes of ions, so that near pairs are found without looking at all of them. */
export interface IonGrid {
  readonly block: Block;
  readonly reachA: number;
  readonly boxes: ReadonlyMap<string, readonly number[]>;
}

function boxOf(block: Block, index: number, reachA: number): [number, number, number] {
  const at = index * 3;
  return [
    Math.floor(block.positionsA[at]! / reachA),
    Math.floor(block.positionsA[at + 1]! / reachA),
    Math.floor(block.positionsA[at + 2]! / reachA),
  ];
}

export function buildIonGrid(block: Block, reachA: number): IonGrid {
  const boxes = new Map<string, number[]>();
  for (let index = 0; index < block.count; index += 1) {
    const key = boxOf(block, index, reachA).join();
    const box = boxes.get(key);
    if (box === undefined) {
      boxes.set(key, [index]);
    } else {
      box.push(index);
    }
  }
  return { block, reachA, boxes };
}

export function distanceA(block: Block, one: number, other: number): number {
  const a = one * 3;
  const b = other * 3;
  const p = block.positionsA;
  return Math.hypot(p[a]! - p[b]!, p[a + 1]! - p[b + 1]!, p[a + 2]! - p[b + 2]!);
}

/** Calls back for every other ion of the block within the grid's reach. */
export function eachNear(
  grid: IonGrid,
  index: number,
  visit: (other: number, distanceA: number) => void,
): void {
  const [x, y, z] = boxOf(grid.block, index, grid.reachA);
  for (let i = x - 1; i <= x + 1; i += 1) {
    for (let j = y - 1; j <= y + 1; j += 1) {
      for (let k = z - 1; k <= z + 1; k += 1) {
        for (const other of grid.boxes.get(`${i},${j},${k}`) ?? []) {
          const distance = other === index ? Infinity : distanceA(grid.block, index, other);
          if (distance <= grid.reachA) {
            visit(other, distance);
          }
        }
      }
    }
  }
}
