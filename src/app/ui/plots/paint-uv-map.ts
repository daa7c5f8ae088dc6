import { colourIndex, colourMap } from './colour-maps';
import type { ColourScale, ThemeName } from './colour-maps';
import type { UvLevels } from './uv-geometry';

/** The colours of the visible disc as an image of `pixels` squared; clear outside. Levels are linear in dB between samples. */
export function uvImageWords({ size, levelDb }: UvLevels, scale: ColourScale, theme: ThemeName, pixels: number): Uint32Array {
  const map = colourMap(scale.map, theme);
  const words = new Uint32Array(pixels * pixels);
  for (let y = 0; y < pixels; y++) {
    const v = 1 - ((y + 0.5) / pixels) * 2;
    const row = ((v + 1) / 2) * (size - 1);
    const r = Math.min(size - 2, Math.floor(row));
    const dr = row - r;
    for (let x = 0; x < pixels; x++) {
      const u = ((x + 0.5) / pixels) * 2 - 1;
      if (u * u + v * v > 1) continue;
      const column = ((u + 1) / 2) * (size - 1);
      const c = Math.min(size - 2, Math.floor(column));
      const dc = column - c;
      const at = r * size + c;
      const level = (levelDb[at] * (1 - dc) + levelDb[at + 1] * dc) * (1 - dr) + (levelDb[at + size] * (1 - dc) + levelDb[at + size + 1] * dc) * dr;
      words[y * pixels + x] = map.words[colourIndex(scale, level)];
    }
  }
  return words;
}

/** Fills a canvas with the disc; does nothing where the browser gives no drawing surface. */
export function paintUvMap(canvas: HTMLCanvasElement, levels: UvLevels, scale: ColourScale, look: { readonly theme: ThemeName; readonly pixels: number }): void {
  canvas.width = look.pixels;
  canvas.height = look.pixels;
  const context = canvas.getContext('2d');
  if (!context) return;
  const image = context.createImageData(look.pixels, look.pixels);
  new Uint32Array(image.data.buffer).set(uvImageWords(levels, scale, look.theme, look.pixels));
  context.putImageData(image, 0, 0);
}
