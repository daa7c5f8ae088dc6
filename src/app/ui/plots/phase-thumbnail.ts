import { colourIndex, colourMap } from './colour-maps';

/** Phases at positions, in the order of a lattice. */
export interface PhaseThumbnail {
  readonly xM: ArrayLike<number>;
  readonly yM: ArrayLike<number>;
  readonly phaseDeg: ArrayLike<number>;
  readonly stepXM: number;
  readonly stepYM: number;
}

const SCALE = { map: 'cyclic', from: -180, to: 180 } as const;

/** Draws every cell as a tile, the longer side filling the square of `side` CSS pixels. The cyclic map is the same in both themes. */
export function paintPhaseThumbnail(canvas: HTMLCanvasElement, thumbnail: PhaseThumbnail, side: number): void {
  const pixels = Math.round(side * (window.devicePixelRatio || 1));
  canvas.width = pixels;
  canvas.height = pixels;
  const context = canvas.getContext('2d');
  if (context === null || thumbnail.phaseDeg.length === 0) return;
  const { xM, yM, phaseDeg, stepXM, stepYM } = thumbnail;
  const [left, right] = rangeOf(xM, stepXM);
  const [bottom, top] = rangeOf(yM, stepYM);
  const scale = pixels / Math.max(right - left, top - bottom);
  const offsetX = (pixels - (right - left) * scale) / 2;
  const offsetY = (pixels - (top - bottom) * scale) / 2;
  const map = colourMap('cyclic', 'light');
  const image = context.createImageData(pixels, pixels);
  const words = new Uint32Array(image.data.buffer);
  for (let n = 0; n < phaseDeg.length; n++) {
    const word = map.words[colourIndex(SCALE, phaseDeg[n])];
    const fromX = pixelEdge(offsetX + (xM[n] - stepXM / 2 - left) * scale);
    const toX = Math.max(fromX + 1, pixelEdge(offsetX + (xM[n] + stepXM / 2 - left) * scale));
    const fromY = pixelEdge(offsetY + (top - yM[n] - stepYM / 2) * scale);
    const toY = Math.max(fromY + 1, pixelEdge(offsetY + (top - yM[n] + stepYM / 2) * scale));
    for (let y = Math.max(0, fromY); y < Math.min(pixels, toY); y++) words.fill(word, y * pixels + Math.max(0, fromX), y * pixels + Math.min(pixels, toX));
  }
  context.putImageData(image, 0, 0);
}

/** The common edge of two tiles is computed twice: the slack keeps rounding from leaving a seam at half pixels. */
const pixelEdge = (position: number): number => Math.round(position + 1e-6);

function rangeOf(values: ArrayLike<number>, step: number): [number, number] {
  let [low, high] = [Infinity, -Infinity];
  for (let n = 0; n < values.length; n++) {
    low = Math.min(low, values[n]);
    high = Math.max(high, values[n]);
  }
  return [low - step / 2, high + step / 2];
}
