import { create } from '@react-three/test-renderer';
import type { InstancedBufferGeometry, Mesh } from 'three';
import { describe, expect, it, vi } from 'vitest';

import { stageInks } from '../model/colours.ts';
import { buildBlockModel, buildEdges, buildSolids, paletteOf } from '../model/scene-model.ts';
import { defaultSceneView } from '../model/scene-view.ts';
import { periclase, periclaseRadiusA } from '../model/test-cells.ts';
import { StageFrames } from '../stage/frames.ts';
import { ViewStore } from '../stage/view-store.ts';
import { LatticeParts } from './lattice-parts.tsx';

vi.stubGlobal('IS_REACT_ACT_ENVIRONMENT', true);
const model = buildBlockModel(periclase, [1, 1, 1], periclaseRadiusA);
const solids = buildSolids(model, 0.55, false);
const palette = paletteOf(model, 'light');
const { paper, foot } = stageInks.light;

describe('the scene graph', () => {
  it('holds one instance per ion and strut, and hands both renderers the same batches', async () => {
    const store = new ViewStore(defaultSceneView);
    const frames = new StageFrames();
    const published = vi.spyOn(frames, 'publish');
    const renderer = await create(
      <LatticeParts
        store={store}
        frames={frames}
        inks={{ palette, paper, foot }}
        onFrameDrawn={() => undefined}
        solids={solids}
        edges={buildEdges(model, 0.55, 'light')}
        litPairs={null}
        palette={palette}
        paper={paper}
        foot={foot}
      />,
    );
    const mesh = (name: string): Mesh =>
      renderer.scene.findByProps({ name }).instance as unknown as Mesh;
    const instances = (name: string): number =>
      (mesh(name).geometry as InstancedBufferGeometry).instanceCount;
    expect(instances('ions')).toBe(27);
    expect(instances('struts')).toBe(54);
    expect(instances('edges-0')).toBe(24);
    expect(mesh('ions').userData).toEqual({ drawn: { kind: 'spheres', batch: solids.spheres } });
    await renderer.advanceFrames(1, 16);
    expect(published).toHaveBeenCalled();
    await renderer.unmount();
  });
});
