import { useThree } from '@react-three/fiber';
import { useEffect, useLayoutEffect, useMemo, type JSX } from 'react';

import type { RibbonBatch } from '../model/drawing.ts';
import type { SolidModel } from '../model/scene-model.ts';
import { Ground } from './ground.tsx';
import { createUniforms } from './materials.ts';
import { displayColour } from './geometries.ts';
import { Ribbons } from './ribbons.tsx';
import { Spheres, Struts } from './solids.tsx';
import { ViewRig, type ViewRigProps } from './view-rig.tsx';

export interface LatticePartsProps extends Omit<ViewRigProps, 'uniforms' | 'bounds'> {
  solids: SolidModel;
  edges: readonly RibbonBatch[];
  litPairs: RibbonBatch | null;
  palette: readonly string[];
  paper: string;
  foot: string;
}

/** Everything inside the canvas; the same graph for both renderers. */
export function LatticeParts(props: LatticePartsProps): JSX.Element {
  const { solids, edges, litPairs, palette, paper, foot } = props;
  const invalidate = useThree((state) => state.invalidate);
  const uniforms = useMemo(() => createUniforms(), []);
  useLayoutEffect(() => {
    uniforms.uPaper.value.copy(displayColour(paper));
    uniforms.uFoot.value.copy(displayColour(foot));
  }, [uniforms, paper, foot]);
  useEffect(() => invalidate(), [invalidate, solids, edges, litPairs, palette, paper, foot]);
  return (
    <>
      <ViewRig
        store={props.store}
        frames={props.frames}
        bounds={solids.bounds}
        inks={props.inks}
        uniforms={uniforms}
        onFrameDrawn={props.onFrameDrawn}
      />
      <Ground uniforms={uniforms} />
      <Spheres batch={solids.spheres} palette={palette} uniforms={uniforms} />
      <Struts batch={solids.struts} palette={palette} uniforms={uniforms} />
      {edges.map((batch, index) => (
        <Ribbons key={index} name={`edges-${index}`} batch={batch} uniforms={uniforms} />
      ))}
      {litPairs !== null && litPairs.count > 0 && (
        <Ribbons name="lit-pairs" batch={litPairs} uniforms={uniforms} />
      )}
    </>
  );
}
