import { directionOf } from '../../../shared/waves/conventions';
import { circularComponents, crossPolarDiscriminationDb, ludwig3X, ludwig3Y, type Complex } from '../../../shared/waves/polarisation';
import { radFromDeg } from '../../../shared/units/angles';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';

const real = (re: number): Complex => ({ re, im: 0 });
const magnitude = ({ re, im }: Complex): number => Math.hypot(re, im);

function compare(check: PublishedCheck, unit: string, got: Record<string, number>): void {
  for (const [quantity, value] of Object.entries(got)) {
    expectWithin({ quantity, unit, got: value, expected: numberIn(check.expected, quantity), tolerance: toleranceOf(check) });
  }
}

export const conventionsChecks: CheckTable = {
  'conv-01': (check) => {
    const { u, v, w } = directionOf(radFromDeg(numberIn(check.inputs, 'theta_deg')), radFromDeg(numberIn(check.inputs, 'phi_deg')));
    compare(check, '', { u, v, w });
  },
  'conv-02': (check) => {
    const field = { theta: real(numberIn(check.inputs, 'E_theta')), phi: real(numberIn(check.inputs, 'E_phi')) };
    const phiRad = radFromDeg(numberIn(check.inputs, 'phi_deg'));
    const x = ludwig3X(field, phiRad);
    const y = ludwig3Y(field, phiRad);
    compare(check, '', { co_xref: x.co.re, cross_xref: x.cross.re, co_yref: y.co.re, cross_yref: y.cross.re });
  },
  'conv-03': (check) => {
    const [thetaRe, thetaIm] = numbersIn(check.inputs, 'E_theta');
    const [phiRe, phiIm] = numbersIn(check.inputs, 'E_phi');
    const { right, left } = circularComponents({ theta: { re: thetaRe, im: thetaIm }, phi: { re: phiRe, im: phiIm } });
    compare(check, '', { abs_E_R: magnitude(right), abs_E_L: magnitude(left) });
  },
  'pol-01': (check) => {
    const got = numbersIn(check.inputs, 'AR_dB').map(crossPolarDiscriminationDb);
    expectWithin({ quantity: 'cross-polar discrimination', unit: 'dB', got, expected: numbersIn(check.expected, 'XPD_dB'), tolerance: toleranceOf(check, 'dB') });
  },
};
