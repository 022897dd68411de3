import { useCallback, useMemo, type JSX } from 'react';

import type { SphereBatch, StrutBatch } from '../model/drawing.ts';
import type { DrawnBatch } from '../raster/cpu-renderer.ts';
import { sphereGeometry, strutGeometry } from './geometries.ts';
import { createSphereMaterial, createStrutMaterial, type SceneUniforms } from './materials.ts';
import { useDisposable } from './use-disposable.ts';

interface SpheresProps {
  batch: SphereBatch;
  palette: readonly string[];
  uniforms: SceneUniforms;
}

/** The ions. */
export function Spheres({ batch, palette, uniforms }: SpheresProps): JSX.Element {
  const geometry = useDisposable(
    useCallback(() => sphereGeometry(batch, palette), [batch, palette]),
  );
  const material = useDisposable(useCallback(() => createSphereMaterial(uniforms), [uniforms]));
  const userData = useMemo(
    () => ({ drawn: { kind: 'spheres', batch } satisfies DrawnBatch }),
    [batch],
  );
  return <mesh name="ions" frustumCulled={false} {...{ geometry, material, userData }} />;
}

interface StrutsProps {
  batch: StrutBatch;
  palette: readonly string[];
  uniforms: SceneUniforms;
}

/** Struts between ions in contact. */
export function Struts({ batch, palette, uniforms }: StrutsProps): JSX.Element {
  const geometry = useDisposable(
    useCallback(() => strutGeometry(batch, palette), [batch, palette]),
  );
  const { radiusA } = batch;
  const material = useDisposable(
    useCallback(() => createStrutMaterial(uniforms, radiusA), [uniforms, radiusA]),
  );
  const userData = useMemo(
    () => ({ drawn: { kind: 'struts', batch } satisfies DrawnBatch }),
    [batch],
  );
  return <mesh name="struts" frustumCulled={false} {...{ geometry, material, userData }} />;
}
