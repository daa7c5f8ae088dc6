import { predictDesign } from '../../../shared/antenna/predict-design';
import { degFromRad, radFromDeg, wrapDeg } from '../../../shared/units/angles';
import { amplitudeRatioToDb } from '../../../shared/units/decibels';
import { anglesOf } from '../../../shared/waves/conventions';
import { gratingLobes, shortestReciprocalPerM } from '../../../shared/antenna/grating-lobes';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { beamAt, numberOf } from '../test-arrays';
import { FREQUENCY_OF_100_MM_GHZ, hornAt, testDesign } from '../test-designs';

const norm360 = (deg: number): number => deg - 360 * Math.floor(deg / 360);

/** The target phase of the one cell that stands at the given place of a fine lattice. */
function compareTargetPhase(check: PublishedCheck): void {
  const [xMm, yMm] = numbersIn(check.inputs, 'element_mm');
  // 15 mm period and 20 columns put cells at odd multiples of 7.5 mm, where the checks ask.
  const design = testDesign({
    frequencyGHz: numberIn(check.inputs, 'f_GHz'),
    periodMm: 15,
    columns: 20,
    rows: 20,
    beams: [{ thetaDeg: numberIn(check.inputs, 'beam_theta_deg'), phiDeg: numberIn(check.inputs, 'beam_phi_deg') }],
    illumination: hornAt(numbersIn(check.inputs, 'feed_mm'), 6.5),
  });
  const { cells } = predictDesign(design, { include: { cells: true } });
  if (cells === undefined) throw new Error('no cells in the answer');
  const at = cells.xMm.findIndex((x, i) => Math.abs(x - xMm) < 1e-6 && Math.abs(cells.yMm[i] - yMm) < 1e-6);
  if (at < 0) throw new Error('no cell stands there');
  const error = wrapDeg(cells.targetPhaseDeg[at] - numberIn(check.expected, 'phase_deg_mod360'));
  expectWithin({ quantity: 'target phase, difference', unit: 'deg', got: error, expected: 0, tolerance: toleranceOf(check, 'abs_deg') });
}

