import type { Direction } from '../waves/conventions';
import type { SiHorn, SiPosition } from './si-design';

/** What a horn gives at one point of the panel plane. Reused between calls: read it before asking again. */
export interface HornSample {
  /** Field of the horn: its pattern over the distance, 1/m; 0 behind the horn. */
  field: number;
  /** From the phase centre. */
  distanceM: number;
  /** Cosine of the angle of incidence on the panel. */
  cosIncidence: number;
  /** Azimuth of the direction of travel. */
  azimuthRad: number;
}

type Vector = readonly [number, number, number];

const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const scaled = (a: Vector, s: number): Vector => [a[0] * s, a[1] * s, a[2] * s];
const minus = (a: Vector, b: Vector): Vector => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
const unit = (a: Vector): Vector => scaled(a, 1 / Math.hypot(...a));
const vectorOf = (p: SiPosition): Vector => [p.xM, p.yM, p.zM];

/** Unit vector of the horn's axis, from its phase centre to its aim. */
export function hornAxis(horn: SiHorn): Vector {
  return unit(minus(vectorOf(horn.aim), vectorOf(horn.position)));
}

/**
 * Unit vector of the horn's E plane across its axis: x or y less its part along the axis. For circular
 * polarisation there is no E plane and the x axis only names an origin of azimuth.
 */
function planeOfE(horn: SiHorn, axis: Vector): Vector {
  const reference: Vector = horn.polarisation === 'y' ? [0, 1, 0] : [1, 0, 0];
  const across = minus(reference, scaled(axis, dot(reference, axis)));
  // A horn that looks along its own polarisation has no such plane; any vector across the axis does as well.
  return Math.hypot(...across) > 1e-9 ? unit(across) : unit(minus([0, 0, 1], scaled(axis, axis[2])));
}

/**
 * The scalar horn: field cos^qE of the angle off the axis in the E plane and cos^qH in the H plane, blended by cos^2
 * and sin^2 of the azimuth about the axis; zero behind; 1/R spreading. For circular polarisation the blend is
 * even, (cos^qE + cos^qH)/2, the co-polar part of a circular horn. Returns a sampler of points (x, y) of z = 0.
 */
export function hornSampler(horn: SiHorn): (xM: number, yM: number) => HornSample {
  const [bx, by, bz] = hornAxis(horn);
  const [px, py, pz] = planeOfE(horn, [bx, by, bz]);
  const circular = horn.polarisation === 'rhcp' || horn.polarisation === 'lhcp';
  const { xM: hornX, yM: hornY, zM: hornZ } = horn.position;
  const { exponentE, exponentH } = horn;
  const sample: HornSample = { field: 0, distanceM: 0, cosIncidence: 0, azimuthRad: 0 };
  return (xM, yM) => {
    const dx = xM - hornX;
    const dy = yM - hornY;
    const dz = -hornZ;
    const distance = Math.sqrt(dx * dx + dy * dy + dz * dz);
    const cosine = (dx * bx + dy * by + dz * bz) / distance;
    sample.distanceM = distance;
    sample.cosIncidence = Math.abs(dz) / distance;
    sample.azimuthRad = Math.atan2(dy, dx);
    sample.field = 0;
    if (cosine <= 0) return sample;
    let pattern = Math.pow(cosine, exponentE);
    if (exponentE !== exponentH) {
      const sineSquared = Math.max(0, 1 - cosine * cosine);
      const alongE = (dx * px + dy * py + dz * pz) / distance;
      const shareE = circular || sineSquared < 1e-18 ? 0.5 : Math.min(1, (alongE * alongE) / sineSquared);
      pattern = shareE * pattern + (1 - shareE) * Math.pow(cosine, exponentH);
    }
    sample.field = pattern / distance;
    return sample;
  };
}

/** Field of the scalar horn's far pattern in a direction of space; 0 behind it. */
export function hornPatternField(horn: SiHorn, { u, v, w }: Direction): number {
  const [bx, by, bz] = hornAxis(horn);
  const [px, py, pz] = planeOfE(horn, [bx, by, bz]);
  const cosine = u * bx + v * by + w * bz;
  if (cosine <= 0) return 0;
  const sineSquared = Math.max(0, 1 - cosine * cosine);
  const alongE = u * px + v * py + w * pz;
  const circular = horn.polarisation === 'rhcp' || horn.polarisation === 'lhcp';
  const shareE = circular || sineSquared < 1e-18 ? 0.5 : Math.min(1, (alongE * alongE) / sineSquared);
  return shareE * Math.pow(cosine, horn.exponentE) + (1 - shareE) * Math.pow(cosine, horn.exponentH);
}

/**
 * Power of the scalar horn in its own units: the integral of the squared pattern over the forward half space.
 * Equal exponents give 2 pi / (2q + 1), so the gain is 2 (2q + 1).
 */
export function hornPower(horn: SiHorn): number {
  const { exponentE: qE, exponentH: qH } = horn;
  const ownTerms = 1 / (2 * qE + 1) + 1 / (2 * qH + 1);
  const mixedTerm = 1 / (qE + qH + 1);
  const circular = horn.polarisation === 'rhcp' || horn.polarisation === 'lhcp';
  return circular ? (Math.PI / 2) * (ownTerms + 2 * mixedTerm) : ((3 * Math.PI) / 4) * ownTerms + (Math.PI / 2) * mixedTerm;
}
