import { ticksBetween } from './axis-ticks';
import type { CutFigure, CutTrace } from './cut-figure';
import { linePath } from './plot-axis';
import { numberText } from './plot-text';

/** Where a polar form lies: half a disc about its centre, angle 0 upwards, the floor at the centre. */
export interface PolarFrame {
  readonly centreX: number;
  readonly centreY: number;
  readonly radius: number;
  readonly floorDb: number;
  readonly topDb: number;
}

export function polarFrame(figure: CutFigure, width: number, height: number): PolarFrame {
  const whole = figure.fromDeg < -90 || figure.toDeg > 90;
  const radius = Math.max(30, Math.min(width / 2 - 24, whole ? height / 2 - 24 : height - 46));
  return { centreX: width / 2, centreY: whole ? height / 2 : height - 28, radius, floorDb: figure.floorDb, topDb: figure.topDb };
}

/** Levels below the floor lie in the centre. */
export function polarPoint(frame: PolarFrame, angleDeg: number, levelDb: number): { readonly x: number; readonly y: number } {
  const part = Math.max(0, (levelDb - frame.floorDb) / (frame.topDb - frame.floorDb));
  const angle = (angleDeg * Math.PI) / 180;
  return { x: frame.centreX + part * frame.radius * Math.sin(angle), y: frame.centreY - part * frame.radius * Math.cos(angle) };
}

export function polarPath(frame: PolarFrame, trace: Pick<CutTrace, 'angleDeg' | 'levelDb'>): string {
  const points = Array.from(trace.angleDeg, (angle, i) => polarPoint(frame, angle, trace.levelDb[i]));
  return linePath(points.map(({ x }) => x), points.map(({ y }) => y));
}

/** Circles of level, labelled along the horizontal, and spokes of angle. */
export function polarGrid(frame: PolarFrame, figure: CutFigure): {
  readonly rings: readonly { readonly radius: number; readonly text: string; readonly labelled: boolean }[];
  readonly spokes: readonly { readonly x: number; readonly y: number; readonly labelX: number; readonly labelY: number; readonly text: string }[];
} {
  const step = (frame.topDb - frame.floorDb) / 10 > 8 ? 20 : 10;
  const rings = ticksBetween(frame.floorDb, frame.topDb, step).map((level) => ({
    radius: ((level - frame.floorDb) / (frame.topDb - frame.floorDb)) * frame.radius,
    text: numberText(level, 0),
    // Labels need 22 pixels each.
    labelled: (frame.radius * step) / (frame.topDb - frame.floorDb) > 22 || level % (2 * step) === 0,
  }));
  const spokes = ticksBetween(figure.fromDeg, figure.toDeg, 30).map((angle) => {
    const end = polarPoint(frame, angle, frame.topDb);
    const reach = 1 + 12 / frame.radius;
    return { x: end.x, y: end.y, labelX: frame.centreX + (end.x - frame.centreX) * reach, labelY: frame.centreY + (end.y - frame.centreY) * reach + 3, text: numberText(angle, 0) };
  });
  return { rings, spokes };
}
