import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { predictDesign } from '../../shared/antenna/predict-design';
import { directivityRatio } from '../../shared/antenna/radiation-pattern';
import { gridReflection } from '../../shared/antenna/grid-model';
import { besselJ } from '../../shared/math/bessel';
import { radixFourTransform } from '../../shared/math/fourier-transform';
import { gaussLegendre } from '../../shared/math/quadrature';
import { median, quantile } from '../../shared/math/statistics';
import { unwrapPhasesRad } from '../../shared/math/unwrap-phase';
import { degFromRad, radFromDeg } from '../../shared/units/angles';
import { powerRatioToDb } from '../../shared/units/decibels';
import { outgoingWave } from '../../shared/waves/refraction';
import { expectWithin } from './expect-within';
import { beamAt, cutThrough, numberOf, testPattern } from './test-arrays';
import { FREQUENCY_OF_100_MM_GHZ, hornAt, testDesign } from './test-designs';

interface LibraryValues {
  readonly besselJ: readonly { order: number; z: number; value: number }[];
  readonly unwrap: { wrappedRad: number[]; unwrappedRad: number[] };
  readonly transform: { re: number[]; im: number[]; resultRe: number[]; resultIm: number[] };
  readonly gaussLegendre5: { nodes: number[]; weights: number[] };
  readonly percentile: { sample: number[]; p5: number; p50: number; p95: number };
  readonly taylor24: { weights: number[]; sidelobeDb: number };
}

const library = JSON.parse(readFileSync(join(__dirname, 'data', 'numerical-libraries.json'), 'utf8')) as LibraryValues;

describe('against general numerical libraries (numpy 2.4.6, scipy 1.17.1)', () => {
  it.each(library.besselJ)('J of order $order at $z [scipy.special.jv]', ({ order, z, value }) => {
    expectWithin({ quantity: `J_${order}(${z})`, unit: '', got: besselJ(order, z), expected: value, tolerance: 1e-10 });
  });

  it('unwraps a phase as numpy.unwrap does', () => {
    const { wrappedRad, unwrappedRad } = library.unwrap;
    expectWithin({ quantity: 'unwrapped phase', unit: 'rad', got: Array.from(unwrapPhasesRad(wrappedRad)), expected: unwrappedRad, tolerance: 1e-9 });
  });

  it('transforms as numpy.fft.fft does, with its sign when the planes are swapped', () => {
    const { re, im, resultRe, resultIm } = library.transform;
    const [planeRe, planeIm] = [Float64Array.from(re), Float64Array.from(im)];
    radixFourTransform(re.length).transform(planeIm, planeRe);
    expectWithin({ quantity: 'real part', unit: '', got: Array.from(planeRe), expected: resultRe, tolerance: 1e-12 });
    expectWithin({ quantity: 'imaginary part', unit: '', got: Array.from(planeIm), expected: resultIm, tolerance: 1e-12 });
  });

  it('has the five-point rule of numpy.polynomial.legendre.leggauss', () => {
    const rule = gaussLegendre(5);
    expectWithin({ quantity: 'nodes', unit: '', got: Array.from(rule.nodes), expected: library.gaussLegendre5.nodes, tolerance: 1e-14 });
    expectWithin({ quantity: 'weights', unit: '', got: Array.from(rule.weights), expected: library.gaussLegendre5.weights, tolerance: 1e-14 });
  });

  it('takes percentiles at rank (n - 1) p, as numpy.percentile', () => {
    const { sample, p5, p50, p95 } = library.percentile;
    expectWithin({ quantity: 'percentiles', unit: '', got: [quantile(sample, 0.05), median(sample), quantile(sample, 0.95)], expected: [p5, p50, p95], tolerance: 1e-12 });
  });

  it('finds the sidelobe of a 24-element Taylor line [scipy.signal.windows.taylor, numpy.fft]', () => {
    const { weights, sidelobeDb } = library.taylor24;
    const pattern = testPattern({ columns: 24, rows: 1, stepX: 0.5, stepY: 1, weight: (column) => weights[column] });
    const { sidelobeDb: got } = cutThrough(pattern, beamAt(0, 0), 'along', 8000);
    expectWithin({ quantity: 'sidelobe', unit: 'dB', got: numberOf(got), expected: sidelobeDb, tolerance: 1e-3 });
  });
});

