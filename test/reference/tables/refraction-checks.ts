import { outgoingWave, type OutgoingWave, type SurfacePhase } from '../../../shared/waves/refraction';
import { wavenumberRadPerM } from '../../../shared/waves/conventions';
import { degFromRad, radFromDeg } from '../../../shared/units/angles';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';

/** Gradients of the checks are in degrees per millimetre. */
const RAD_PER_M = radFromDeg(1) * 1e3;

function propagating(wave: OutgoingWave): Extract<OutgoingWave, { kind: 'propagating' }> {
  if (wave.kind !== 'propagating') throw new Error(`evanescent with ${wave.magnitude} where a beam was expected`);
  return wave;
}

function surfaceOf({ inputs }: PublishedCheck): SurfacePhase {
  const thetaRad = radFromDeg(numberIn(inputs, 'theta_i_deg'));
  const phiRad = radFromDeg(typeof inputs['phi_i_deg'] === 'number' ? inputs['phi_i_deg'] : 0);
  const index = numberIn(inputs, 'n1');
  return {
    incident: { u: index * Math.sin(thetaRad) * Math.cos(phiRad), v: index * Math.sin(thetaRad) * Math.sin(phiRad) },
    gradientXRadPerM: numberIn(inputs, 'dphi_dx_deg_per_mm') * RAD_PER_M,
    gradientYRadPerM: numberIn(inputs, 'dphi_dy_deg_per_mm') * RAD_PER_M,
    wavenumberRadPerM: wavenumberRadPerM(numberIn(inputs, 'f_GHz') * 1e9),
    outgoingIndex: numberIn(inputs, 'n2'),
  };
}

/** The incidence at which the refracted or reflected wave just stops travelling: bisection on the law itself. */
function criticalDeg(travelsAt: (thetaDeg: number) => boolean, insideDeg: number, outsideDeg: number): number {
  let [inside, outside] = [insideDeg, outsideDeg];
  for (let i = 0; i < 60; i++) {
    const middle = (inside + outside) / 2;
    if (travelsAt(middle)) inside = middle;
    else outside = middle;
  }
  return (inside + outside) / 2;
}

export const refractionChecks: CheckTable = {
  'gsl-01': (check) => {
    const lambdaM = numberIn(check.inputs, 'lambda_um') * 1e-6;
    const got = numbersIn(check.inputs, 'supercell_um').map((cellUm) => {
      const gradientXRadPerM = (-2 * Math.PI) / (cellUm * 1e-6);
      const wave = outgoingWave({ incident: { u: 0, v: 0 }, gradientXRadPerM, gradientYRadPerM: 0, wavenumberRadPerM: (2 * Math.PI) / lambdaM, outgoingIndex: 1 });
      return degFromRad(propagating(wave).thetaRad);
    });
    expectWithin({ quantity: 'deflection', unit: 'deg', got, expected: numbersIn(check.expected, 'theta_deg'), tolerance: toleranceOf(check, 'abs_deg') });
  },
  'gsl-02': (check) => {
    const index = numberIn(check.inputs, 'n_i');
    const ratio = numberIn(check.inputs, 'lambda_um') / numberIn(check.inputs, 'supercell_um');
    const travels = (outgoingIndex: number) => (thetaDeg: number): boolean =>
      outgoingWave({ incident: { u: index * Math.sin(radFromDeg(thetaDeg)), v: 0 }, gradientXRadPerM: -ratio, gradientYRadPerM: 0, wavenumberRadPerM: 1, outgoingIndex }).kind === 'propagating';
    const refracted = travels(numberIn(check.inputs, 'n_t'));
    const got = {
      theta_c_plus_deg: criticalDeg(refracted, 0, 60),
      theta_c_minus_deg: criticalDeg(refracted, 0, -60),
      theta_c_reflection_deg: criticalDeg(travels(index), 0, 90),
    };
    for (const [quantity, value] of Object.entries(got)) {
      expectWithin({ quantity, unit: 'deg', got: value, expected: numberIn(check.expected, quantity), tolerance: toleranceOf(check, 'abs_deg') });
    }
  },
  'gsl-03': (check) => {
    const wave = propagating(outgoingWave(surfaceOf(check)));
    const tolerance = toleranceOf(check, 'abs_deg');
    expectWithin({ quantity: 'theta', unit: 'deg', got: degFromRad(wave.thetaRad), expected: numberIn(check.expected, 'theta_deg'), tolerance });
    expectWithin({ quantity: 'phi', unit: 'deg', got: degFromRad(wave.phiRad), expected: numberIn(check.expected, 'phi_deg'), tolerance });
    expectWithin({ quantity: 'u', unit: '', got: wave.tangential.u, expected: numberIn(check.expected, 'u'), tolerance });
    expectWithin({ quantity: 'v', unit: '', got: wave.tangential.v, expected: numberIn(check.expected, 'v'), tolerance });
  },
  'gsl-04': (check) => {
    const wave = outgoingWave(surfaceOf(check));
    if (wave.kind !== 'evanescent') throw new Error('a beam was reported where none travels');
    const got = { u: wave.tangential.u, v: wave.tangential.v, uv_radius: wave.magnitude };
    for (const [quantity, value] of Object.entries(got)) {
      expectWithin({ quantity, unit: '', got: value, expected: numberIn(check.expected, quantity), tolerance: toleranceOf(check, 'abs') });
    }
  },
  'gsl-05': (check) => {
    const wave = propagating(outgoingWave(surfaceOf(check)));
    const tolerance = toleranceOf(check, 'abs_deg');
    expectWithin({ quantity: 'theta', unit: 'deg', got: degFromRad(wave.thetaRad), expected: numberIn(check.expected, 'theta_t_deg'), tolerance });
    expectWithin({ quantity: 'phi', unit: 'deg', got: degFromRad(wave.phiRad), expected: numberIn(check.expected, 'phi_t_deg'), tolerance });
    expectWithin({ quantity: 'n2 sin x', unit: '', got: wave.tangential.u, expected: numberIn(check.expected, 'n2_sin_x'), tolerance: 1e-5 });
    expectWithin({ quantity: 'n2 sin y', unit: '', got: wave.tangential.v, expected: numberIn(check.expected, 'n2_sin_y'), tolerance: 1e-6 });
  },
};
