import type { Polarisation } from '../../model/design-document';
import { crossProduct, unitAcross, type ComplexVector, type Vector3 } from './vector-three';

const X_AXIS: Vector3 = [1, 0, 0];
const Y_AXIS: Vector3 = [0, 1, 0];
const NOTHING: Vector3 = [0, 0, 0];

/**
 * Unit vector of the electric field of a wave that travels along `travel`: x or y less its part along the travel; rhcp
 * (x' - j travel x x')/sqrt 2 with x' the vector of x, lhcp its conjugate (IEEE sense, exp(+j omega t)). For a skew travel the vectors of
 * x and y are not exactly orthogonal: each is the projection of its own axis.
 */
export function polarisationVector(travel: Vector3, polarisation: Polarisation): ComplexVector {
  if (polarisation === 'x' || polarisation === 'y') return { re: unitAcross(polarisation === 'x' ? X_AXIS : Y_AXIS, travel), im: NOTHING };
  const first = unitAcross(X_AXIS, travel);
  const second = crossProduct(travel, first);
  const turn = polarisation === 'rhcp' ? -Math.SQRT1_2 : Math.SQRT1_2;
  return {
    re: [first[0] * Math.SQRT1_2, first[1] * Math.SQRT1_2, first[2] * Math.SQRT1_2],
    im: [second[0] * turn, second[1] * turn, second[2] * turn],
  };
}
