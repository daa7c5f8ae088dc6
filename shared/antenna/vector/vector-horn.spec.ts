import * as fc from 'fast-check';
import { exampleDesign } from '../example-design';
import { hornSampler } from '../horn-field';
import { siDesign, type SiHorn } from '../si-design';
import { localWave, newLocalWave } from './local-wave';
import { polarisationVector } from './polarisation-vector';
import { newFieldSample, vectorHornPattern, vectorHornPower } from './vector-horn';
import { vectorLight, wavePower } from './vector-light';
import { vectorCapturedShare } from './vector-spillover';
import { crossProduct, dotProduct, type Vector3 } from './vector-three';

const hornOf = (changes: Partial<SiHorn> = {}): SiHorn => {
  const { illumination } = siDesign(exampleDesign());
  if (illumination.kind !== 'horn') throw new Error('no horn');
  return { ...illumination, ...changes };
};
const down: Partial<SiHorn> = { position: { xM: 0, yM: 0, zM: 0.2 } };
const polarisations = ['x', 'y', 'rhcp', 'lhcp'] as const;
const directions = fc
  .tuple(fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: -1, max: -0.05, noNaN: true }))
  .map(([x, y, z]): Vector3 => {
    const length = Math.hypot(x, y, z);
    return [x / length, y / length, z / length];
  });

describe('polarisationVector', () => {
  it('has unit size across the travel, and turns the right way for circular senses', () => {
    fc.assert(
      fc.property(directions, fc.constantFrom(...polarisations), (travel, polarisation) => {
        const { re, im } = polarisationVector(travel, polarisation);
        expect(Math.hypot(...re, ...im)).toBeCloseTo(1, 12);
        expect(Math.hypot(dotProduct(re, travel), dotProduct(im, travel))).toBeLessThan(1e-12);
        const turn = crossProduct(travel, re);
        const sign = polarisation === 'rhcp' ? -1 : polarisation === 'lhcp' ? 1 : 0;
        im.forEach((value, i) => expect(value).toBeCloseTo(sign * turn[i], 12));
      }),
    );
  });

  it('finds some vector across a travel along its own axis', () => {
    expect(polarisationVector([1, 0, 0], 'x').re).toEqual([0, 0, 1]);
  });
});

describe('the vector horn', () => {
  it.each(polarisations)('radiates pi [1/(2 qE + 1) + 1/(2 qH + 1)], %s', (polarisation) => {
    const horn = hornOf({ exponentE: 7, exponentH: 5, polarisation });
    const at = vectorHornPattern(horn);
    const field = newFieldSample();
    // Equal areas of cos theta and equal steps of phi: the midpoint rule on the whole sphere.
    let sum = 0;
    const [rings, steps] = [400, 90];
    for (let i = 0; i < rings; i++) {
      const z = -1 + (2 * (i + 0.5)) / rings;
      for (let j = 0; j < steps; j++) {
        const phi = (2 * Math.PI * (j + 0.5)) / steps;
        at(Math.sqrt(1 - z * z) * Math.cos(phi), Math.sqrt(1 - z * z) * Math.sin(phi), z, field);
        sum += field.xRe ** 2 + field.xIm ** 2 + field.yRe ** 2 + field.yIm ** 2 + field.zRe ** 2 + field.zIm ** 2;
      }
    }
    expect((sum * 4 * Math.PI) / (rings * steps)).toBeCloseTo(vectorHornPower(horn), 4);
  });

  it('is transverse everywhere, dark behind, and the polarisation vector on its axis', () => {
    const horn = hornOf({ ...down, exponentE: 7, exponentH: 5 });
    const at = vectorHornPattern(horn);
    fc.assert(
      fc.property(directions, ([x, y, z]) => {
        const field = at(x, y, z, newFieldSample());
        // Nearer than 1e-9 to the axis the field is that on it.
        expect(Math.abs(field.xRe * x + field.yRe * y + field.zRe * z)).toBeLessThan(2e-9);
      }),
    );
    expect(at(0, 0, 1, newFieldSample())).toEqual(newFieldSample());
    expect(at(0, 0, -1, newFieldSample()).xRe).toBe(1);
  });

  it('has the scalar blend as its co-polar part in its own axes', () => {
    const horn = hornOf({ ...down, exponentE: 7, exponentH: 3 });
    const scalarAt = hornSampler(horn);
    const field = newFieldSample();
    for (const [x, y] of [[0.1, 0], [0, 0.1], [0.07, 0.05], [-0.12, 0.09]]) {
      const distance = Math.hypot(x, y, 0.2);
      vectorHornPattern(horn)(x / distance, y / distance, -0.2 / distance, field);
      // Ludwig's component about the axis -z: E_theta cos phi - E_phi sin phi with phi from x towards -y.
      const phi = Math.atan2(-y, x);
      const c = 0.2 / distance;
      const s = Math.hypot(x, y) / distance;
      const theta = c * Math.cos(phi) * field.xRe - c * Math.sin(phi) * field.yRe + s * field.zRe;
      const turn = -Math.sin(phi) * field.xRe - Math.cos(phi) * field.yRe;
      expect((theta * Math.cos(phi) - turn * Math.sin(phi)) / distance).toBeCloseTo(scalarAt(x, y).field, 9);
    }
  });
});

