import { colourIndex, colourMap, cssColour, shapeColour } from './colour-maps';
import type { ColourMap } from './colour-maps';

type Triple = readonly [number, number, number];

/**
 * Linear-RGB matrices of full protanopia, deuteranopia and tritanopia: G. M. Machado, M. M. Oliveira, L. A. F. Fernandes,
 * "A physiologically-based model for simulation of color vision deficiency", IEEE TVCG 15(6), 2009, severity 1.0 (from memory).
 */
const VISION: Readonly<Record<string, readonly [Triple, Triple, Triple]>> = {
  normal: [[1, 0, 0], [0, 1, 0], [0, 0, 1]],
  protanopia: [[0.152286, 1.052583, -0.204868], [0.114503, 0.786281, 0.099216], [-0.003882, -0.048116, 1.051998]],
  deuteranopia: [[0.367322, 0.860646, -0.227968], [0.280085, 0.672501, 0.047413], [-0.01182, 0.04294, 0.968881]],
  tritanopia: [[1.255528, -0.076749, -0.178779], [-0.078411, 0.930809, 0.147602], [0.004733, 0.691367, 0.3039]],
};

const linear = (part: number): number => (part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4);
const cubeRoot = (t: number): number => (t > 216 / 24389 ? Math.cbrt(t) : (24389 / 27 * t + 16) / 116);
const times = (rows: readonly Triple[], by: Triple): Triple => rows.map((row) => row[0] * by[0] + row[1] * by[1] + row[2] * by[2]) as unknown as Triple;
/** sRGB primaries and the white D65 (IEC 61966-2-1). */
const XYZ: readonly Triple[] = [[0.4124564, 0.3575761, 0.1804375], [0.2126729, 0.7151522, 0.072175], [0.0193339, 0.119192, 0.9503041]];

/** CIE 1976 L*, a*, b* as seen with a kind of colour vision. */
function lab(map: ColourMap, index: number, vision = 'normal'): Triple {
  const rgb = [0, 1, 2].map((i) => linear(map.rgb[3 * index + i] / 255)) as unknown as Triple;
  const seen = times(VISION[vision], rgb).map((part) => Math.min(1, Math.max(0, part))) as unknown as Triple;
  const [x, y, z] = times(XYZ, seen);
  const [fx, fy, fz] = [cubeRoot(x / 0.95047), cubeRoot(y), cubeRoot(z / 1.08883)];
  return [116 * fy - 16, 500 * (fx - fy), 200 * (fy - fz)];
}
const deltaE = (a: Triple, b: Triple): number => Math.hypot(a[0] - b[0], a[1] - b[1], a[2] - b[2]);
const lightness = (map: ColourMap, vision?: string): number[] => Array.from({ length: 256 }, (_, i) => lab(map, i, vision)[0]);
const steps = (values: readonly number[]): number[] => values.slice(1).map((value, i) => value - values[i]);

describe('cyclic map', () => {
  const map = colourMap('cyclic', 'light');
  it('ends in the colour it starts with, to less than three units of CIE 1976', () => {
    expect(deltaE(lab(map, 0), lab(map, 255))).toBeLessThan(3);
  });
  it('has the same colour in both themes, because a phase has no floor', () => {
    expect(colourMap('cyclic', 'dark').rgb).toEqual(map.rgb);
  });
  it.each(['protanopia', 'deuteranopia', 'tritanopia'])('tells phases 45 degrees apart under %s', (vision) => {
    const least = Math.min(...Array.from({ length: 256 }, (_, i) => deltaE(lab(map, i, vision), lab(map, (i + 32) % 256, vision))));
    expect(least).toBeGreaterThan(7.5);
  });
  it('has no step that the eye sees by itself, 2.3 units being just noticeable', () => {
    const each = Array.from({ length: 256 }, (_, i) => deltaE(lab(map, i), lab(map, (i + 1) % 256)));
    expect(Math.max(...each)).toBeLessThan(2.1);
    expect(Math.min(...each)).toBeGreaterThan(0.3);
  });
});

describe('sequential map', () => {
  it('starts on the paper of its theme', () => {
    expect(deltaE(lab(colourMap('sequential', 'light'), 0), [96.2, 0.3, 3.3])).toBeLessThan(3);
    expect(lab(colourMap('sequential', 'dark'), 0)[0]).toBeLessThan(9);
  });
  it.each(['normal', 'protanopia', 'deuteranopia', 'tritanopia'])('falls steadily in lightness under %s', (vision) => {
    // Rounding to 8 bits alone can turn a step by a few hundredths of a unit.
    expect(Math.max(...steps(lightness(colourMap('sequential', 'light'), vision)))).toBeLessThan(0.1);
  });
});

describe('diverging map', () => {
  it('is lightest at zero on paper and darkest at zero in the dark theme', () => {
    const light = lightness(colourMap('diverging', 'light'));
    const dark = lightness(colourMap('diverging', 'dark'));
    expect(light.indexOf(Math.max(...light))).toBeGreaterThanOrEqual(126);
    expect(light.indexOf(Math.max(...light))).toBeLessThanOrEqual(129);
    expect(dark[127]).toBeLessThan(17);
    expect(dark[0]).toBeGreaterThan(70);
  });
  it.each(['normal', 'protanopia', 'deuteranopia', 'tritanopia'])('tells plus from minus at half scale under %s', (vision) => {
    for (const theme of ['light', 'dark'] as const) {
      const map = colourMap('diverging', theme);
      expect(deltaE(lab(map, 64, vision), lab(map, 191, vision))).toBeGreaterThan(30);
    }
  });
});

describe('colour index', () => {
  const phase = { map: 'cyclic', from: -180, to: 180 } as const;
  it('wraps a phase, so that 190 degrees has the colour of -170', () => {
    expect(colourIndex(phase, 190)).toBe(colourIndex(phase, -170));
    expect(colourIndex(phase, -180)).toBe(0);
    expect(colourIndex(phase, 0)).toBe(128);
  });
  it('clips a magnitude at its ends and puts no number on the floor', () => {
    const scale = { map: 'sequential', from: -50, to: 0 } as const;
    expect([-80, -50, -25, 0, 3, Number.NaN].map((value) => colourIndex(scale, value))).toEqual([0, 0, 128, 255, 255, 0]);
  });
});

it('writes colours as CSS and darkens those of copper towards ink', () => {
  const map = colourMap('cyclic', 'light');
  expect(cssColour(map, 0)).toBe('rgb(210,139,99)');
  expect(shapeColour(map, 0)).toBe('rgb(100,73,58)');
  expect(map.words[0]).toBe(0xff638bd2);
});
