import { useCallback, type JSX } from 'react';
import { PlaneGeometry } from 'three';

import { createGroundMaterial, type SceneUniforms } from './materials.ts';
import { useDisposable } from './use-disposable.ts';

/** The paper behind everything. The processor renderer lays its own, the same. */
export function Ground({ uniforms }: { uniforms: SceneUniforms }): JSX.Element {
  const geometry = useDisposable(useCallback(() => new PlaneGeometry(2, 2), []));
  const material = useDisposable(useCallback(() => createGroundMaterial(uniforms), [uniforms]));
  return <mesh name="ground" renderOrder={-1} frustumCulled={false} {...{ geometry, material }} />;
}