describe('the waves at the cells', () => {
  it('carry |E|^2 cos(incidence), whatever the direction', () => {
    fc.assert(
      fc.property(directions, fc.constantFrom(...polarisations), (travel, polarisation) => {
        const { re, im } = polarisationVector(travel, polarisation);
        const wave = localWave({ xRe: re[0], xIm: im[0], yRe: re[1], yIm: im[1], zRe: re[2], zIm: im[2] }, travel, newLocalWave());
        expect(wave.teRe ** 2 + wave.teIm ** 2 + wave.tmRe ** 2 + wave.tmIm ** 2).toBeCloseTo(Math.abs(travel[2]), 9);
      }),
    );
  });

  it('take x for the plane of incidence at normal incidence', () => {
    const wave = localWave({ ...newFieldSample(), xRe: 1 }, [0, 0, -1], newLocalWave());
    expect([wave.cosAzimuth, wave.sinAzimuth, wave.tmRe, wave.teRe]).toEqual([1, 0, 1, 0]);
  });

  it('add up to the share that the outline captures, on a fine lattice', () => {
    const horn = hornOf({ exponentE: 7, exponentH: 5 });
    const side = 120;
    const places = Float64Array.from({ length: side * side }, (_, n) => ((n % side) + 0.5) / side - 0.5);
    const ys = Float64Array.from({ length: side * side }, (_, n) => (Math.floor(n / side) + 0.5) / side - 0.5);
    const light = vectorLight(horn, { count: side * side, xM: places.map((x) => 0.3 * x), yM: ys.map((y) => 0.3 * y) });
    const summed = (wavePower(light) * (0.3 / side) ** 2) / vectorHornPower(horn);
    const exact = vectorCapturedShare(horn, { kind: 'rectangle', centre: { xM: 0, yM: 0 }, widthM: 0.3, heightM: 0.3 });
    expect(summed).toBeCloseTo(exact.fraction, 4);
    expect(exact.uncertainty).toBeLessThan(1e-6);
  });

  it('are those of a plane wave that comes from its direction', () => {
    const { illumination } = siDesign(exampleDesign({ illumination: { kind: 'plane-wave', thetaDeg: 30, phiDeg: 180, polarisation: 'y' } }));
    if (illumination.kind !== 'plane-wave') throw new Error('no plane wave');
    const light = vectorLight(illumination, { count: 1, xM: Float64Array.of(0.1), yM: Float64Array.of(0.2) });
    expect(light.cosAzimuth[0]).toBeCloseTo(1, 12);
    expect(light.teRe[0]).toBeCloseTo(Math.sqrt(Math.cos(Math.PI / 6)), 12);
    expect(light.tmRe[0]).toBeCloseTo(0, 12);
  });
});
