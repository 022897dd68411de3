import { Vector2, type Camera, type Object3D, type PerspectiveCamera, type Scene } from 'three';

import type { RibbonBatch, SphereBatch, StrutBatch } from '../model/drawing.ts';
import { createBuffer, type RasterBuffer } from './raster-buffer.ts';
import { Rasteriser, type RasterCamera, type RasterScene } from './raster-frame.ts';

/** What an object of the scene graph shows; both renderers draw from it. */
export type DrawnBatch =
  | { readonly kind: 'spheres'; readonly batch: SphereBatch }
  | { readonly kind: 'struts'; readonly batch: StrutBatch }
  | { readonly kind: 'ribbons'; readonly batch: RibbonBatch };

/** Colours and fading of the whole scene, kept on `scene.userData`. */
export interface SceneInks {
  readonly palette: readonly string[];
  readonly paper: string;
  readonly foot: string;
  readonly nearA: number;
  readonly farA: number;
}

interface CpuRendererOptions {
  readonly canvas: HTMLCanvasElement | OffscreenCanvas;
}

function drawnBatch(object: Object3D): DrawnBatch | undefined {
  return (object.userData as { drawn?: DrawnBatch }).drawn;
}

/** Gathers what the visible objects of a scene graph show. */
function readScene(scene: Object3D, inks: SceneInks): RasterScene {
  const spheres: SphereBatch[] = [];
  const struts: StrutBatch[] = [];
  const ribbons: RibbonBatch[] = [];
  scene.traverseVisible((object) => {
    const drawn = drawnBatch(object);
    switch (drawn?.kind) {
      case 'spheres':
        spheres.push(drawn.batch);
        break;
      case 'struts':
        struts.push(drawn.batch);
        break;
      case 'ribbons':
        ribbons.push(drawn.batch);
        break;
      case undefined:
        break;
    }
  });
  return { spheres, struts, ribbons, ...inks };
}

/**
 * Stands in for three's renderer where there is no graphics processor: offers what React Three
 * Fiber asks of one, and draws into a 2D canvas.
 */
export class CpuRenderer {
  readonly domElement: HTMLCanvasElement;
  readonly isCpuRenderer = true;
  readonly info = { render: { frame: 0, calls: 0, triangles: 0 }, memory: {} };
  readonly xr = {
    enabled: false,
    isPresenting: false,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
    setAnimationLoop: () => undefined,
  };
  readonly shadowMap = { enabled: false, type: 0, autoUpdate: false, needsUpdate: false };
  readonly renderLists = { dispose: () => undefined };
  readonly capabilities = { isWebGL2: false };
  outputColorSpace = 'srgb';
  toneMapping = 0;
  private readonly context: CanvasRenderingContext2D;
  private readonly rasteriser = new Rasteriser();
  private readonly size = new Vector2(300, 150);
  private pixelRatio = 1;
  private image: ImageData | null = null;
  private buffer: RasterBuffer | null = null;

  constructor({ canvas }: CpuRendererOptions) {
    // R3F hands over the canvas element of the page.
    this.domElement = canvas as HTMLCanvasElement;
    const context = this.domElement.getContext('2d', { alpha: false });
    if (context === null) {
      throw new Error('This browser gives no 2D canvas; the lattice cannot be drawn.');
    }
    this.context = context;
  }

  setPixelRatio(ratio: number): void {
    this.pixelRatio = ratio;
    this.fit();
  }

  getPixelRatio(): number {
    return this.pixelRatio;
  }

  setSize(width: number, height: number, updateStyle = true): void {
    this.size.set(width, height);
    if (updateStyle) {
      this.domElement.style.width = `${width}px`;
      this.domElement.style.height = `${height}px`;
    }
    this.fit();
  }

  getSize(target: Vector2): Vector2 {
    return target.copy(this.size);
  }

  getDrawingBufferSize(target: Vector2): Vector2 {
    return target.copy(this.size).multiplyScalar(this.pixelRatio).floor();
  }

  private fit(): void {
    const { x: width, y: height } = this.getDrawingBufferSize(new Vector2());
    if (this.domElement.width !== width || this.domElement.height !== height) {
      this.domElement.width = width;
      this.domElement.height = height;
      this.image = null;
      this.buffer = null;
    }
  }

  private ready(): { image: ImageData; buffer: RasterBuffer } | null {
    const { width, height } = this.domElement;
    if (width === 0 || height === 0) {
      return null;
    }
    this.image ??= this.context.createImageData(width, height);
    this.buffer ??= createBuffer(width, height, this.image.data.buffer);
    return { image: this.image, buffer: this.buffer };
  }

  render(scene: Scene, camera: Camera): void {
    const inks = (scene.userData as { inks?: SceneInks }).inks;
    const target = this.ready();
    if (target === null || inks === undefined) {
      return;
    }
    scene.updateMatrixWorld();
    if (camera.parent === null) {
      camera.updateMatrixWorld();
    }
    const eye = readCamera(camera as PerspectiveCamera, target.buffer.height, {
      ...inks,
      pixelRatio: this.pixelRatio,
    });
    this.rasteriser.draw(target.buffer, readScene(scene, inks), eye);
    this.context.putImageData(target.image, 0, 0);
    this.info.render.frame += 1;
  }

  clear(): void {
    this.context.clearRect(0, 0, this.domElement.width, this.domElement.height);
  }

  dispose(): void {
    this.image = null;
    this.buffer = null;
  }

  forceContextLoss(): void {
    this.dispose();
  }
}

function readCamera(
  camera: PerspectiveCamera,
  height: number,
  { nearA, farA, pixelRatio }: { nearA: number; farA: number; pixelRatio: number },
): RasterCamera {
  const focalPx = height / 2 / Math.tan((camera.fov * Math.PI) / 360);
  return { view: camera.matrixWorldInverse.elements, focalPx, nearA, farA, pixelRatio };
}
