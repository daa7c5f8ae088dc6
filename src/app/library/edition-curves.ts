import { curveOverCells, curveOverFrequency, curveOverIncidence } from '../../../shared/antenna/response-curve';
import type { CurvePolarisation, ResponseCurve } from '../../../shared/antenna/response-curve';
import type { PreparedEdition } from '../../../shared/antenna/prepare-edition';
import type { LineFigure } from '../ui/plots/line-figure';
import { numberText } from '../ui/plots/plot-text';

export type CurveAxis = 'parameter' | 'frequency' | 'incidence';

/** What a pair of curves holds fixed, and along which axis it runs. */
export interface CurveWish {
  readonly axis: CurveAxis;
  readonly cellIndex: number;
  readonly frequencyGHz: number;
  readonly incidenceDeg: number;
  readonly azimuthDeg: number;
  readonly polarisation: CurvePolarisation;
}

export interface CurvePair {
  readonly phase: LineFigure;
  readonly magnitude: LineFigure;
  /** Cells in the order of the abscissa when it runs over the parameter. */
  readonly cellIndex: Int32Array | null;
}

/** Phase and magnitude of an edition along one axis, ready to be drawn. */
export function curvePair(prepared: PreparedEdition, wish: CurveWish): CurvePair {
  const curve = curveOf(prepared, wish);
  const x = { title: axisTitle(prepared, wish.axis), ...rangeOf(curve.abscissa, 0.02) };
  const chosen = chosenOf(prepared, wish, curve);
  const line = (y: ArrayLike<number>, label: string): LineFigure['lines'] => [{ label, x: curve.abscissa, y, ink: 'ink', squares: wish.axis !== 'incidence' && curve.abscissa.length <= 60 }];
  return {
    phase: { title: `Phase against ${wish.axis}`, x, y: { title: 'unwrapped phase, °', ...rangeOf(curve.phaseDeg, 0.06) }, lines: line(curve.phaseDeg, 'phase'), ...chosen },
    magnitude: { title: `Magnitude against ${wish.axis}`, x, y: { title: 'magnitude, dB', ...magnitudeRange(curve.magnitudeDb) }, lines: line(curve.magnitudeDb, 'magnitude') },
    cellIndex: 'cellIndex' in curve ? curve.cellIndex : null,
  };
}

function curveOf(prepared: PreparedEdition, wish: CurveWish): ResponseCurve | (ResponseCurve & { readonly cellIndex: Int32Array }) {
  if (wish.axis === 'parameter') return curveOverCells(prepared, wish);
  return wish.axis === 'frequency' ? curveOverFrequency(prepared, wish) : curveOverIncidence(prepared, wish);
}

function axisTitle({ edition }: PreparedEdition, axis: CurveAxis): string {
  if (axis === 'frequency') return 'frequency, GHz';
  if (axis === 'incidence') return 'angle of incidence, °';
  const [parameter] = edition.description.parameters;
  return `${parameter.label}, ${parameter.unit}`;
}

function rangeOf(values: ArrayLike<number>, slack: number): { from: number; to: number } {
  const list = Array.from(values);
  const [low, high] = [Math.min(...list), Math.max(...list)];
  const room = (high - low) * slack || 0.5;
  return { from: low - room, to: high + room };
}

/** From the lowest loss to a little above 0 dB, where a passive cell may never be. */
function magnitudeRange(values: ArrayLike<number>): { from: number; to: number } {
  const list = Array.from(values);
  const low = Math.min(...list, -0.2);
  return { from: low * 1.1, to: Math.max(0.05, ...list.map((value) => value * 1.1)) };
}

function chosenOf({ edition }: PreparedEdition, wish: CurveWish, curve: ResponseCurve): Pick<LineFigure, 'chosen'> {
  if (wish.axis !== 'parameter' || !('cellIndex' in curve)) return {};
  const at = (curve.cellIndex as Int32Array).indexOf(wish.cellIndex);
  const sizes = edition.cells[wish.cellIndex].parametersMm.map((sizeMm) => numberText(sizeMm, 2)).join(' × ');
  return at < 0 ? {} : { chosen: { at, label: `${sizes} mm, ${numberText(curve.phaseDeg[at], 1)}°` } };
}
