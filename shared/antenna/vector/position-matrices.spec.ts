import * as fc from 'fast-check';
import { exampleEdition } from '../example-edition';
import { prepareEdition } from '../prepare-edition';
import { allNodes, matrixSampler, newMatrixSample } from './matrix-response';
import { listPositionMatrices, readMatrix } from './position-matrices';

const prepared = prepareEdition(exampleEdition());
const sampler = matrixSampler(prepared, allNodes(prepared, 10.2e9));
const incidenceRad = Float64Array.of(0, 0.3, 0.7, 1);
const azimuthRad = Float64Array.of(0, 1.2, -2, 3);
const allowed = Int32Array.of(1, 2, 5, 23);
const listed = listPositionMatrices({ sampler, incidenceRad, azimuthRad, allowed, cellCount: 24 }, newMatrixSample());

describe('matrices listed by position', () => {
  it('gives every cell at every position what the sampler gives there, bit for bit', () => {
    fc.assert(
      fc.property(fc.nat({ max: 3 }), fc.constantFrom(...allowed), (n, cell) => {
        sampler.setAngle(incidenceRad[n], azimuthRad[n]);
        expect(readMatrix(listed, n, cell, newMatrixSample())).toEqual(sampler.sample(cell, newMatrixSample()));
      }),
    );
  });

  it('refuses a cell that may not be used', () => {
    expect(() => readMatrix(listed, 0, 3, newMatrixSample())).toThrow('cell 3 is not among those listed');
  });
});