describe('against books', () => {
  // M. Abramowitz, I. A. Stegun, Handbook of Mathematical Functions, 1964, table 9.5.
  it('has the first zeros of J0 and J1 at 2.40482 55577 and 3.83170 59702', () => {
    expectWithin({ quantity: 'J0, J1 at their zeros', unit: '', got: [besselJ(0, 2.4048255577), besselJ(1, 3.8317059702)], expected: [0, 0], tolerance: 1e-10 });
  });

  // C. A. Balanis, Antenna Theory, 4th ed., 2016, chapter 6: two isotropic sources in phase, D = 2 / (1 + sin(kd) / kd); from memory.
  it.each([0.25, 0.5, 0.8])('gives two isotropic sources %d wavelengths apart the closed directivity', (apart) => {
    const kd = 2 * Math.PI * apart;
    const got = directivityRatio(testPattern({ columns: 2, rows: 1, stepX: apart, stepY: 1 }), beamAt(0, 0)) / 2;
    expectWithin({ quantity: 'directivity', unit: '', got, expected: 2 / (1 + Math.sin(kd) / kd), tolerance: 1e-9 });
  });

  // The law of reflection, and the generalised law without a gradient (N. Yu et al., Science 334, 2011).
  it('sends a plane wave off a panel of equal cells into the mirror direction', () => {
    const design = testDesign({
      frequencyGHz: 10,
      periodMm: 12,
      columns: 60,
      rows: 60,
      beams: [{ thetaDeg: 35, phiDeg: 200 }],
      illumination: { kind: 'plane-wave', thetaDeg: 35, phiDeg: 20, polarisation: 'x' },
      cells: { kind: 'inline', cells: [{ phaseDeg: 77, magnitude: 1 }] },
      radiateExponent: 0,
    });
    const { figures } = predictDesign(design, { include: {} });
    expectWithin({ quantity: 'theta of the peak', unit: 'deg', got: numberOf(figures.peakThetaDeg), expected: 35, tolerance: 1e-4 });
    expectWithin({ quantity: 'azimuth of the peak', unit: 'deg', got: Math.cos(radFromDeg(numberOf(figures.peakPhiDeg) - 200)), expected: 1, tolerance: 1e-9 });
  });

  // W. Snell's law for glass, as any textbook: sin 30 = 1.5 sin theta.
  it('refracts a wave from air at 30 degrees into glass at 19.471 degrees', () => {
    const wave = outgoingWave({ incident: { u: 0.5, v: 0 }, gradientXRadPerM: 0, gradientYRadPerM: 0, wavenumberRadPerM: 1, outgoingIndex: 1.5 });
    if (wave.kind !== 'propagating') throw new Error('it does not travel');
    expectWithin({ quantity: 'theta', unit: 'deg', got: degFromRad(wave.thetaRad), expected: 19.471, tolerance: 0 });
  });

  // C. A. Balanis, Antenna Theory, 4th ed., 2016, table 12.2: uniform disc, -17.6 dB and 58.9 (lambda / D) degrees; from memory.
  it('gives a uniformly lit disc of 20 wavelengths its textbook sidelobe and width', () => {
    const square = testDesign({ frequencyGHz: FREQUENCY_OF_100_MM_GHZ, periodMm: 20, columns: 100, rows: 100 });
    const disc = { ...square, panel: { ...square.panel, outline: { kind: 'ellipse' as const, widthMm: 2000, heightMm: 2000 } } };
    const { figures } = predictDesign(disc, { include: {} });
    // The element factor and the staircase of the rim shift the level by a few hundredths.
    expectWithin({ quantity: 'sidelobe', unit: 'dB', got: numberOf(figures.sidelobeDb.along), expected: -17.57, tolerance: 0.1 });
    expectWithin({ quantity: 'width', unit: 'deg', got: numberOf(figures.halfPowerBeamwidthDeg.along), expected: 58.96 / 20, tolerance: 0.02 });
  });

  // R. E. Collin's limit 4 pi A / lambda^2 of a uniform aperture (IEEE Std 145-2013, standard directivity).
  it('gives a large uniform panel 4 pi A / lambda^2, on a rectangular and on a triangular lattice', () => {
    const rectangular = testDesign({ frequencyGHz: FREQUENCY_OF_100_MM_GHZ, periodMm: 50, columns: 60, rows: 60 });
    const triangular = { ...rectangular, panel: { ...rectangular.panel, lattice: { kind: 'triangular' as const, periodXMm: 50, rowSpacingMm: 50 } } };
    for (const design of [rectangular, triangular]) {
      const { figures } = predictDesign(design, { include: {} });
      const areaOfCells = figures.cellCount * 0.25; // square wavelengths
      expectWithin({ quantity: 'directivity', unit: 'dBi', got: numberOf(figures.directivityDbi), expected: powerRatioToDb(4 * Math.PI * areaOfCells), tolerance: 0.05 });
    }
  });

  // Fresnel and transmission-line theory, D. M. Pozar, Microwave Engineering, 4th ed., 2012, sections 1.8 and 2.3; from memory.
  it.each([
    ['te', 60],
    ['tm', 60],
    ['te', 0],
  ] as const)('reflects a bare grounded slab by the line formula, %s at %d degrees', (polarisation, thetaDeg) => {
    const [permittivity, thicknessM, frequencyHz] = [2.2, 1.575e-3, 10e9];
    const k0 = (2 * Math.PI * frequencyHz) / 299792458;
    const cosine = Math.cos(radFromDeg(thetaDeg));
    const slowness = Math.sqrt(permittivity - 1 + cosine * cosine);
    // Input impedance of the shorted slab over the free-space wave impedance of the same polarisation.
    const slab = Math.tan(slowness * k0 * thicknessM) * (polarisation === 'te' ? cosine / slowness : slowness / permittivity / cosine);
    const expected = 180 - 2 * degFromRad(Math.atan(slab));
    const { re, im } = gridReflection({ periodM: 5e-3, gapM: 5e-3 * (1 - 1e-9), thicknessM, relativePermittivity: permittivity, lossTangent: 0 }, { frequencyHz, thetaRad: radFromDeg(thetaDeg), polarisation });
    expectWithin({ quantity: 'phase', unit: 'deg', got: degFromRad(Math.atan2(im, re)), expected, tolerance: 1e-6 });
  });

  // J. Huang, J. A. Encinar, Reflectarray Antennas, 2007, chapter 2: a centre-fed reflector of constant path needs no
  // more than the path difference itself; from memory. Paths to the rim of a 300 mm panel at 300 mm height.
  it('asks of a broadside beam exactly the path difference of the feed', () => {
    const design = testDesign({ frequencyGHz: 10, periodMm: 15, columns: 20, rows: 20, illumination: hornAt([0, 0, 300], 6.5) });
    const { cells } = predictDesign(design, { include: { cells: true } });
    if (cells === undefined) throw new Error('no cells in the answer');
    const wavelengthMm = 299.792458 / 10;
    const worst = Math.max(
      ...Array.from(cells.targetPhaseDeg, (deg, n) => {
        const expected = (360 * Math.hypot(cells.xMm[n], cells.yMm[n], 300)) / wavelengthMm;
        return Math.abs(((deg - expected + 540) % 360 + 360) % 360 - 180);
      }),
    );
    // Targets reach 3800 degrees before they are wrapped; single precision leaves 2e-4 of them.
    expectWithin({ quantity: 'worst target', unit: 'deg', got: worst, expected: 0, tolerance: 5e-4 });
  });
});
