import { directivityRatio, directivityRatioAt } from '../../../shared/antenna/radiation-pattern';
import { hemisphereKernel } from '../../../shared/antenna/hemisphere-kernel';
import { refinePeak } from '../../../shared/antenna/refine-peak';
import { powerRatioToDb } from '../../../shared/units/decibels';
import { degFromRad } from '../../../shared/units/angles';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { beamAt, cutThrough, numberOf, steeringPhase, testPattern, type TestArray } from '../test-arrays';

const BROADSIDE = beamAt(0, 0);

/** A line of isotropic elements along x; symmetric to the panel plane, so the full sphere holds twice the hemisphere. */
function line(check: PublishedCheck, weight?: (column: number) => number): TestArray {
  return { columns: numberIn(check.inputs, 'N'), rows: 1, stepX: numberIn(check.inputs, 'd_lambda'), stepY: 1, weight };
}

const fullSphereDirectivity = (array: TestArray): number => directivityRatio(testPattern(array), BROADSIDE) / 2;

/** Weights from the edge to the centre, mirrored. */
const mirrored = (edgeToCentre: readonly number[], count: number) => (column: number): number => edgeToCentre[Math.min(column, count - 1 - column)];

function compareLine(check: PublishedCheck, array: TestArray, names: { sidelobe?: string }): void {
  const metrics = cutThrough(testPattern(array), BROADSIDE, 'along', 8000);
  const width = numberOf(metrics.halfPowerBeamwidthDeg);
  expectWithin({ quantity: 'half-power beamwidth', unit: 'deg', got: width, expected: numberIn(check.expected, 'hpbw_deg'), tolerance: toleranceOf(check, 'hpbw_deg') });
  if (names.sidelobe === undefined) return;
  expectWithin({ quantity: 'sidelobe', unit: 'dB', got: numberOf(metrics.sidelobeDb), expected: numberIn(check.expected, names.sidelobe), tolerance: toleranceOf(check, 'sll_dB') });
}

const binomial = (n: number) => (k: number): number => {
  let value = 1;
  for (let i = 0; i < k; i++) value = (value * (n - i)) / (i + 1);
  return value;
};

function square(check: PublishedCheck, more: Partial<TestArray> = {}): TestArray {
  const step = numberIn(check.inputs, 'd_lambda');
  return { columns: numberIn(check.inputs, 'nx'), rows: numberIn(check.inputs, 'ny'), stepX: step, stepY: step, ...more };
}

function comparePlanar(check: PublishedCheck): void {
  const pattern = testPattern(square(check), numberIn(check.inputs, 'm'));
  const metrics = cutThrough(pattern, BROADSIDE, 'along');
  const directivity = powerRatioToDb(directivityRatio(pattern, BROADSIDE));
  expectWithin({ quantity: 'directivity', unit: 'dBi', got: directivity, expected: numberIn(check.expected, 'D_dBi'), tolerance: toleranceOf(check, 'dB') });
  expectWithin({ quantity: 'half-power beamwidth', unit: 'deg', got: numberOf(metrics.halfPowerBeamwidthDeg), expected: numberIn(check.expected, 'hpbw_deg'), tolerance: toleranceOf(check, 'hpbw_deg') });
  expectWithin({ quantity: 'sidelobe', unit: 'dB', got: numberOf(metrics.sidelobeDb), expected: numberIn(check.expected, 'sll_dB'), tolerance: toleranceOf(check, 'sll_dB') });
}

const CHEBYSHEV_26 = [1, 1.357052, 1.970911, 2.482994, 2.77454];