export const phaseChecks: CheckTable = {
  'phase-01': compareTargetPhase,
  'phase-02': compareTargetPhase,
  'phase-03': (check) => {
    const thetaDeg = numberIn(check.inputs, 'beam_theta_deg');
    // The wave travels towards +u, so it comes from the direction at azimuth 180 degrees.
    const design = testDesign({
      frequencyGHz: numberIn(check.inputs, 'f_GHz'),
      periodMm: 10,
      columns: 17,
      rows: 29,
      beams: [{ thetaDeg, phiDeg: numberIn(check.inputs, 'beam_phi_deg') }],
      illumination: { kind: 'plane-wave', thetaDeg, phiDeg: 180, polarisation: 'x' },
    });
    const { cells } = predictDesign(design, { include: { cells: true } });
    const spread = Math.max(...Array.from(cells?.targetPhaseDeg ?? [NaN], (deg) => Math.abs(wrapDeg(deg - (cells?.targetPhaseDeg[0] ?? 0)))));
    expectWithin({ quantity: 'spread of the target phase', unit: 'deg', got: spread, expected: numberIn(check.expected, 'phase_spread_deg'), tolerance: toleranceOf(check, 'abs_deg') });
  },
  'phase-04': (check) => {
    const library = numbersIn(check.inputs, 'library_deg');
    const chosen: number[] = [];
    const errors: number[] = [];
    // One cell whose target is the reference phase alone: broadside from a broadside plane wave.
    for (const request of numbersIn(check.inputs, 'requests_deg')) {
      const wrapped = request % 360;
      const design = testDesign({
        frequencyGHz: 10,
        periodMm: 15,
        columns: 1,
        rows: 1,
        cells: { kind: 'inline', cells: library.map((phaseDeg) => ({ phaseDeg, magnitude: 1 })) },
        referencePhaseDeg: wrapped,
      });
      const { cells } = predictDesign(design, { include: { cells: true } });
      chosen.push(norm360(cells?.phaseDeg[0] ?? NaN));
      errors.push(cells?.errorDeg[0] ?? NaN);
    }
    // Single precision carries the phases to the screen: 1e-5 degrees at 360.
    expectWithin({ quantity: 'chosen phase', unit: 'deg', got: chosen, expected: numbersIn(check.expected, 'chosen_deg'), tolerance: 3e-5 });
    expectWithin({ quantity: 'error', unit: 'deg', got: errors, expected: numbersIn(check.expected, 'error_deg'), tolerance: 3e-5 });
  },
  'gl-01': (check) => {
    // The longest period with no visible order: bisection on the product's own list of orders.
    const longest = (thetaDeg: number, lattice: (period: number) => Parameters<typeof gratingLobes>[0]): number => {
      let [free, crowded] = [0.3, 1.3];
      for (let i = 0; i < 40; i++) {
        const middle = (free + crowded) / 2;
        // The nearest order to a lattice is reached along its shortest reciprocal vector: put the beam opposite to it.
        const count = [0, 30, 60, 90].reduce((sum, phiDeg) => sum + gratingLobes(lattice(middle), beamAt(thetaDeg, phiDeg), 1).count, 0);
        if (count === 0) free = middle;
        else crowded = middle;
      }
      return (free + crowded) / 2;
    };
    const thetas = numbersIn(check.inputs, 'theta_deg');
    const rectangular = thetas.map((theta) => longest(theta, (period) => ({ kind: 'rectangular', periodXM: period, periodYM: period })));
    const triangular = thetas.map((theta) => longest(theta, (period) => ({ kind: 'triangular', periodXM: period, rowSpacingM: (period * Math.sqrt(3)) / 2 })));
    expectWithin({ quantity: 'longest period, rectangular', unit: 'wavelengths', got: rectangular, expected: numbersIn(check.expected, 'rect_lambda'), tolerance: toleranceOf(check, 'abs') });
    expectWithin({ quantity: 'longest side, triangular', unit: 'wavelengths', got: triangular, expected: numbersIn(check.expected, 'equilateral_triangle_side_lambda'), tolerance: toleranceOf(check, 'abs') });
    const side = 0.7;
    const shortest = shortestReciprocalPerM({ kind: 'triangular', periodXM: side, rowSpacingM: (side * Math.sqrt(3)) / 2 });
    expectWithin({ quantity: 'shortest reciprocal vector of the triangle', unit: '1/m', got: shortest, expected: 2 / (side * Math.sqrt(3)), tolerance: 1e-12 });
  },
  'gl-02': (check) => {
    const lattice = { kind: 'rectangular', periodXM: numberIn(check.inputs, 'dx_lambda'), periodYM: numberIn(check.inputs, 'dy_lambda') } as const;
    const { count, lobes } = gratingLobes(lattice, beamAt(numberIn(check.inputs, 'theta_deg'), numberIn(check.inputs, 'phi_deg')), 1);
    const [lobe] = lobes;
    expect([count, lobe.orderX + 0, lobe.orderY + 0]).toEqual([numberIn(check.expected, 'count'), ...numbersIn(check.expected, 'order')]);
    const tolerance = toleranceOf(check, 'deg');
    expectWithin({ quantity: 'theta', unit: 'deg', got: lobe.thetaDeg, expected: numberIn(check.expected, 'theta_deg'), tolerance });
    expectWithin({ quantity: 'phi', unit: 'deg', got: lobe.phiDeg, expected: numberIn(check.expected, 'phi_deg'), tolerance });
  },
  'squint-01': (check) => {
    const cases = check.inputs['cases'] as Record<string, number>[];
    const got = cases.map((given) => {
      const along = (thetaDeg: number) => ({ thetaDeg: Math.abs(thetaDeg), phiDeg: thetaDeg < 0 ? 180 : 0 });
      // Isotropic cells, so that the element factor does not pull the peak; the incident wave travels towards +u.
      const design = testDesign({
        frequencyGHz: 10,
        periodMm: 10,
        columns: 200,
        rows: 1,
        beams: [along(given['theta0'])],
        illumination: { kind: 'plane-wave', ...along(-given['theta_inc']), polarisation: 'x' },
        radiateExponent: 0,
      });
      const { figures } = predictDesign(design, { frequencyGHz: 10 * given['f_ratio'], include: {} });
      // The beam is the highest lobe; nearer to the wanted direction may stand a sidelobe.
      const phiRad = radFromDeg(numberOf(figures.peakPhiDeg));
      return degFromRad(Math.asin(Math.sin(radFromDeg(numberOf(figures.peakThetaDeg))) * Math.cos(phiRad)));
    });
    expectWithin({ quantity: 'direction of the beam', unit: 'deg', got, expected: numbersIn(check.expected, 'theta_deg'), tolerance: toleranceOf(check, 'deg') });
  },
  'quant-04': (check) => compareLine(check, 2 ** numberIn(check.inputs, 'bits'), { main: 'main_dB', lobeU: numberIn(check.inputs, 'lobe_u'), lobe: 'lobe_rel_dB', relative: true }),
  'quant-05': (check) =>
    compareLine(check, 2 ** numberIn(check.inputs, 'bits'), { main: 'main_dB', lobeU: -Math.sin(radFromDeg(numberIn(check.inputs, 'theta_deg'))), lobe: 'mirror_dB', relative: false }),
  'dual-01': (check) => {
    const [left, right] = numbersIn(check.inputs, 'u');
    const field = lineField(numberIn(check.inputs, 'N'), numberIn(check.inputs, 'd_lambda'), { beams: [left, right], levels: null });
    const tolerance = toleranceOf(check, 'dB');
    expectWithin({ quantity: 'each beam', unit: 'dB', got: amplitudeRatioToDb(field(right)), expected: numberIn(check.expected, 'beam_dB'), tolerance });
    expectWithin({ quantity: 'third order', unit: 'dB', got: amplitudeRatioToDb(field(0.9)), expected: numberIn(check.expected, 'third_order_dB_at_u_0p9'), tolerance });
  },
};

