import { colourIndex } from './colour-maps';
import type { ColourMap, ColourScale } from './colour-maps';
import type { MapExtent, MapPlaces } from './map-places';

/**
 * The cells of a map as a grid of texels, so that a million of them are one image. On a triangular lattice a cell is two
 * texels wide, because odd rows are moved by half a cell.
 */
export interface TileRaster {
  readonly columns: number;
  readonly rows: number;
  /** Cell of each texel, row by row from the lowest y; -1 where there is none. */
  readonly cellOf: Int32Array;
  readonly texelXMm: number;
  readonly texelYMm: number;
}

export function tileRaster(places: MapPlaces, extent: MapExtent): TileRaster {
  const { xMm, yMm, pitchXMm, pitchYMm } = places;
  const firstX = extent.fromXMm + pitchXMm / 2;
  const staggered = isStaggered(places, firstX);
  const wide = staggered ? 2 : 1;
  const texelXMm = pitchXMm / wide;
  const columns = Math.max(0, Math.round((extent.toXMm - extent.fromXMm) / texelXMm));
  const rows = Math.max(0, Math.round((extent.toYMm - extent.fromYMm) / pitchYMm));
  const cellOf = new Int32Array(columns * rows).fill(-1);
  for (let i = 0; i < xMm.length; i++) {
    const row = Math.round((yMm[i] - extent.fromYMm) / pitchYMm - 0.5);
    const column = Math.round((xMm[i] - firstX) / texelXMm);
    for (let k = 0; k < wide; k++) cellOf[row * columns + column + k] = i;
  }
  return { columns, rows, cellOf, texelXMm, texelYMm: pitchYMm };
}

function isStaggered({ xMm, pitchXMm }: MapPlaces, firstX: number): boolean {
  for (let i = 0; i < xMm.length; i++) {
    const place = (xMm[i] - firstX) / pitchXMm;
    if (Math.abs(place - Math.round(place)) > 0.25) return true;
  }
  return false;
}

/** How many texels a side share one pixel: a power of two, 1 while a texel is at least a pixel. */
export function aggregation(raster: TileRaster, devicePxPerMm: number): number {
  const smallest = Math.min(raster.texelXMm, raster.texelYMm) * devicePxPerMm;
  return smallest >= 1 ? 1 : 2 ** Math.ceil(Math.log2(1 / smallest) - 1e-9);
}

export interface TileImage {
  readonly width: number;
  readonly height: number;
  /** RGBA words, top row first. */
  readonly words: Uint32Array;
}

/**
 * The colours of the texels. Where several share one pixel it stands for their mean (of phases: of their phasors), for a
 * signed difference for the largest of them, so that a single bad cell among thousands is still seen.
 */
export function tileImage(raster: TileRaster, values: ArrayLike<number>, scale: ColourScale, options: { readonly map: ColourMap; readonly block: number }): TileImage {
  const { block, map } = options;
  const width = Math.ceil(raster.columns / block);
  const height = Math.ceil(raster.rows / block);
  const words = new Uint32Array(width * height);
  const valueOf = block === 1 ? singleValue : BLOCK_VALUE[scale.map];
  const source = { raster, values, turn: scale.to - scale.from };
  for (let y = 0; y < height; y++) {
    const toRow = (height - 1 - y) * width;
    for (let x = 0; x < width; x++) {
      const value = valueOf(source, x * block, y * block, block);
      // Where no cell is, the pixel stays clear.
      if (value === value) words[toRow + x] = map.words[colourIndex(scale, value)];
    }
  }
  return { width, height, words };
}

interface BlockSource {
  readonly raster: TileRaster;
  readonly values: ArrayLike<number>;
  /** Length of a turn in the unit of the values. */
  readonly turn: number;
}

type BlockValue = (source: BlockSource, column: number, row: number, block: number) => number;

const singleValue: BlockValue = ({ raster, values }, column, row) => {
  const cell = raster.cellOf[row * raster.columns + column];
  return cell < 0 ? Number.NaN : values[cell];
};

const BLOCK_VALUE: Readonly<Record<ColourScale['map'], BlockValue>> = {
  cyclic: (source, column, row, block) => {
    let [re, im, count] = [0, 0, 0];
    eachInBlock(source.raster, [column, row, block], (cell) => {
      const angle = (2 * Math.PI * source.values[cell]) / source.turn;
      re += Math.cos(angle);
      im += Math.sin(angle);
      count++;
    });
    return count === 0 ? Number.NaN : (Math.atan2(im, re) * source.turn) / (2 * Math.PI);
  },
  sequential: (source, column, row, block) => {
    let [sum, count] = [0, 0];
    eachInBlock(source.raster, [column, row, block], (cell) => {
      sum += source.values[cell];
      count++;
    });
    return sum / count;
  },
  diverging: (source, column, row, block) => {
    let largest = Number.NaN;
    eachInBlock(source.raster, [column, row, block], (cell) => {
      const value = source.values[cell];
      if (!(Math.abs(value) <= Math.abs(largest))) largest = value;
    });
    return largest;
  },
};

function eachInBlock(raster: TileRaster, [column, row, block]: readonly [number, number, number], visit: (cell: number) => void): void {
  const lastRow = Math.min(raster.rows, row + block);
  const lastColumn = Math.min(raster.columns, column + block);
  for (let y = row; y < lastRow; y++) {
    for (let x = column; x < lastColumn; x++) {
      const cell = raster.cellOf[y * raster.columns + x];
      if (cell >= 0) visit(cell);
    }
  }
}
