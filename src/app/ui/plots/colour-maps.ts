import { CYCLIC_COLOURS, DIVERGING_COLOURS, DIVERGING_DARK_COLOURS, SEQUENTIAL_COLOURS } from './colour-map-data';

export type ColourMapName = 'cyclic' | 'sequential' | 'diverging';
export type ThemeName = 'light' | 'dark';

/** 256 colours. */
export interface ColourMap {
  readonly name: ColourMapName;
  /** Red, green, blue of each colour. */
  readonly rgb: Uint8Array;
  /** The same as one little-endian RGBA word each, for image data. */
  readonly words: Uint32Array;
}

/** How values become colours: the map and the values at its two ends. */
export interface ColourScale {
  readonly map: ColourMapName;
  readonly from: number;
  readonly to: number;
}

const COUNT = 256;

function mapOf(name: ColourMapName, digits: string, reversed = false): ColourMap {
  const rgb = new Uint8Array(3 * COUNT);
  const words = new Uint32Array(COUNT);
  for (let i = 0; i < COUNT; i++) {
    const source = reversed ? COUNT - 1 - i : i;
    const value = Number.parseInt(digits.slice(6 * source, 6 * source + 6), 16);
    rgb.set([value >> 16, (value >> 8) & 255, value & 255], 3 * i);
    words[i] = ((255 << 24) | ((value & 255) << 16) | (value & 0xff00) | (value >> 16)) >>> 0;
  }
  return { name, rgb, words };
}

const MAPS: Readonly<Record<ThemeName, Readonly<Record<ColourMapName, ColourMap>>>> = {
  light: {
    cyclic: mapOf('cyclic', CYCLIC_COLOURS),
    // The floor of a magnitude is the paper itself, so the light theme reads the map backwards.
    sequential: mapOf('sequential', SEQUENTIAL_COLOURS, true),
    diverging: mapOf('diverging', DIVERGING_COLOURS),
  },
  dark: {
    cyclic: mapOf('cyclic', CYCLIC_COLOURS),
    sequential: mapOf('sequential', SEQUENTIAL_COLOURS),
    diverging: mapOf('diverging', DIVERGING_DARK_COLOURS),
  },
};

export function colourMap(name: ColourMapName, theme: ThemeName): ColourMap {
  return MAPS[theme][name];
}

/** Which of the 256 colours stands for a value. A cyclic scale wraps; the others clip at their ends. */
export function colourIndex(scale: ColourScale, value: number): number {
  const place = (value - scale.from) / (scale.to - scale.from);
  if (scale.map === 'cyclic') return Math.floor((place - Math.floor(place)) * COUNT) & 255;
  if (!(place > 0)) return 0;
  return place >= 1 ? COUNT - 1 : Math.round(place * (COUNT - 1));
}

/** A colour of a map as CSS. */
export function cssColour(map: ColourMap, index: number): string {
  const at = 3 * index;
  return `rgb(${map.rgb[at]},${map.rgb[at + 1]},${map.rgb[at + 2]})`;
}

/** The dark of copper on a coloured tile: the tile's colour at 42 % over ink, so form shows and hue stays. */
export function shapeColour(map: ColourMap, index: number): string {
  const ink = [20, 25, 29];
  const mixed = ink.map((part, i) => Math.round(map.rgb[3 * index + i] * 0.42 + part * 0.58));
  return `rgb(${mixed.join(',')})`;
}
