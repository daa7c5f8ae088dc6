import { degFromRad, radFromDeg } from '../units/angles';
import { directionOf } from '../waves/conventions';
import type { ApertureField } from './aperture-field';
import { EXAMPLE_DESIGN, exampleDesign } from './example-design';
import { exampleField } from './example-field';
import { hemispherePeaks } from './hemisphere-peaks';
import { illuminatedState } from './illuminated-state';
import { lobeRelativeTo, patternLobes, peakAnglesDeg } from './pattern-lobes';
import { placeCells } from './place-cells';
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
    const [first] = hemispherePeaks(model, 5).peaks;
    let best = 0;
    for (let u = -1; u <= 1; u += 0.005) for (let v = -1; v <= 1; v += 0.005) if (u * u + v * v < 1) best = Math.max(best, directivityRatioAt(model, u, v));
    expect(refinePeak(model, first.u, first.v).directivityRatio).toBeGreaterThanOrEqual(best * (1 - 1e-9));
  });

  it.each([
    [1.15, { thetaDeg: 24, phiDeg: 178, frequencyGHz: 9.1, positionMm: [-49, 0, 244], widthMm: 285 }, -15.27955, [-0.295443, 0.015559]],
    [0.49, { thetaDeg: 22, phiDeg: 40, frequencyGHz: 9.3, positionMm: [-20, 0, 208], widthMm: 285 }, -18.302146, [0.470101, 0.258081]],
    [0.05, { thetaDeg: 14, phiDeg: 101, frequencyGHz: 10.8, positionMm: [-81, 0, 178], widthMm: 300 }, -15.805633, [-0.148636, 0.219384]],
  ] as const)('finds a lobe on the flank of the beam behind a saddle %d dB deep', (_depthDb, { thetaDeg, phiDeg, frequencyGHz, positionMm, widthMm }, levelDb, [u, v]) => {
    // Level and place by a direct sum over the cells and a search without derivatives, in another language.
    const placed = placeCells(
      exampleDesign({
        requirement: { designFrequencyGHz: 10, beams: [{ thetaDeg, phiDeg }], polarisation: 'x' },
        panel: { ...EXAMPLE_DESIGN.panel, outline: { kind: 'rectangle', widthMm, heightMm: 300 } },
        illumination: { kind: 'horn', positionMm: [...positionMm], aimMm: [0, 0, 0], exponentE: 4, exponentH: 4, polarisation: 'x' },
      }),
    );
    const state = illuminatedState(placed, frequencyGHz);
    const { ofBeams, others } = patternLobes(state.pattern, [directionOf(radFromDeg(thetaDeg), radFromDeg(phiDeg))]);
    expect(lobeRelativeTo(others[0], ofBeams[0]).levelDb).toBeCloseTo(levelDb, 5);
    expect([others[0].u, others[0].v]).toEqual([expect.closeTo(u, 5), expect.closeTo(v, 5)]);
  });

  it('names the wanted beam as the highest where its image is equal to it but for rounding', () => {
    // Real weights: the pattern is the same at (u, v) and (-u, -v).
    const field = steered(16, 35);
    field.im.fill(0);
    const lobes = patternLobes(pattern(field), [directionOf(radFromDeg(35), Math.PI)]);
    expect(lobes.highest).toBe(lobes.ofBeams[0]);
    expect(lobes.highest.u).toBeLessThan(-0.5);
    expect(lobeRelativeTo(lobes.others[0], lobes.highest).levelDb).toBeCloseTo(0, 9);
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
