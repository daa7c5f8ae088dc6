import { colourIndex, colourMap, cssColour, shapeColour } from './colour-maps';
import type { ColourMap, ColourScale, ThemeName } from './colour-maps';
import { drawCopper } from './copper-shape';
import type { CopperShape } from './copper-shape';
import type { MapExtent, MapPlaces, PlaceIndex } from './map-places';
import { screenX, screenY, visibleExtent } from './map-view';
import type { MapView } from './map-view';
import { aggregation, tileImage } from './tile-raster';
import type { TileRaster } from './tile-raster';

/** One way to colour the cells. A cell whose value is NaN stays bare. */
export interface MapLayer {
  readonly title: string;
  readonly unit: string;
  readonly digits: number;
  readonly values: ArrayLike<number>;
  readonly scale: ColourScale;
  /** Bare places of another meaning than the others, drawn hatched. */
  readonly isHatched?: (cell: number) => boolean;
}

/** What stands on a map: where its cells are, their colours, their copper. */
export interface MapPicture {
  readonly index: PlaceIndex;
  readonly raster: TileRaster;
  readonly layer: MapLayer;
  /** Copper of a cell, or null where only tiles are wanted. */
  readonly copperOf: ((cell: number) => readonly CopperShape[]) | null;
}

export interface MapInks {
  readonly theme: ThemeName;
  readonly substrate: string;
  readonly rule: string;
}

/** Below this copper only makes moire, so tiles stand alone. */
export const SMALLEST_COPPER_CELL_PX = 10;
/** Bare cells are outlined when there is room for an outline. */
const SMALLEST_OUTLINED_CELL_PX = 4;

/** The tiles of a layer at each level of joining, made when first needed. */
export class TileSheets {
  private key: readonly unknown[] = [];
  private readonly sheets = new Map<number, HTMLCanvasElement>();

  constructor(private readonly document: Document) {}

  sheetOf({ raster, layer }: MapPicture, theme: ThemeName, block: number): HTMLCanvasElement | null {
    const key = [raster, layer.values, layer.scale.map, layer.scale.from, layer.scale.to, theme];
    if (key.some((part, i) => part !== this.key[i])) {
      this.sheets.clear();
      this.key = key;
    }
    const kept = this.sheets.get(block);
    if (kept) return kept;
    const made = this.draw(raster, layer, colourMap(layer.scale.map, theme), block);
    if (made) this.sheets.set(block, made);
    return made;
  }

  private draw(raster: TileRaster, layer: MapLayer, map: ColourMap, block: number): HTMLCanvasElement | null {
    const { width, height, words } = tileImage(raster, layer.values, layer.scale, { map, block });
    const canvas = this.document.createElement('canvas');
    canvas.width = width;
    canvas.height = height;
    const context = canvas.getContext('2d');
    if (!context || width === 0 || height === 0) return null;
    const image = context.createImageData(width, height);
    new Uint32Array(image.data.buffer).set(words);
    context.putImageData(image, 0, 0);
    return canvas;
  }
}

/** Draws a map into a surface that is already scaled to CSS pixels. `devicePxRatio` chooses the level of joining. */
export function paintPanelMap(context: CanvasRenderingContext2D, view: MapView, picture: MapPicture, look: { readonly inks: MapInks; readonly sheets: TileSheets; readonly devicePxRatio: number }): void {
  const { inks, sheets, devicePxRatio } = look;
  const { extent, places } = picture.index;
  context.clearRect(0, 0, view.size.width, view.size.height);
  const [left, top] = [screenX(view, extent.fromXMm), screenY(view, extent.toYMm)];
  const block = aggregation(picture.raster, view.pxPerMm * devicePxRatio);
  const sheet = sheets.sheetOf(picture, inks.theme, block);
  if (sheet) {
    // A sheet of joined texels may reach past the panel by part of a block.
    const width = sheet.width * block * picture.raster.texelXMm * view.pxPerMm;
    const height = sheet.height * block * picture.raster.texelYMm * view.pxPerMm;
    const bottom = screenY(view, extent.fromYMm);
    context.imageSmoothingEnabled = false;
    context.drawImage(sheet, left, block === 1 ? top : bottom - height, width, height);
  }
  const cellPx = Math.min(places.pitchXMm, places.pitchYMm) * view.pxPerMm;
  if (cellPx >= SMALLEST_OUTLINED_CELL_PX) paintCells(context, view, picture, { inks, copper: cellPx >= SMALLEST_COPPER_CELL_PX });
}

