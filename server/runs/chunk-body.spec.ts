import fc from 'fast-check';
import { packPart, unpackPart } from './chunk-body';

describe('parts of runs', () => {
  it('come back bit by bit', () => {
    const double = fc.double({ noNaN: true, noDefaultInfinity: true }).filter((value) => !Object.is(value, -0));
    fc.assert(fc.property(fc.array(double), (numbers) => expect(unpackPart(packPart(numbers))).toEqual(numbers)));
  });
});
