import { mix, parseHex, type Rgb } from '../model/colours.ts';
import type { RibbonBatch, SphereBatch, StrutBatch } from '../model/drawing.ts';
import { fadeAt, groundAt } from '../model/light.ts';
import { clearBuffer, pack, type RasterBuffer } from './raster-buffer.ts';
import { dotSpacing, drawRibbon, type ScreenRibbon } from './raster-ribbon.ts';
import { drawBall, drawHalo, drawMark, type ScreenBall } from './raster-sphere.ts';
import { drawStrut, type ScreenStrut } from './raster-strut.ts';
import { StrutTables, type StrutEnds } from './raster-strut-tables.ts';
import { buildPalette, fadeSteps } from './raster-tones.ts';

/** Everything a picture shows. */
export interface RasterScene {
  readonly spheres: readonly SphereBatch[];
  readonly struts: readonly StrutBatch[];
  readonly ribbons: readonly RibbonBatch[];
  /** Colours that the batches index, `#RRGGBB`. */
  readonly palette: readonly string[];
  readonly paper: string;
  /** Colour at the foot of the ground. */
  readonly foot: string;
}

/** The eye: where places land and how depth fades. */
export interface RasterCamera {
  /** World to view, column-major 4 × 4; the viewer looks along −z. */
  readonly view: ArrayLike<number>;
  readonly focalPx: number;
  readonly nearA: number;
  readonly farA: number;
  /** Device pixels per CSS pixel: line widths are given in the latter. */
  readonly pixelRatio: number;
}

const unknownColour: Rgb = [128, 128, 128];
/** Contact shading costs about as much as the balls; large blocks do without. */
const haloBallLimit = 1_200;
const depthBins = 2048;

/** Draws frames into a buffer; keeps palettes and scratch arrays between them. */
export class Rasteriser {
  private palettes = new Map<number, Uint32Array>();
  private readonly strutTables = new StrutTables();
  private readonly ends: StrutEnds = {
    firstColour: 0,
    lastColour: 0,
    one: unknownColour,
    other: unknownColour,
    paper: unknownColour,
    fade0: 0,
    fade1: 0,
  };
  private inkKey = '';
  private colours: Rgb[] = [];
  private paper: Rgb = [255, 255, 255];
  private ground: Uint32Array = new Uint32Array(0);
  private order = new Uint32Array(0);
  private bins = new Uint16Array(0);
  private view = new Float64Array(12);
  private readonly starts = new Uint32Array(depthBins + 1);
  private readonly place = new Float64Array(3);
  private readonly ball: ScreenBall = { x: 0, y: 0, radiusPx: 0, depthA: 0, radiusA: 0 };
  private readonly strut: ScreenStrut = {
    x0: 0,
    y0: 0,
    depth0A: 0,
    x1: 0,
    y1: 0,
    depth1A: 0,
    radiusA: 0,
    ax: 0,
    ay: 0,
    az: 0,
    focalPx: 0,
  };
  private readonly ribbon: ScreenRibbon = {
    x0: 0,
    y0: 0,
    depth0A: 0,
    x1: 0,
    y1: 0,
    depth1A: 0,
    fade0: 0,
    fade1: 0,
  };

  draw(buffer: RasterBuffer, scene: RasterScene, camera: RasterCamera): void {
    this.readInks(buffer, scene);
    this.readView(camera);
    clearBuffer(buffer, this.ground);
    this.drawSolids(buffer, scene, camera);
    for (const batch of scene.ribbons) {
      this.drawRibbons(buffer, batch, camera);
    }
  }

  private readInks(buffer: RasterBuffer, scene: RasterScene): void {
    const key = [scene.paper, scene.foot, buffer.width, buffer.height, ...scene.palette].join();
    if (key === this.inkKey) {
      return;
    }
    this.inkKey = key;
    this.palettes.clear();
    this.strutTables.clear();
    this.colours = scene.palette.map(parseHex);
    this.paper = parseHex(scene.paper);
    this.ground = groundPixels(this.paper, parseHex(scene.foot), buffer.width, buffer.height);
  }

  private readView({ view }: RasterCamera): void {
    for (let row = 0; row < 3; row += 1) {
      for (let column = 0; column < 4; column += 1) {
        this.view[row * 4 + column] = view[column * 4 + row] ?? 0;
      }
    }
  }

