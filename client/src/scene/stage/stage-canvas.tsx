import { Canvas, type CanvasProps } from '@react-three/fiber';
import { useCallback, useState, type JSX } from 'react';
import type { WebGLRenderer } from 'three';

import { LatticeParts, type LatticePartsProps } from '../parts/lattice-parts.tsx';
import { CpuRenderer } from '../raster/cpu-renderer.ts';
import type { RendererKind } from './detect-renderer.ts';

interface StageCanvasProps extends LatticePartsProps {
  kind: RendererKind;
  /** WebGL gave up: the processor takes over. */
  onContextLost: () => void;
}

const dpr: [number, number] = [1, 2];
const glSettings = { antialias: true, alpha: false, powerPreference: 'default' } as const;

/** R3F wants three's renderer; ours offers the part of it that R3F uses. */
const createCpuRenderer = ({ canvas }: { canvas: HTMLCanvasElement | OffscreenCanvas }) =>
  new CpuRenderer({ canvas }) as unknown as WebGLRenderer;

/** The canvas, drawn by the graphics processor or by the ordinary one. */
export function StageCanvas({ kind, onContextLost, ...parts }: StageCanvasProps): JSX.Element {
  const [events] = useState<CanvasProps['events']>(() => undefined);
  const onCreated = useCallback<NonNullable<CanvasProps['onCreated']>>(
    ({ gl }) => {
      const canvas = gl.domElement;
      canvas.addEventListener('webglcontextlost', (event) => {
        // R3F loses the context itself when it takes a canvas down; that one has left the page.
        if (canvas.isConnected) {
          event.preventDefault();
          onContextLost();
        }
      });
    },
    [onContextLost],
  );
  return (
    <Canvas
      key={kind}
      aria-hidden
      flat
      linear
      frameloop="demand"
      dpr={dpr}
      gl={kind === 'cpu' ? (createCpuRenderer as CanvasProps['gl']) : glSettings}
      events={events}
      onCreated={onCreated}
      resize={{ debounce: 0, scroll: false }}
      style={{ position: 'absolute', inset: 0, pointerEvents: 'none' }}
    >
      <LatticeParts {...parts} />
    </Canvas>
  );
}
