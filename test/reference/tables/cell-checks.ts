import { hornSampler } from '../../../shared/antenna/horn-field';
import { gridReflection, zeroPhaseFrequency, type PatchGrid } from '../../../shared/antenna/grid-model';
import { derivedValues } from '../../../shared/antenna/derived-values';
import { curveOverFrequency } from '../../../shared/antenna/response-curve';
import { prepareEdition } from '../../../shared/antenna/prepare-edition';
import { elementPower } from '../../../shared/antenna/radiation-pattern';
import { readTouchstone } from '../../../shared/files/touchstone-reader';
import { gaussLegendre } from '../../../shared/math/quadrature';
import type { CellEdition } from '../../../shared/model/cell-family';
import { degFromRad, radFromDeg } from '../../../shared/units/angles';
import { amplitudeRatioToDb, powerRatioToDb } from '../../../shared/units/decibels';
import { descriptionOf } from '../../support/cell-files';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { beamAt, numberOf, steeringPhase, testPattern } from '../test-arrays';
import { hornAt, testDesign } from '../test-designs';

function gridOf({ inputs }: PublishedCheck): PatchGrid {
  return {
    periodM: numberIn(inputs, 'D_mm') * 1e-3,
    gapM: numberIn(inputs, 'gap_mm') * 1e-3,
    thicknessM: numberIn(inputs, 'h_mm') * 1e-3,
    relativePermittivity: numberIn(inputs, 'eps_r'),
    lossTangent: typeof inputs['tan_delta'] === 'number' ? inputs['tan_delta'] : 0,
  };
}

function compareZeroPhase(check: PublishedCheck): void {
  const at = (thetaDeg: number, polarisation: 'te' | 'tm'): number => {
    const found = zeroPhaseFrequency(gridOf(check), radFromDeg(thetaDeg), polarisation);
    if (found.kind !== 'found') throw new Error('no zero of the phase');
    return found.frequencyHz / 1e9;
  };
  const got = { f0_GHz: at(0, 'te'), f0_TE45_GHz: at(45, 'te'), f0_TM45_GHz: at(45, 'tm') };
  for (const [quantity, value] of Object.entries(got)) {
    expectWithin({ quantity, unit: 'GHz', got: value, expected: numberIn(check.expected, quantity), tolerance: toleranceOf(check, 'GHz') });
  }
}

const phaseDeg = ({ re, im }: { re: number; im: number }): number => degFromRad(Math.atan2(im, re));

/** One lossless cell given at two frequencies with a phase step between them. */
function twoPointEdition(stepDeg: number): CellEdition {
  const step = radFromDeg(stepDeg);
  const entry = (rad: number): number[] => [Math.cos(rad), Math.sin(rad), 0, 0, 0, 0, Math.cos(rad), Math.sin(rad)];
  return {
    description: descriptionOf('four-state-5'),
    cells: [{ id: 'one', parametersMm: [1], fileHashes: [] }],
    responses: {
      cellCount: 1,
      frequenciesHz: Float64Array.of(27e9, 29e9),
      thetasRad: Float64Array.of(0),
      phisRad: Float64Array.of(0),
      values: Float64Array.from([...entry(0), ...entry(-step)]),
      present: Uint8Array.of(1, 1),
    },
  };
}

