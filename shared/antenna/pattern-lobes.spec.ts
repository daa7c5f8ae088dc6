import { degFromRad, radFromDeg } from '../units/angles';
import { directionOf } from '../waves/conventions';
import type { ApertureField } from './aperture-field';
import { exampleField } from './example-field';
import { hemispherePeaks } from './hemisphere-peaks';
import { lobeRelativeTo, patternLobes, peakAnglesDeg } from './pattern-lobes';
import { directivityRatioAt, radiationPattern, type RadiationPattern } from './radiation-pattern';
import { refinePeak } from './refine-peak';

const halfWaveM = Math.PI / 210;

/** Equal amplitudes with the phase slope of a beam. */
function steered(count: number, thetaDeg: number, spacingM = halfWaveM): ApertureField {
  const grid = { columnCount: count, rowCount: count, firstXM: 0, firstYM: 0, stepXM: spacingM, stepYM: spacingM, stagger: 'none' as const };
  const re = new Float64Array(count * count);
  const im = new Float64Array(count * count);
  const slope = -210 * spacingM * Math.sin(radFromDeg(thetaDeg));
  re.forEach((_, i) => {
    re[i] = Math.cos(slope * (i % count));
    im[i] = Math.sin(slope * (i % count));
  });
  return { grid, re, im };
}

const pattern = (field: ApertureField, exponent = 0.5): RadiationPattern => radiationPattern(field, 210, exponent);

describe('the lobes of a pattern', () => {
  it('finds that the element factor pulls the peak of a 20 x 20 array from 60 to 59.425 degrees, 28.096 dBi', () => {
    const lobes = patternLobes(pattern(steered(20, 60)), [directionOf(radFromDeg(60), 0)]);
    expect(peakAnglesDeg(lobes.highest).thetaDeg).toBeCloseTo(59.425, 3);
    expect(10 * Math.log10(lobes.highest.directivityRatio)).toBeCloseTo(28.096, 3);
    expect(lobes.ofBeams[0]).toBe(lobes.highest);
  });

  it('climbs from anywhere on a lobe to its top, where no neighbour is higher', () => {
    const model = pattern(steered(20, 20));
    const top = refinePeak(model, Math.sin(radFromDeg(20)) + 0.02, 0.03);
    for (const [du, dv] of [[1e-4, 0], [-1e-4, 0], [0, 1e-4], [0, -1e-4]]) {
      expect(directivityRatioAt(model, top.u + du, top.v + dv)).toBeLessThan(top.directivityRatio);
    }
    expect(top.v).toBeCloseTo(0, 8);
    expect(top.lastStep).toBeLessThan(1e-5);
  });

  it('finds an image lobe stronger than the wanted beam as level above 0', () => {
    // 0.8 wavelengths at 30 degrees: the grating lobe stands at sin theta = 0.5 - 1.25 = -0.75, nearer to broadside it is not.
    const model = pattern(steered(12, 48.59, 1.6 * halfWaveM));
    const lobes = patternLobes(model, [directionOf(radFromDeg(48.59), 0)]);
    const image = lobeRelativeTo(lobes.others[0], lobes.ofBeams[0]);
    expect(image.levelDb).toBeGreaterThan(0.5);
    expect(image.thetaDeg).toBeCloseTo(30, 0);
    expect(Math.abs(image.phiDeg)).toBeCloseTo(180, 3);
  });

  it('does not count another wanted beam among the other lobes', () => {
    const field = steered(16, 15);
    const mirrored = steered(16, -30);
    field.re.forEach((_, i) => {
      field.re[i] += mirrored.re[i];
      field.im[i] += mirrored.im[i];
    });
    const beams = [directionOf(radFromDeg(15), 0), directionOf(radFromDeg(30), Math.PI)];
    const lobes = patternLobes(pattern(field), beams);
    expect(lobes.ofBeams.map((peak) => degFromRad(Math.asin(peak.u)))).toEqual([expect.closeTo(15, 0), expect.closeTo(-30, 0)]);
    expect(lobeRelativeTo(lobes.others[0], lobes.ofBeams[0]).levelDb).toBeLessThan(-8);
  });

  it('samples every strong lobe: the strongest of them stand where a fine scan finds maxima', () => {
    const model = pattern(exampleField({ columnCount: 9, rowCount: 8 }));
    const [first] = hemispherePeaks(model, 5);
    let best = 0;
    for (let u = -1; u <= 1; u += 0.005) for (let v = -1; v <= 1; v += 0.005) if (u * u + v * v < 1) best = Math.max(best, directivityRatioAt(model, u, v));
    expect(refinePeak(model, first.u, first.v).directivityRatio).toBeGreaterThanOrEqual(best * (1 - 1e-9));
  });

  it('keeps a peak of the horizon on the rim when the element does not fall off', () => {
    const top = refinePeak(pattern(steered(8, 89.9), 0), 0.97, 0);
    expect(Math.hypot(top.u, top.v)).toBeLessThanOrEqual(1);
    expect(Math.hypot(top.u, top.v)).toBeGreaterThan(0.99);
  });

  it('has one lobe for one cell', () => {
    const model = pattern(exampleField({ columnCount: 1, rowCount: 1 }));
    const lobes = patternLobes(model, [directionOf(0.4, 1)]);
    expect(peakAnglesDeg(lobes.highest).thetaDeg).toBeCloseTo(0, 4);
    expect(lobes.others).toEqual([]);
  });
});
