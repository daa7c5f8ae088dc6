import { hornAxis } from '../horn-field';
import type { SiHorn } from '../si-design';
import { polarisationVector } from './polarisation-vector';

/** A complex electric field; reused between calls. */
export interface FieldSample {
  xRe: number;
  xIm: number;
  yRe: number;
  yIm: number;
  zRe: number;
  zIm: number;
}

export function newFieldSample(): FieldSample {
  return { xRe: 0, xIm: 0, yRe: 0, yIm: 0, zRe: 0, zIm: 0 };
}

const DARK: Readonly<FieldSample> = newFieldSample();

/** Nearer to the axis than this the plane through it is undefined and the field is the polarisation vector itself. */
const ON_AXIS = 1e-9;

/**
 * Far field of a horn in a unit direction (dx, dy, dz), times the distance, its path phase left out: with c the cosine of
 * the angle off the axis b, t the unit vector across b towards the direction, theta' = c t - sqrt(1 - c^2) b and phi' = b x t,
 * E = c^qE (t.p) theta' + c^qH (phi'.p) phi'; zero behind. Its Ludwig-3 co-polar part in the axes of the horn is the
 * blend c^qE cos^2 + c^qH sin^2 of the scalar model, its cross-polar part (c^qE - c^qH) sin cos. Written into `out`.
 */
export function vectorHornPattern(horn: SiHorn): (dx: number, dy: number, dz: number, out: FieldSample) => FieldSample {
  const [bx, by, bz] = hornAxis(horn);
  const { re, im } = polarisationVector([bx, by, bz], horn.polarisation);
  const { exponentE, exponentH } = horn;
  return (dx, dy, dz, out) => {
    const cosine = dx * bx + dy * by + dz * bz;
    if (cosine <= 0) return Object.assign(out, DARK);
    const [ax, ay, az] = [dx - cosine * bx, dy - cosine * by, dz - cosine * bz];
    const sine = Math.sqrt(ax * ax + ay * ay + az * az);
    if (sine < ON_AXIS) {
      [out.xRe, out.yRe, out.zRe] = re;
      [out.xIm, out.yIm, out.zIm] = im;
      return out;
    }
    const [tx, ty, tz] = [ax / sine, ay / sine, az / sine];
    const [fx, fy, fz] = [by * tz - bz * ty, bz * tx - bx * tz, bx * ty - by * tx];
    const alongE = Math.pow(cosine, exponentE);
    const alongH = exponentE === exponentH ? alongE : Math.pow(cosine, exponentH);
    const thetaRe = alongE * (tx * re[0] + ty * re[1] + tz * re[2]);
    const thetaIm = alongE * (tx * im[0] + ty * im[1] + tz * im[2]);
    const phiRe = alongH * (fx * re[0] + fy * re[1] + fz * re[2]);
    const phiIm = alongH * (fx * im[0] + fy * im[1] + fz * im[2]);
    const theta = [cosine * tx - sine * bx, cosine * ty - sine * by, cosine * tz - sine * bz] as const;
    out.xRe = thetaRe * theta[0] + phiRe * fx;
    out.yRe = thetaRe * theta[1] + phiRe * fy;
    out.zRe = thetaRe * theta[2] + phiRe * fz;
    out.xIm = thetaIm * theta[0] + phiIm * fx;
    out.yIm = thetaIm * theta[1] + phiIm * fy;
    out.zIm = thetaIm * theta[2] + phiIm * fz;
    return out;
  };
}

/**
 * Power of the horn in the units of |E|^2 R^2 over a solid angle, all polarisations: pi [1/(2 qE + 1) + 1/(2 qH + 1)].
 * 4 pi over it is the axial gain. The scalar horn of different exponents has less, since it lacks the cross-polar part.
 */
export function vectorHornPower({ exponentE, exponentH }: Pick<SiHorn, 'exponentE' | 'exponentH'>): number {
  return Math.PI * (1 / (2 * exponentE + 1) + 1 / (2 * exponentH + 1));
}