export const cellChecks: CheckTable = {
  'his-01': compareZeroPhase,
  'his-02': compareZeroPhase,
  'his-03': (check) => {
    const frequencyHz = numberIn(check.inputs, 'f_GHz') * 1e9;
    const at = (thetaDeg: number, polarisation: 'te' | 'tm'): number => phaseDeg(gridReflection(gridOf(check), { frequencyHz, thetaRad: radFromDeg(thetaDeg), polarisation }));
    const got = { normal_deg: at(0, 'te'), TE30_deg: at(30, 'te'), TM30_deg: at(30, 'tm') };
    for (const [quantity, value] of Object.entries(got)) {
      expectWithin({ quantity, unit: 'deg', got: value, expected: numberIn(check.expected, quantity), tolerance: toleranceOf(check, 'deg') });
    }
  },
  'his-04': (check) => {
    const { re, im } = gridReflection(gridOf(check), { frequencyHz: numberIn(check.inputs, 'f_GHz') * 1e9, thetaRad: 0, polarisation: 'te' });
    expectWithin({ quantity: 'loss', unit: 'dB', got: amplitudeRatioToDb(Math.hypot(re, im)), expected: numberIn(check.expected, 'mag_dB'), tolerance: toleranceOf(check, 'dB') });
  },
  'his-05': (check) => {
    // Gaps almost as wide as the period: the patches vanish.
    const grid = { periodM: 5e-3, gapM: 5e-3 * (1 - 1e-9), thicknessM: numberIn(check.inputs, 'h_mm') * 1e-3, relativePermittivity: numberIn(check.inputs, 'eps_r'), lossTangent: 0 };
    const got = phaseDeg(gridReflection(grid, { frequencyHz: numberIn(check.inputs, 'f_GHz') * 1e9, thetaRad: 0, polarisation: 'te' }));
    expectWithin({ quantity: 'phase of the bare slab', unit: 'deg', got, expected: numberIn(check.expected, 'phase_deg'), tolerance: toleranceOf(check, 'deg') });
  },
  'interp-01': (check) => {
    // The dip is what interpolating complex numbers would cost; the product shows none of it.
    const steps = numbersIn(check.inputs, 'dphi_deg');
    const chord = steps.map((step) => amplitudeRatioToDb(Math.hypot(1 + Math.cos(radFromDeg(step)), Math.sin(radFromDeg(step))) / 2));
    expectWithin({ quantity: 'dip of the chord', unit: 'dB', got: chord, expected: numbersIn(check.expected, 'dip_dB'), tolerance: toleranceOf(check, 'dB') });
    for (const step of steps) {
      const prepared = prepareEdition(twoPointEdition(step));
      const middle = prepared.atFrequency(28e9);
      expectWithin({ quantity: `magnitude half way over ${step} deg`, unit: 'Np', got: middle.logMagnitude[0], expected: 0, tolerance: 1e-12 });
      expectWithin({ quantity: `phase half way over ${step} deg`, unit: 'deg', got: degFromRad(middle.phaseRad[0]), expected: -step / 2, tolerance: 1e-9 });
      const curve = curveOverFrequency(prepared, { cellIndex: 0, frequencyGHz: 28, incidenceDeg: 0, azimuthDeg: 0, polarisation: 'first' });
      expectWithin({ quantity: 'curve at its ends', unit: 'deg', got: Array.from(curve.phaseDeg), expected: [0, -step], tolerance: 1e-9 });
    }
  },
  'ts-01': (check) => {
    const texts = { v1: String(check.inputs['v1']), v2_12_21: String(check.inputs['v2_12_21']), v2_21_12: String(check.inputs['v2_12_21']).replace('12_21', '21_12') };
    for (const [form, text] of Object.entries(texts)) {
      const result = readTouchstone(Uint8Array.from(text, (sign) => sign.charCodeAt(0)), 'order.s2p');
      if (result.kind !== 'read') throw new Error(`${form} was refused: ${JSON.stringify(result.messages)}`);
      const [s11, , s12, , s21, , s22] = result.data.values;
      const expected = check.expected[form] as Record<string, number>;
      const order = ['S11', 'S12', 'S21', 'S22'] as const;
      expectWithin({ quantity: form, unit: '', got: [s11, s12, s21, s22], expected: order.map((name) => expected[name]), tolerance: toleranceOf(check) });
    }
  },
  'far-01': (check) => {
    const frequencyGHz = numberIn(check.inputs, 'f_GHz');
    const periodMm = 299.792458 / frequencyGHz / 2;
    const count = numberIn(check.inputs, 'n');
    const { farFieldDistanceM } = derivedValues(testDesign({ frequencyGHz, periodMm, columns: count, rows: count }));
    const expected = numberIn(check.expected, 'R_diagonal_m');
    expectWithin({ quantity: 'far-field distance, diagonal', unit: 'm', got: farFieldDistanceM, expected, tolerance: toleranceOf(check, 'rel') * expected });
    const side = numberIn(check.expected, 'R_side_m');
    expectWithin({ quantity: 'half of it, the side', unit: 'm', got: farFieldDistanceM / 2, expected: side, tolerance: toleranceOf(check, 'rel') * side });
  },
  'feed-06': (check) => {
    const exponents = numbersIn(check.inputs, 'q');
    const derived = exponents.map((q) => derivedValues(testDesign({ frequencyGHz: 10, periodMm: 15, columns: 4, rows: 4, illumination: hornAt([0, 0, 100], q) })));
    expectWithin({ quantity: 'gain', unit: 'dBi', got: derived.map((values) => numberOf(values.hornGainDbi)), expected: numbersIn(check.expected, 'gain_dBi'), tolerance: toleranceOf(check, 'dB') });
    expectWithin({ quantity: 'half-power width', unit: 'deg', got: derived.map((values) => numberOf(values.hornBeamwidthDeg.e)), expected: numbersIn(check.expected, 'hpbw_deg'), tolerance: toleranceOf(check, 'deg') });
    expectWithin({ quantity: '-10 dB half width', unit: 'deg', got: exponents.map(tenDbHalfWidthDeg), expected: numbersIn(check.expected, 'half_width_minus10dB_deg'), tolerance: toleranceOf(check, 'deg') });
  },
  'nec-01': (check) => {
    const beam = beamAt(numberIn(check.inputs, 'theta_deg'), numberIn(check.inputs, 'phi_deg'));
    const step = numberIn(check.inputs, 'd_lambda');
    const pattern = testPattern({ columns: numberIn(check.inputs, 'nx'), rows: numberIn(check.inputs, 'ny'), stepX: step, stepY: step, phase: steeringPhase(beam) });
    const heightRad = 2 * Math.PI * numberIn(check.inputs, 'height_lambda');
    // The array factor is the product's; the dipole over its ground is the check's own element.
    const power = (u: number, v: number, w: number): number => pattern.farField.powerAt(u, v) * (1 - v * v) * 4 * Math.sin(heightRad * w) ** 2 * elementPower(w, 0);
    const total = hemisphereIntegral(power);
    let best = { thetaDeg: 0, power: 0 };
    for (let thetaDeg = 10; thetaDeg <= 20; thetaDeg += 0.001) {
      const theta = radFromDeg(thetaDeg);
      const value = power(Math.sin(theta), 0, Math.cos(theta));
      if (value > best.power) best = { thetaDeg, power: value };
    }
    expectWithin({ quantity: 'directivity', unit: 'dBi', got: powerRatioToDb((4 * Math.PI * best.power) / total), expected: numberIn(check.expected, 'D_dBi'), tolerance: toleranceOf(check, 'dB') });
    expectWithin({ quantity: 'peak', unit: 'deg', got: best.thetaDeg, expected: numberIn(check.expected, 'peak_theta_deg'), tolerance: toleranceOf(check, 'deg') });
  },
};

