import { allNodes, matrixSampler, newMatrixSample, type MatrixSample, type ThetaRule } from '../../../shared/antenna/vector/matrix-response';
import { singularValues } from '../../../shared/antenna/vector/scattering';
import { radFromDeg } from '../../../shared/units/angles';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { obliquePatches } from '../vector-panels';

function cellOf(patchMm: number): number {
  return obliquePatches().edition.cells.findIndex(({ parametersMm }) => Math.abs(parametersMm[0] - patchMm) < 1e-9);
}

interface Point {
  readonly frequencyGHz: number;
  readonly thetaDeg: number;
  readonly phiDeg: number;
}

function sampleAt(patchMm: number, { frequencyGHz, thetaDeg, phiDeg }: Point, rule: ThetaRule): MatrixSample {
  const sampler = matrixSampler(obliquePatches(), allNodes(obliquePatches(), frequencyGHz * 1e9), rule);
  sampler.setAngle(radFromDeg(thetaDeg), radFromDeg(phiDeg));
  return sampler.sample(cellOf(patchMm), newMatrixSample());
}

function compareMatrix(check: PublishedCheck): void {
  for (const point of check.expected['S'] as Record<string, unknown>[]) {
    const at = { frequencyGHz: numberIn(point, 'f_GHz'), thetaDeg: numberIn(point, 'theta'), phiDeg: numberIn(point, 'phi') };
    for (const rule of ['poly', 'linear'] as const) {
      const s = sampleAt(numberIn(check.inputs, 'patch_mm'), at, rule);
      const wanted = point[rule] as Record<string, unknown>;
      const got = [s.s11Re, s.s11Im, s.s22Re, s.s22Im, s.s12Re, s.s12Im, s.s21Re, s.s21Im];
      const expected = ['S11', 'S22', 'S12', 'S12'].flatMap((name) => numbersIn(wanted, name));
      expectWithin({ quantity: `${rule} at ${JSON.stringify(at)}`, unit: '', got, expected, tolerance: toleranceOf(check, 'abs') });
    }
  }
}

export const cellMatrixChecks: CheckTable = {
  'lib-01': compareMatrix,
  'lib-02': compareMatrix,
  'lib-03': compareMatrix,
  'lib-04': compareMatrix,
  'lib-05': (check) => {
    const patchMm = numberIn(check.inputs, 'patch_mm');
    const point = { frequencyGHz: numberIn(check.inputs, 'f_GHz'), thetaDeg: numberIn(check.inputs, 'theta'), phiDeg: numberIn(check.inputs, 'phi') };
    const s = sampleAt(patchMm, point, 'poly');
    const turned = sampleAt(patchMm, { ...point, phiDeg: point.phiDeg + 180 }, 'poly');
    const tolerance = toleranceOf(check, 'abs');
    const keys = Object.keys(s) as (keyof MatrixSample)[];
    const moved = Math.max(...keys.map((key) => Math.abs(s[key] - turned[key])));
    expectWithin({ quantity: 'half a turn', unit: '', got: moved, expected: numberIn(check.expected, 'max_abs_S_phi_plus_180_minus_S'), tolerance });
    expectWithin({ quantity: 'S12 - S21', unit: '', got: Math.hypot(s.s12Re - s.s21Re, s.s12Im - s.s21Im), expected: numberIn(check.expected, 'S12_minus_S21_abs'), tolerance });
    const values = singularValues({
      s11: { re: s.s11Re, im: s.s11Im },
      s12: { re: s.s12Re, im: s.s12Im },
      s21: { re: s.s21Re, im: s.s21Im },
      s22: { re: s.s22Re, im: s.s22Im },
    });
    expectWithin({ quantity: 'singular values', unit: '', got: values, expected: numbersIn(check.expected, 'singular_values'), tolerance });
  },
};
