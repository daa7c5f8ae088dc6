import { wavenumberRadPerM } from '../../waves/conventions';
import { planeWaveDesign } from '../example-design';
import { figures as figuresSchema } from '../../model/figures';
import type { IlluminatedState } from '../illuminated-state';
import { predictDesign } from '../predict-design';
import { axialLevel, axialMaximum, type AxialSources } from './axial-profile';
import { focusFigures } from './focus-figures';
import { fallingEdge, highestNear } from './line-search';

const one: AxialSources = {
  xM: Float64Array.of(0),
  yM: Float64Array.of(0),
  re: Float64Array.of(2),
  im: Float64Array.of(0),
  wavenumber: wavenumberRadPerM(10e9),
  radiateExponent: 0.5,
  along: [0, 0, 1],
};

describe('searching on a line', () => {
  it('finds the top of a hill and where it falls to half', () => {
    const hill = (s: number): number => 1 / (1 + (s - 3) ** 2);
    expect(highestNear(hill, 1, 4.5)).toBeCloseTo(3, 6);
    expect(fallingEdge(hill, 0.5, 3, 9)).toBeCloseTo(4, 7);
  });
});

describe('the level on an axis', () => {
  it('falls with the square of the distance from one cell, and with cos theta aside of it', () => {
    expect(axialLevel(one, 2)).toBeCloseTo(1, 12);
    const aside = { ...one, along: [Math.sin(1), 0, Math.cos(1)] as const };
    expect(axialLevel(aside, 2)).toBeCloseTo(Math.cos(1), 12);
  });

  it('has no half-power point where the scan ends before it', () => {
    const found = axialMaximum(one, { fromM: 1, toM: 1.2, samples: 9 });
    expect([found.nearHalfM, found.farHalfM]).toEqual([undefined, undefined]);
    expect(found.distanceM).toBeCloseTo(1, 6);
  });
});

describe('a focus as predicted', () => {
  it('shows that the level is highest nearer than the focus, and by how much', () => {
    const { figures } = predictDesign(planeWaveDesign({ synthesis: { kind: 'focus', pointMm: [0, 0, 1200] } }), { include: {} });
    expect(figuresSchema.safeParse(figures).success).toBe(true);
    const { focus } = figures;
    if (focus === undefined || 'kind' in focus) throw new Error('no focus');
    expect(focus.maximumMm).toBeCloseTo(658.7, 0);
    expect(focus.riseDb).toBeCloseTo(3.18, 1);
    expect(focus.shiftMm).toBeCloseTo(focus.maximumMm - 1200, 9);
    expect(Math.max(...focus.profile.levelDb)).toBeLessThanOrEqual(0.001);
    const at1200 = focus.profile.distanceMm.findIndex((mm) => mm > 1200);
    expect(focus.profile.levelDb[at1200]).toBeCloseTo(-3.2, 0);
  });

  it('looks along the line to a focus aside of the axis', () => {
    const { focus } = predictDesign(planeWaveDesign({ synthesis: { kind: 'focus', pointMm: [200, 0, 500] } }), { include: {} }).figures;
    if (focus === undefined || 'kind' in focus) throw new Error('no focus');
    expect(focus.distanceMm).toBeCloseTo(Math.hypot(200, 500), 9);
    expect(focus.maximumMm).toBeLessThan(focus.distanceMm);
  });

  it('declines where the panel is too large to follow the line', () => {
    const large = { placed: { lattice: { count: 50_000 } } } as unknown as IlluminatedState;
    expect(focusFigures(large, { xM: 0, yM: 0, zM: 9 })).toMatchObject({ kind: 'too-many-cells', reason: expect.stringContaining('50000 cells') as string });
  });
});