function paintCells(context: CanvasRenderingContext2D, view: MapView, picture: MapPicture, how: { readonly inks: MapInks; readonly copper: boolean }): void {
  const { index, layer } = picture;
  const { places } = index;
  const map = colourMap(layer.scale.map, how.inks.theme);
  const copperOf = how.copper ? picture.copperOf : null;
  for (const cell of index.cellsWithin(grown(visibleExtent(view), places))) {
    const value = layer.values[cell];
    const xPx = screenX(view, places.xMm[cell]);
    const yPx = screenY(view, places.yMm[cell]);
    const bare = Number.isNaN(value);
    if (bare) outlineBareCell(context, { view, places, xPx, yPx }, how.inks);
    if (bare && layer.isHatched?.(cell)) hatchCell(context, { view, places, xPx, yPx }, how.inks);
    if (!copperOf) continue;
    const colour = colourIndex(layer.scale, value);
    const ground = bare ? how.inks.substrate : cssColour(map, colour);
    const copper = layer.scale.map === 'cyclic' && !bare ? shapeColour(map, colour) : how.inks.theme === 'dark' ? 'rgba(233,228,218,.55)' : 'rgba(28,39,48,.6)';
    drawCopper(context, copperOf(cell), { xPx, yPx, pxPerMm: view.pxPerMm }, { copper, ground });
  }
}

interface CellAt {
  readonly view: MapView;
  readonly places: MapPlaces;
  readonly xPx: number;
  readonly yPx: number;
}

/** Three strokes from lower left to upper right, within the outline. */
function hatchCell(context: CanvasRenderingContext2D, { view, places, xPx, yPx }: CellAt, inks: MapInks): void {
  const [w, h] = [places.pitchXMm * view.pxPerMm - 1, places.pitchYMm * view.pxPerMm - 1];
  const [left, top] = [xPx - w / 2, yPx - h / 2];
  context.strokeStyle = inks.rule;
  context.lineWidth = 1;
  context.beginPath();
  for (const [x1, y1, x2, y2] of [[0, 0.5, 0.5, 0], [0, 1, 1, 0], [0.5, 1, 1, 0.5]]) {
    context.moveTo(left + x1 * w, top + y1 * h);
    context.lineTo(left + x2 * w, top + y2 * h);
  }
  context.stroke();
}

function outlineBareCell(context: CanvasRenderingContext2D, at: CellAt, inks: MapInks): void {
  const [w, h] = [at.places.pitchXMm * at.view.pxPerMm, at.places.pitchYMm * at.view.pxPerMm];
  context.fillStyle = inks.substrate;
  context.fillRect(at.xPx - w / 2, at.yPx - h / 2, w, h);
  context.strokeStyle = inks.rule;
  context.lineWidth = 0.6;
  context.strokeRect(at.xPx - w / 2 + 0.5, at.yPx - h / 2 + 0.5, w - 1, h - 1);
}

/** A cell shows when any part of it does. */
function grown(extent: MapExtent, { pitchXMm, pitchYMm }: MapPlaces): MapExtent {
  return { fromXMm: extent.fromXMm - pitchXMm, toXMm: extent.toXMm + pitchXMm, fromYMm: extent.fromYMm - pitchYMm, toYMm: extent.toYMm + pitchYMm };
}
