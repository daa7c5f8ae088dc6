import type { NoFigure } from '../../model/figures';
import type { VortexFigures } from '../../model/law-figures';
import { degFromRad } from '../../units/angles';
import { powerRatioToDb } from '../../units/decibels';
import type { Direction } from '../../waves/conventions';
import { noFigure } from '../no-figure';
import { elementPower, type RadiationPattern } from '../radiation-pattern';
import { beamFrame, directionAbout, type BeamFrame } from './beam-frame';
import { highestNear } from './line-search';

/** Angles off the axis tried for the ring. */
const RINGS = 72;
/** Below this share of the ring the axis is dark: rounding of the sum over cells. */
const DARK = 1e-20;

/**
 * The ring of a vortex beam: where the mean level about the axis is highest, and the share of the power on it that
 * turns with the wanted order, |c_order|^2 / sum |c_m|^2 with c_m the Fourier coefficients of F about the axis.
 */
export function vortexFigures(pattern: RadiationPattern, beam: Direction, order: number): VortexFigures | NoFigure {
  const frame = beamFrame(beam);
  const azimuths = 2 * (Math.abs(order) + 12);
  const widest = Math.min(widestRingRad(pattern, order), Math.PI / 2 - Math.acos(beam.w) - 1e-6);
  if (widest <= 0) return noFigure('at-horizon', 'a beam at the horizon has no whole ring in front of the panel');
  const level = (ring: number): number => meanPower(pattern, frame, ring, azimuths);
  const step = widest / RINGS;
  let best = 1;
  for (let i = 2; i <= RINGS; i++) if (level(i * step) > level(best * step)) best = i;
  const ringRad = highestNear(level, (best - 1) * step, Math.min(widest, (best + 1) * step));
  const ring = level(ringRad);
  if (ring <= 0) return noFigure('nothing-lit', 'nothing is radiated about the beam');
  const axis = pattern.farField.powerAt(beam.u, beam.v) * elementPower(beam.w, pattern.radiateExponent);
  return {
    order,
    ringDeg: degFromRad(ringRad),
    purity: purityOn(pattern, frame, ringRad, { order, azimuths }),
    axisDb: axis > DARK * ring ? powerRatioToDb(axis / ring) : noFigure('null', 'the pattern is zero on the axis'),
  };
}

/** The first maximum of J_l lies below l + 2 l^(1/3) + 1; the aperture is at most as lit at its rim as everywhere. */
function widestRingRad({ wavenumber, spectrum: { grid } }: RadiationPattern, order: number): number {
  const shortSideM = Math.min(grid.columnCount * grid.stepXM, grid.rowCount * grid.stepYM);
  const l = Math.abs(order);
  return Math.asin(Math.min(1, (3 * (l + 2 * Math.cbrt(l) + 1)) / (wavenumber * (shortSideM / 2))));
}

function meanPower(pattern: RadiationPattern, frame: BeamFrame, ringRad: number, azimuths: number): number {
  let sum = 0;
  for (let i = 0; i < azimuths; i++) {
    const { u, v, w } = directionAbout(frame, ringRad, (2 * Math.PI * i) / azimuths);
    sum += pattern.farField.powerAt(u, v) * elementPower(w, pattern.radiateExponent);
  }
  return sum / azimuths;
}

function purityOn(pattern: RadiationPattern, frame: BeamFrame, ringRad: number, { order, azimuths }: { order: number; azimuths: number }): number {
  let [re, im, power] = [0, 0, 0];
  for (let i = 0; i < azimuths; i++) {
    const azimuth = (2 * Math.PI * i) / azimuths;
    const { u, v, w } = directionAbout(frame, ringRad, azimuth);
    const element = Math.sqrt(elementPower(w, pattern.radiateExponent));
    const field = pattern.farField.derivativesAt(u, v);
    const [fieldRe, fieldIm] = [field.re * element, field.im * element];
    const [cosine, sine] = [Math.cos(order * azimuth), Math.sin(order * azimuth)];
    re += fieldRe * cosine + fieldIm * sine;
    im += fieldIm * cosine - fieldRe * sine;
    power += fieldRe * fieldRe + fieldIm * fieldIm;
  }
  return (re * re + im * im) / (azimuths * power);
}
