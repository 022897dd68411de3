/** The picture while it is drawn: packed colours and depths, row by row. */
export interface RasterBuffer {
  readonly width: number;
  readonly height: number;
  /** 0xAABBGGRR, as image data wants them on a little-endian machine. */
  readonly pixels: Uint32Array;
  /** Distance in front of the eye, Å; Infinity where nothing stands. */
  readonly depths: Float32Array;
}

export function createBuffer(width: number, height: number, memory?: ArrayBuffer): RasterBuffer {
  const pixels =
    memory === undefined
      ? new Uint32Array(width * height)
      : new Uint32Array(memory, 0, width * height);
  return { width, height, pixels, depths: new Float32Array(width * height) };
}

/** Fills the picture with the ground, as large as the picture, and clears the depths. */
export function clearBuffer({ pixels, depths }: RasterBuffer, ground: Uint32Array): void {
  pixels.set(ground);
  depths.fill(Infinity);
}

function byte(value: number): number {
  return value < 0 ? 0 : value > 255 ? 255 : value + 0.5;
}

export function pack(red: number, green: number, blue: number): number {
  return ((255 << 24) | (byte(blue) << 16) | (byte(green) << 8) | byte(red)) >>> 0;
}

/** Lays `source` over `target` with a share of 0 … 256. Red and blue travel together. */
export function blend(target: number, source: number, share: number): number {
  const redBlue = target & 0xff00ff;
  const green = target & 0x00ff00;
  const mixedRedBlue = (redBlue + ((((source & 0xff00ff) - redBlue) * share) >> 8)) & 0xff00ff;
  const mixedGreen = (green + ((((source & 0x00ff00) - green) * share) >> 8)) & 0x00ff00;
  return (0xff000000 | mixedRedBlue | mixedGreen) >>> 0;
}

/** Darkens a colour to `share` of 256. */
export function darken(target: number, share: number): number {
  const redBlue = (((target & 0xff00ff) * share) >>> 8) & 0xff00ff;
  const green = (((target & 0x00ff00) * share) >>> 8) & 0x00ff00;
  return (0xff000000 | redBlue | green) >>> 0;
}