export const arrayChecks: CheckTable = {
  'lin-01': (check) => {
    compareLine(check, line(check), { sidelobe: 'sll_dB' });
    expectWithin({ quantity: 'directivity', unit: '', got: fullSphereDirectivity(line(check)), expected: numberIn(check.expected, 'directivity'), tolerance: toleranceOf(check, 'directivity') });
  },
  'lin-02': (check) => {
    compareLine(check, line(check), {});
    const got = fullSphereDirectivity(line(check));
    const expected = numberIn(check.expected, 'directivity');
    expectWithin({ quantity: 'directivity', unit: '', got, expected, tolerance: toleranceOf(check, 'rel') * expected });
    expectWithin({ quantity: 'directivity', unit: 'dBi', got: powerRatioToDb(got), expected: numberIn(check.expected, 'directivity_dBi'), tolerance: 1e-5 });
  },
  'lin-03': (check) => {
    const array = line(check, binomial(numberIn(check.inputs, 'N') - 1));
    compareLine(check, array, {});
    const expected = numberIn(check.expected, 'directivity');
    expectWithin({ quantity: 'directivity', unit: '', got: fullSphereDirectivity(array), expected, tolerance: toleranceOf(check, 'rel') * expected });
  },
  'cheb-01': (check) => {
    const array = line(check, mirrored(numbersIn(check.expected, 'weights_edge_to_centre'), numberIn(check.inputs, 'N')));
    compareLine(check, array, { sidelobe: 'sll_dB' });
    expectWithin({ quantity: 'directivity', unit: 'dBi', got: powerRatioToDb(fullSphereDirectivity(array)), expected: numberIn(check.expected, 'directivity_dBi'), tolerance: toleranceOf(check, 'dB') });
  },
  'cheb-02': (check) => {
    const weights = numbersIn(check.expected, 'weights_edge_to_centre');
    const array = line(check, mirrored(weights, numberIn(check.inputs, 'N')));
    compareLine(check, array, {});
    const sum = weights.reduce((total, weight) => total + weight, 0);
    const squares = weights.reduce((total, weight) => total + weight * weight, 0);
    expectWithin({ quantity: 'taper efficiency', unit: '', got: (sum * sum) / (weights.length * squares), expected: numberIn(check.expected, 'taper_efficiency'), tolerance: 1e-5 });
    expectWithin({ quantity: 'directivity', unit: 'dBi', got: powerRatioToDb(fullSphereDirectivity(array)), expected: numberIn(check.expected, 'directivity_dBi'), tolerance: toleranceOf(check, 'dB') });
  },
  'taylor-01': (check) => {
    compareLine(check, line(check, mirrored(numbersIn(check.expected, 'weights_edge_to_centre'), numberIn(check.inputs, 'N'))), { sidelobe: 'sll_dB_actual' });
  },
  'planar-01': (check) => {
    const beam = beamAt(numberIn(check.inputs, 'theta_deg'), numberIn(check.inputs, 'phi_deg'));
    const factor = mirrored(CHEBYSHEV_26, 10);
    const array = square(check, { weight: (column, row) => factor(column) * factor(row), phase: steeringPhase(beam) });
    const isotropic = testPattern(array);
    const cosine = testPattern(array, 1);
    const peak = refinePeak(cosine, beam.u, beam.v);
    const got = {
      D_dBi_isotropic_full_sphere: powerRatioToDb(directivityRatio(isotropic, beam) / 2),
      D_dBi_isotropic_half_space: powerRatioToDb(directivityRatio(isotropic, beam)),
      D_dBi_cos_power_element_at_design: powerRatioToDb(directivityRatio(cosine, beam)),
      D_dBi_cos_power_element_peak: powerRatioToDb(peak.directivityRatio),
    };
    for (const [quantity, value] of Object.entries(got)) {
      expectWithin({ quantity, unit: 'dBi', got: value, expected: numberIn(check.expected, quantity), tolerance: toleranceOf(check, 'dB') });
    }
    const widths = { hpbw_el_deg_isotropic: 'along', hpbw_ax_deg_isotropic: 'across' } as const;
    for (const [quantity, plane] of Object.entries(widths)) {
      const width = numberOf(cutThrough(isotropic, beam, plane).halfPowerBeamwidthDeg);
      expectWithin({ quantity, unit: 'deg', got: width, expected: numberIn(check.expected, quantity), tolerance: toleranceOf(check, 'hpbw_deg') });
    }
  },
  'planar-02': comparePlanar,
  'planar-03': comparePlanar,
  'planar-04': (check) => {
    const beam = beamAt(numberIn(check.inputs, 'theta_deg'), numberIn(check.inputs, 'phi_deg'));
    const pattern = testPattern(square(check, { phase: steeringPhase(beam) }), numberIn(check.inputs, 'm'));
    const peak = refinePeak(pattern, beam.u, beam.v);
    const along = cutThrough(pattern, beam, 'along');
    const across = cutThrough(pattern, beam, 'across');
    const rows: [string, string, number, string][] = [
      ['D_dBi_at_design', 'dBi', powerRatioToDb(directivityRatio(pattern, beam)), 'dB'],
      ['D_dBi_peak', 'dBi', powerRatioToDb(peak.directivityRatio), 'dB'],
      ['peak_theta_deg', 'deg', degFromRad(Math.asin(Math.hypot(peak.u, peak.v))), 'peak_deg'],
      ['hpbw_el_deg', 'deg', numberOf(along.halfPowerBeamwidthDeg), 'hpbw_deg'],
      ['hpbw_ax_deg', 'deg', numberOf(across.halfPowerBeamwidthDeg), 'hpbw_deg'],
      ['sll_el_dB', 'dB', numberOf(along.sidelobeDb), 'sll_dB'],
    ];
    for (const [quantity, unit, got, tolerance] of rows) {
      expectWithin({ quantity, unit, got, expected: numberIn(check.expected, quantity), tolerance: toleranceOf(check, tolerance) });
    }
  },
  'planar-05': (check) => {
    const got = numbersIn(check.inputs, 'm').map((m) => directivityRatio(testPattern({ columns: 1, rows: 1, stepX: 1, stepY: 1 }, m), BROADSIDE));
    expectWithin({ quantity: 'directivity of one element', unit: '', got, expected: numbersIn(check.expected, 'D'), tolerance: toleranceOf(check) });
  },
  'planar-06': (check) => {
    for (const m of numbersIn(check.inputs, 'm')) {
      const got = numbersIn(check.inputs, 'z').map((z) => hemisphereKernel(m, z));
      expectWithin({ quantity: `kernel m = ${m}`, unit: 'sr', got, expected: numbersIn(check.expected, `m${m}`), tolerance: toleranceOf(check, 'abs') });
    }
  },
  'planar-07': (check) => {
    const m = numberIn(check.inputs, 'm');
    const thetas = numbersIn(check.inputs, 'theta_deg');
    const directivities: number[] = [];
    const forgotten: number[] = [];
    for (const thetaDeg of thetas) {
      const beam = beamAt(thetaDeg, 0);
      const pattern = testPattern(square(check, { phase: steeringPhase(beam) }), m);
      directivities.push(powerRatioToDb(directivityRatio(pattern, beam)));
      forgotten.push(powerRatioToDb(powerWithoutJacobian(pattern) / pattern.radiatedPower));
    }
    expectWithin({ quantity: 'directivity', unit: 'dBi', got: directivities, expected: numbersIn(check.expected, 'D_dBi'), tolerance: toleranceOf(check, 'dB') });
    expectWithin({ quantity: 'error without the Jacobian', unit: 'dB', got: forgotten, expected: numbersIn(check.expected, 'error_dB_of_P_if_jacobian_forgotten'), tolerance: toleranceOf(check, 'dB') });
  },
};

/** What the power would be if du dv were taken for solid angle: a plain midpoint sum over the disc in polar form. */
function powerWithoutJacobian(pattern: ReturnType<typeof testPattern>): number {
  const [radii, angles] = [150, 180];
  let sum = 0;
  for (let i = 0; i < radii; i++) {
    const rho = (i + 0.5) / radii;
    for (let j = 0; j < angles; j++) {
      const angle = (2 * Math.PI * j) / angles;
      sum += directivityRatioAt(pattern, rho * Math.cos(angle), rho * Math.sin(angle)) * rho;
    }
  }
  return (sum * pattern.radiatedPower) / (4 * Math.PI) / radii * ((2 * Math.PI) / angles);
}
