import { useCallback, useMemo, type JSX } from 'react';
import { Color } from 'three';

import type { RibbonBatch } from '../model/drawing.ts';
import type { DrawnBatch } from '../raster/cpu-renderer.ts';
import { dotSpacing } from '../raster/raster-ribbon.ts';
import { ribbonGeometry } from './geometries.ts';
import { createRibbonMaterial, type SceneUniforms } from './materials.ts';
import { useDisposable } from './use-disposable.ts';

interface RibbonsProps {
  name: string;
  batch: RibbonBatch;
  uniforms: SceneUniforms;
}

function useRibbonMaterial(
  uniforms: SceneUniforms,
  { widthPx, colour, isDotted, biasA }: RibbonBatch,
  opacity: number,
  depthTest: boolean,
) {
  const [red, green, blue] = colour;
  return useDisposable(
    useCallback(
      () =>
        createRibbonMaterial(uniforms, {
          widthPx,
          colour: new Color(red / 255, green / 255, blue / 255),
          opacity,
          spacingPx: isDotted ? widthPx * dotSpacing : 0,
          biasA,
          depthTest,
        }),
      [uniforms, widthPx, red, green, blue, opacity, isDotted, biasA, depthTest],
    ),
  );
}

/** Lines of even width: cell edges, lit pairs. Where hidden they may show through faintly. */
export function Ribbons({ name, batch, uniforms }: RibbonsProps): JSX.Element {
  const geometry = useDisposable(useCallback(() => ribbonGeometry(batch), [batch]));
  const { opacity, hiddenOpacity } = batch;
  // Laid over the faint line, the full one must come out at its own opacity.
  const rest = 1 - (1 - opacity) / (1 - hiddenOpacity);
  const front = useRibbonMaterial(uniforms, batch, rest, true);
  const through = useRibbonMaterial(uniforms, batch, hiddenOpacity, false);
  const userData = useMemo(
    () => ({ drawn: { kind: 'ribbons', batch } satisfies DrawnBatch }),
    [batch],
  );
  const shared = { geometry, frustumCulled: false };
  return (
    <>
      {hiddenOpacity > 0 && (
        <mesh name={`${name}-through`} renderOrder={2} material={through} {...shared} />
      )}
      <mesh name={name} renderOrder={3} material={front} userData={userData} {...shared} />
    </>
  );
}
