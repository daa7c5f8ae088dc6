import { coPolarResponse, incidenceWeigher } from '../../shared/antenna/cell-response';
import { prepareEdition, type PreparedEdition } from '../../shared/antenna/prepare-edition';
import { assembleEdition } from '../../shared/files/edition-assembly';
import { inspectFamilyFiles } from '../../shared/files/family-import';
import { radFromDeg } from '../../shared/units/angles';
import { cellFilesOf, descriptionOf } from '../support/cell-files';
import { expectWithin } from './expect-within';
import { loadChecks, numberIn, toleranceOf } from './published-check';

/** S11 (TE) and S22 (TM) of checks lib-01 to lib-04 as the scalar model reads them; the whole matrix is checked with the vector model. */
describe('an edition between its nodes, against an independent program on the same files', () => {
  let prepared: PreparedEdition;
  beforeAll(() => {
    const folder = 'square-patch-5-oblique';
    const assembled = assembleEdition(inspectFamilyFiles(cellFilesOf(folder)), descriptionOf(folder));
    if (assembled.kind !== 'edition') throw new Error(JSON.stringify(assembled.messages));
    prepared = prepareEdition(assembled.edition);
  });

  const responseOf = (patchMm: number, point: Record<string, unknown>, share: 0 | 1): number[] => {
    const cell = prepared.edition.cells.findIndex(({ parametersMm }) => Math.abs(parametersMm[0] - patchMm) < 1e-9);
    const weights = incidenceWeigher(prepared, 'x')(radFromDeg(numberIn(point, 'theta')), radFromDeg(numberIn(point, 'phi')));
    weights.shares[0] = 1 - share;
    weights.shares[1] = share;
    const { magnitude, phaseRad } = coPolarResponse(prepared.atFrequency(numberIn(point, 'f_GHz') * 1e9), cell, weights, { magnitude: 0, phaseRad: 0 });
    return [magnitude * Math.cos(phaseRad), magnitude * Math.sin(phaseRad)];
  };

  for (const check of loadChecks().filter(({ id }) => /^lib-0[1-4]$/.test(id))) {
    it(`${check.id}: ${check.what}, TE and TM`, () => {
      for (const point of check.expected['S'] as Record<string, unknown>[]) {
        const { S11, S22 } = point['poly'] as { S11: number[]; S22: number[] };
        const at = `at ${JSON.stringify([point['f_GHz'], point['theta'], point['phi']])}`;
        const patchMm = numberIn(check.inputs, 'patch_mm');
        expectWithin({ quantity: `S11 ${at}`, unit: '', got: responseOf(patchMm, point, 0), expected: S11, tolerance: toleranceOf(check, 'abs') });
        expectWithin({ quantity: `S22 ${at}`, unit: '', got: responseOf(patchMm, point, 1), expected: S22, tolerance: toleranceOf(check, 'abs') });
      }
    });
  }
});