  /** Place in the viewer's frame: x right, y up, and z as the distance in front of the eye. */
  private toView(points: Float32Array, at: number): Float64Array {
    const m = this.view;
    const [x, y, z] = [points[at]!, points[at + 1]!, points[at + 2]!];
    this.place[0] = m[0]! * x + m[1]! * y + m[2]! * z + m[3]!;
    this.place[1] = m[4]! * x + m[5]! * y + m[6]! * z + m[7]!;
    this.place[2] = -(m[8]! * x + m[9]! * y + m[10]! * z + m[11]!);
    return this.place;
  }

  private palette(colour: number, fade: number): Uint32Array {
    const step = Math.round(fade * fadeSteps);
    const key = colour * (fadeSteps + 1) + step;
    let palette = this.palettes.get(key);
    if (palette === undefined) {
      const body = this.colours[colour] ?? unknownColour;
      palette = buildPalette(body, this.paper, step / fadeSteps);
      this.palettes.set(key, palette);
    }
    return palette;
  }

  /** Far to near by a counting sort of depths, balls and struts together. */
  private drawSolids(buffer: RasterBuffer, scene: RasterScene, camera: RasterCamera): void {
    const solids = [
      ...scene.spheres.map((batch) => ({ kind: 'spheres' as const, batch })),
      ...scene.struts.map((batch) => ({ kind: 'struts' as const, batch })),
    ];
    const total = solids.reduce((sum, { batch }) => sum + batch.count, 0);
    const ballCount = scene.spheres.reduce((sum, { count }) => sum + count, 0);
    this.sortByDepth(solids, total, camera);
    const withHalo = ballCount <= haloBallLimit;
    for (let at = 0; at < total; at += 1) {
      let index = this.order[at]!;
      let which = 0;
      while (index >= solids[which]!.batch.count) {
        index -= solids[which]!.batch.count;
        which += 1;
      }
      const solid = solids[which]!;
      if (solid.kind === 'spheres') {
        this.drawSphere(buffer, solid.batch, index, camera, withHalo);
      } else {
        this.drawStrutOf(buffer, solid.batch, index, camera);
      }
    }
  }

  private sortByDepth(
    solids: readonly (
      { kind: 'spheres'; batch: SphereBatch } | { kind: 'struts'; batch: StrutBatch }
    )[],
    total: number,
    camera: RasterCamera,
  ): void {
    if (this.order.length < total) {
      this.order = new Uint32Array(total);
      this.bins = new Uint16Array(total);
    }
    this.starts.fill(0);
    const scale = (depthBins - 1) / (camera.farA - camera.nearA || 1);
    let item = 0;
    for (const { kind, batch } of solids) {
      for (let index = 0; index < batch.count; index += 1) {
        const depth =
          kind === 'spheres'
            ? this.toView(batch.centresA, index * 3)[2]!
            : (this.toView(batch.endsA, index * 6)[2]! +
                this.toView(batch.endsA, index * 6 + 3)[2]!) /
              2;
        const bin = Math.max(0, Math.min(depthBins - 1, ((camera.farA - depth) * scale) | 0));
        this.bins[item] = bin;
        this.starts[bin + 1]! += 1;
        item += 1;
      }
    }
    for (let bin = 0; bin < depthBins; bin += 1) {
      this.starts[bin + 1]! += this.starts[bin]!;
    }
    for (let at = 0; at < total; at += 1) {
      const bin = this.bins[at]!;
      this.order[this.starts[bin]!] = at;
      this.starts[bin]! += 1;
    }
  }

  private drawSphere(
    buffer: RasterBuffer,
    batch: SphereBatch,
    index: number,
    camera: RasterCamera,
    withHalo: boolean,
  ): void {
    const place = this.toView(batch.centresA, index * 3);
    const radiusA = batch.radiiA[index]!;
    const depthA = place[2]!;
    if (depthA <= radiusA) {
      return;
    }
    const { ball } = this;
    ball.x = buffer.width / 2 + (place[0]! * camera.focalPx) / depthA;
    ball.y = buffer.height / 2 - (place[1]! * camera.focalPx) / depthA;
    ball.radiusPx = (camera.focalPx * radiusA) / Math.sqrt(depthA * depthA - radiusA * radiusA);
    ball.depthA = depthA;
    ball.radiusA = radiusA;
    const fade = fadeAt(depthA, camera.nearA, camera.farA);
    if (withHalo && ball.radiusPx > 3) {
      drawHalo(buffer, ball);
    }
    drawBall(buffer, ball, this.palette(batch.colours[index]!, fade));
    if (batch.signs[index] !== 0) {
      drawMark(buffer, ball, batch.signs[index]!, markColour, fade * 0.7);
    }
  }