/** Where the horn of exponent q has fallen to a tenth in power: bisection on its field on a sphere. */
function tenDbHalfWidthDeg(q: number): number {
  const sampleAt = hornSampler({ kind: 'horn', position: { xM: 0, yM: 0, zM: 1 }, aim: { xM: 0, yM: 0, zM: 0 }, exponentE: q, exponentH: q, polarisation: 'x' });
  let [inside, outside] = [0, 89];
  for (let i = 0; i < 60; i++) {
    const middle = (inside + outside) / 2;
    const sample = sampleAt(Math.tan(radFromDeg(middle)), 0);
    if ((sample.field * sample.distanceM) ** 2 > 0.1) inside = middle;
    else outside = middle;
  }
  return (inside + outside) / 2;
}

/** Gauss-Legendre in cos theta, even steps in phi. */
function hemisphereIntegral(f: (u: number, v: number, w: number) => number): number {
  const rule = gaussLegendre(120);
  const turns = 240;
  let sum = 0;
  for (let i = 0; i < rule.nodes.length; i++) {
    const w = (rule.nodes[i] + 1) / 2;
    const sine = Math.sqrt(1 - w * w);
    for (let j = 0; j < turns; j++) {
      const phi = (2 * Math.PI * j) / turns;
      sum += (rule.weights[i] / 2) * f(sine * Math.cos(phi), sine * Math.sin(phi), w);
    }
  }
  return (sum * 2 * Math.PI) / turns;
}
