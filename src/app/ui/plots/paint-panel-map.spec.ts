import { PlaceIndex } from './map-places';
import { viewOf } from './map-view';
import { TileSheets, paintPanelMap } from './paint-panel-map';
import type { MapPicture } from './paint-panel-map';
import { tileRaster } from './tile-raster';

/** jsdom draws nothing; this surface keeps what was asked of it. */
function recordingContext(): { context: CanvasRenderingContext2D; calls: string[] } {
  const calls: string[] = [];
  const keep = (name: string) => (...args: unknown[]) => calls.push([name, ...args.filter((arg) => typeof arg === 'number').map((arg) => Math.round((arg as number) * 100) / 100)].join(' '));
  const context = {
    clearRect: keep('clear'), beginPath: keep('begin'), moveTo: keep('move'), lineTo: keep('line'), stroke: keep('hatch'), drawImage: keep('image'), fillRect: keep('fill'), strokeRect: keep('stroke'), putImageData: keep('put'),
    createImageData: (width: number, height: number) => ({ data: new Uint8ClampedArray(4 * width * height) }),
  };
  return { context: context as unknown as CanvasRenderingContext2D, calls };
}

const places = { xMm: [-2.5, 2.5, -2.5, 2.5], yMm: [-2.5, -2.5, 2.5, 2.5], pitchXMm: 5, pitchYMm: 5 };
const index = new PlaceIndex(places);
const picture: MapPicture = {
  index,
  raster: tileRaster(places, index.extent),
  layer: { title: 'Target phase', unit: '°', digits: 1, values: [0, 90, Number.NaN, -90], scale: { map: 'cyclic', from: -180, to: 180 } },
  copperOf: () => [{ kind: 'rectangle', widthMm: 2, heightMm: 2, hole: false }],
};
const inks = { theme: 'light', substrate: 'sand', rule: 'grey' } as const;

describe('paintPanelMap', () => {
  let made: number;
  const sheets = (): TileSheets => {
    const { context } = recordingContext();
    made = 0;
    jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockImplementation(() => {
      made++;
      return context as never;
    });
    return new TileSheets(document);
  };
  afterEach(() => jest.restoreAllMocks());
  const painted = (sidePx: number, kept = sheets(), shown = picture): string[] => {
    const { context, calls } = recordingContext();
    paintPanelMap(context, viewOf(index.extent, { width: sidePx, height: sidePx }, null), shown, { inks, sheets: kept, devicePxRatio: 1 });
    return calls;
  };

  it('draws the tiles as one image over the whole panel', () => {
    expect(painted(6)).toEqual(['clear 0 0 6 6', 'image 0 0 6 6']);
  });
  it('adds copper to scale from ten pixels a cell, and leaves a cell without a value bare', () => {
    const calls = painted(20);
    expect(calls.filter((call) => call === 'fill 3 13 4 4')).toHaveLength(1);
    expect(calls).toContain('stroke 0.5 0.5 9 9');
    expect(painted(18).filter((call) => /^fill .* 3\.6 3\.6$/.test(call))).toEqual([]);
  });
  it('hatches the bare cells that the layer marks, and no other', () => {
    const hatched = (isHatched: (cell: number) => boolean): number => painted(20, sheets(), { ...picture, layer: { ...picture.layer, isHatched } }).filter((call) => call === 'hatch').length;
    expect([hatched(() => true), hatched((cell) => cell !== 2), hatched((cell) => cell === 2)]).toEqual([1, 0, 1]);
  });
  it('makes the tiles of a layer once, however often the map is moved', () => {
    const kept = sheets();
    painted(6, kept);
    painted(8, kept);
    expect(made).toBe(1);
  });
});