  private drawStrutOf(
    buffer: RasterBuffer,
    batch: StrutBatch,
    index: number,
    camera: RasterCamera,
  ): void {
    const { strut } = this;
    const one = this.toView(batch.endsA, index * 6);
    const [ax, ay, depth0] = [one[0]!, one[1]!, one[2]!];
    const other = this.toView(batch.endsA, index * 6 + 3);
    const [bx, by, depth1] = [other[0]!, other[1]!, other[2]!];
    if (depth0 <= 0 || depth1 <= 0) {
      return;
    }
    const length = lengthOf(bx - ax, by - ay, depth1 - depth0);
    strut.x0 = buffer.width / 2 + (ax * camera.focalPx) / depth0;
    strut.y0 = buffer.height / 2 - (ay * camera.focalPx) / depth0;
    strut.x1 = buffer.width / 2 + (bx * camera.focalPx) / depth1;
    strut.y1 = buffer.height / 2 - (by * camera.focalPx) / depth1;
    strut.depth0A = depth0;
    strut.depth1A = depth1;
    strut.radiusA = batch.radiusA;
    strut.ax = (bx - ax) / length;
    strut.ay = (by - ay) / length;
    strut.az = (depth0 - depth1) / length;
    strut.focalPx = camera.focalPx;
    const { ends } = this;
    ends.firstColour = batch.colours[index * 2]!;
    ends.lastColour = batch.colours[index * 2 + 1]!;
    ends.one = this.colours[ends.firstColour] ?? unknownColour;
    ends.other = this.colours[ends.lastColour] ?? unknownColour;
    ends.paper = this.paper;
    ends.fade0 = fadeAt(depth0, camera.nearA, camera.farA);
    ends.fade1 = fadeAt(depth1, camera.nearA, camera.farA);
    drawStrut(buffer, strut, ends, this.strutTables);
  }

  private drawRibbons(buffer: RasterBuffer, batch: RibbonBatch, camera: RasterCamera): void {
    const widthPx = batch.widthPx * camera.pixelRatio;
    const style = {
      widthPx,
      colour: pack(...batch.colour),
      opacity: batch.opacity,
      hiddenOpacity: batch.hiddenOpacity,
      dotSpacingPx: batch.isDotted ? widthPx * dotSpacing : 0,
      biasA: batch.biasA,
    };
    const { ribbon } = this;
    for (let index = 0; index < batch.count; index += 1) {
      const one = this.toView(batch.endsA, index * 6);
      ribbon.depth0A = one[2]!;
      ribbon.x0 = buffer.width / 2 + (one[0]! * camera.focalPx) / one[2]!;
      ribbon.y0 = buffer.height / 2 - (one[1]! * camera.focalPx) / one[2]!;
      const other = this.toView(batch.endsA, index * 6 + 3);
      ribbon.depth1A = other[2]!;
      ribbon.x1 = buffer.width / 2 + (other[0]! * camera.focalPx) / other[2]!;
      ribbon.y1 = buffer.height / 2 - (other[1]! * camera.focalPx) / other[2]!;
      ribbon.fade0 = fadeAt(ribbon.depth0A, camera.nearA, camera.farA);
      ribbon.fade1 = fadeAt(ribbon.depth1A, camera.nearA, camera.farA);
      if (ribbon.depth0A > 0 && ribbon.depth1A > 0) {
        drawRibbon(buffer, ribbon, style);
      }
    }
  }
}

/** Math.hypot is many times slower and guards against what lengths in Å never reach. */
function lengthOf(x: number, y: number, z: number): number {
  return Math.sqrt(x * x + y * y + z * z) || 1;
}

/** Raised marks are nearly white in both themes: they stand on coloured balls. */
const markColour = pack(252, 251, 247);

/** The paper, with a pool of the ground's colour under the block. */
function groundPixels(paper: Rgb, foot: Rgb, width: number, height: number): Uint32Array {
  const pixels = new Uint32Array(width * height).fill(pack(...paper));
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const share = groundAt((x + 0.5) / width, (y + 0.5) / height);
      if (share > 0) {
        pixels[y * width + x] = pack(...mix(paper, foot, share));
      }
    }
  }
  return pixels;
}