/** Array factor of a line of cells under a broadside plane wave, relative to all of them in phase, from the placed cells. */
function lineField(count: number, periodWavelengths: number, of: { beams: readonly number[]; levels: number | null }): (u: number) => number {
  const design = testDesign({
    frequencyGHz: FREQUENCY_OF_100_MM_GHZ,
    periodMm: 100 * periodWavelengths,
    columns: count,
    rows: 1,
    beams: of.beams.map((u) => {
      const { thetaRad, phiRad } = anglesOf({ u, v: 0, w: Math.sqrt(1 - u * u) });
      return { thetaDeg: degFromRad(thetaRad), phiDeg: degFromRad(phiRad) };
    }),
    cells: { kind: 'ideal', levels: of.levels },
  });
  const { cells } = predictDesign(design, { include: { cells: true } });
  if (cells === undefined) throw new Error('no cells in the answer');
  return (u) => {
    let [re, im] = [0, 0];
    cells.phaseDeg.forEach((phaseDeg, n) => {
      const angle = radFromDeg(phaseDeg) + 2 * Math.PI * (cells.xMm[n] / 100) * u;
      re += Math.cos(angle);
      im += Math.sin(angle);
    });
    return Math.hypot(re, im) / count;
  };
}

function compareLine(check: PublishedCheck, levels: number, names: { main: string; lobeU: number; lobe: string; relative: boolean }): void {
  const { inputs, expected } = check;
  const u0 = typeof inputs['u0'] === 'number' ? inputs['u0'] : Math.sin(radFromDeg(numberIn(inputs, 'theta_deg')));
  const field = lineField(numberIn(inputs, 'N'), numberIn(inputs, 'd_lambda'), { beams: [u0], levels });
  const main = amplitudeRatioToDb(field(u0));
  const lobe = amplitudeRatioToDb(field(names.lobeU));
  const tolerance = toleranceOf(check, 'dB');
  expectWithin({ quantity: 'beam', unit: 'dB', got: main, expected: numberIn(expected, names.main), tolerance });
  expectWithin({ quantity: 'lobe', unit: 'dB', got: names.relative ? lobe - main : lobe, expected: numberIn(expected, names.lobe), tolerance });
}
