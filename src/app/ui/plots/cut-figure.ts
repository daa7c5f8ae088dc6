/** One trace of a cut, in dB over an angle in degrees. */
export interface CutTrace {
  readonly label: string;
  readonly angleDeg: ArrayLike<number>;
  readonly levelDb: ArrayLike<number>;
}

/** The lower edge of a forbidden area; everything above it is hatched. */
export interface ForbiddenEdge {
  readonly angleDeg: readonly number[];
  readonly levelDb: readonly number[];
}

/** A numbered place on the cut. */
export interface CutMark {
  readonly name: string;
  readonly angleDeg: number;
  readonly levelDb: number;
}

/** A cut with all that is drawn on it. The rectangular and the polar form show the same figure. */
export interface CutFigure {
  readonly title: string;
  readonly angleTitle: string;
  readonly levelTitle: string;
  readonly main: CutTrace;
  /** The cross-polar field over the same angles, dotted. */
  readonly cross?: CutTrace;
  /** What it is compared with, dashed. */
  readonly overlay: CutTrace | null;
  readonly forbidden: readonly ForbiddenEdge[];
  readonly forbiddenLabel: string;
  /** A level that must be reached at an angle, as a short line. */
  readonly least: { readonly label: string; readonly angleDeg: number; readonly levelDb: number } | null;
  readonly marks: readonly CutMark[];
  readonly fromDeg: number;
  readonly toDeg: number;
  readonly floorDb: number;
  readonly topDb: number;
}

/** The level between two samples on a straight line, and whether it lies between them; null outside the trace. */
export function levelAt(trace: CutTrace, angleDeg: number): { readonly levelDb: number; readonly interpolated: boolean } | null {
  const { angleDeg: angles, levelDb } = trace;
  const last = angles.length - 1;
  if (last < 0 || angleDeg < angles[0] || angleDeg > angles[last]) return null;
  let [low, high] = [0, last];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (angles[middle] <= angleDeg) low = middle;
    else high = middle;
  }
  if (angleDeg === angles[low]) return { levelDb: levelDb[low], interpolated: false };
  if (angleDeg === angles[high]) return { levelDb: levelDb[high], interpolated: false };
  const part = (angleDeg - angles[low]) / (angles[high] - angles[low]);
  return { levelDb: levelDb[low] + part * (levelDb[high] - levelDb[low]), interpolated: true };
}

/** The sample nearest to an angle; -1 of an empty trace. */
export function nearestSample(trace: CutTrace, angleDeg: number): number {
  const { angleDeg: angles } = trace;
  let nearest = angles.length > 0 ? 0 : -1;
  for (let i = 1; i < angles.length; i++) if (Math.abs(angles[i] - angleDeg) < Math.abs(angles[nearest] - angleDeg)) nearest = i;
  return nearest;
}
