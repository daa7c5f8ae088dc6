import { harmonicAmplitude, equalEdges, sequencePower, type SwitchingSequence } from '../../../shared/antenna/modulation/switching-sequence';
import { predictDesign } from '../../../shared/antenna/predict-design';
import type { DesignDocument } from '../../../shared/model/design-document';
import { degFromRad, radFromDeg } from '../../../shared/units/angles';
import { deembeddedReflection, planeShiftRad, waveguideSimulator } from '../../../shared/waves/measuring-cell';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { numberOf } from '../test-arrays';
import { FREQUENCY_OF_100_MM_GHZ, testDesign } from '../test-designs';

/** The amplitudes of the harmonics of one cell, and that no power is lost between them. */
function compareSequence(check: PublishedCheck): void {
  const { inputs, expected } = check;
  const states = (inputs['states_mag_deg'] as number[][]).map(([magnitude, deg]) => ({ magnitude, phaseRad: radFromDeg(deg) }));
  const sequence: SwitchingSequence = { states, edges: Array.isArray(inputs['edges']) ? numbersIn(inputs, 'edges') : equalEdges(states.length) };
  const tolerance = toleranceOf(check, 'abs');
  const levels = expected['a_dB'] as (number | string)[];
  numbersIn(inputs, 'harmonics').forEach((order, i) => {
    const { re, im } = harmonicAmplitude(sequence, order);
    expectWithin({ quantity: `harmonic ${order}`, unit: '', got: [re, im], expected: (expected['a'] as number[][])[i], tolerance });
    const power = re * re + im * im;
    if (levels[i] === 'zero') expect(power).toBeLessThan(1e-20);
    else expectWithin({ quantity: `level of harmonic ${order}`, unit: 'dB', got: 10 * Math.log10(power), expected: Number(levels[i]), tolerance: 1e-4 });
  });
  const total = numberIn(expected, 'energy_sum_over_all_harmonics');
  expectWithin({ quantity: 'power of all harmonics', unit: '', got: sequencePower(sequence), expected: total, tolerance });
  let listed = 0;
  for (let order = -3000; order <= 3000; order++) {
    const { re, im } = harmonicAmplitude(sequence, order);
    listed += re * re + im * im;
  }
  // The coefficients fall as 1/m, so what lies beyond 3000 is of the order of 1/3000.
  expectWithin({ quantity: 'power of 6001 harmonics', unit: '', got: listed, expected: total, tolerance: 1e-3 });
}

export const measuringCellChecks: CheckTable = {
  'wgs-01': (check) => {
    const guides = check.inputs['guides'] as { a_mm: number; f_GHz: number }[];
    const found = guides.map((guide) => waveguideSimulator(guide.a_mm / 1000, guide.f_GHz * 1e9));
    expectWithin({ quantity: 'angle', unit: 'deg', got: found.map((one) => degFromRad(one?.thetaRad ?? NaN)), expected: numbersIn(check.expected, 'theta_deg'), tolerance: toleranceOf(check, 'deg') });
    expectWithin({ quantity: 'guide wavelength', unit: 'mm', got: found.map((one) => (one?.guideWavelengthM ?? NaN) * 1000), expected: numbersIn(check.expected, 'guide_wavelength_mm'), tolerance: toleranceOf(check, 'mm') });
  },
  'deemb-01': (check) => {
    const frequencyHz = numberIn(check.inputs, 'f_GHz') * 1e9;
    const placeOf = (given: Record<string, number>) => ({ frequencyHz, thetaRad: radFromDeg(given['theta_deg']), nearerM: given['delta_mm'] / 1000 });
    const cases = check.inputs['phase_cases'] as Record<string, number>[];
    const tolerance = toleranceOf(check, 'deg');
    expectWithin({ quantity: 'correction', unit: 'deg', got: cases.map((given) => degFromRad(planeShiftRad(placeOf(given)))), expected: numbersIn(check.expected, 'correction_phase_deg'), tolerance });
    const signed = check.inputs['signed_case'] as Record<string, number>;
    const phase = radFromDeg(signed['ratio_phase_deg']);
    const { re, im } = deembeddedReflection({ ...placeOf(signed), ratioRe: signed['ratio_mag'] * Math.cos(phase), ratioIm: signed['ratio_mag'] * Math.sin(phase) });
    expectWithin({ quantity: 'phase of the cell', unit: 'deg', got: degFromRad(Math.atan2(im, re)), expected: numberIn(check.expected, 'gamma_cell_phase_deg'), tolerance });
  },
  'tm-01': compareSequence,
  'tm-02': compareSequence,
  'tm-03': compareSequence,
  'tm-04': (check) => {
    const { inputs, expected } = check;
    const period = numberIn(inputs, 'period_lambda');
    const delay = numberIn(inputs, 'delay_fraction_per_cell');
    const states = (inputs['states_mag_deg'] as number[][]).map(([magnitude, phaseDeg]) => ({ magnitude, phaseDeg }));
    // The first harmonic is wanted where a delay of that much from cell to cell sends it: u = delay lambda / d.
    const base = testDesign({ frequencyGHz: FREQUENCY_OF_100_MM_GHZ, periodMm: 100 * period, columns: numberIn(inputs, 'cells'), rows: 1, beams: [{ thetaDeg: degFromRad(Math.asin(delay / period)), phiDeg: 0 }], radiateExponent: 0 });
    const design: DesignDocument = { ...base, cells: { kind: 'modulated', states, modulationMHz: 0.001, harmonic: 1 } };
    for (const row of expected['rows'] as Record<string, number>[]) {
      const { figures } = predictDesign(design, { harmonic: row['harmonic'], include: {} });
      const u = Math.sin(radFromDeg(numberOf(figures.peakThetaDeg))) * Math.cos(radFromDeg(numberOf(figures.peakPhiDeg)));
      expectWithin({ quantity: `u of harmonic ${row['harmonic']}`, unit: '', got: u, expected: row['beam_u'], tolerance: toleranceOf(check, 'abs') });
      // All cells have the same strength, so what the peak loses against cells of 1 is the loss of the cells.
      expectWithin({ quantity: `level of harmonic ${row['harmonic']}`, unit: 'dB', got: numberOf(figures.cellLossDb), expected: row['level_dB'], tolerance: toleranceOf(check, 'dB') });
    }
  },
};
