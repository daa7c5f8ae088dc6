import { ticksBetween } from './axis-ticks';
import { digitsOfStep, numberText } from './plot-text';

/** A straight axis: values from one end to the other over so many pixels. */
export interface LinearAxis {
  readonly from: number;
  readonly to: number;
  readonly startPx: number;
  readonly endPx: number;
}

export function axisPx(axis: LinearAxis, value: number): number {
  return axis.startPx + ((value - axis.from) / (axis.to - axis.from)) * (axis.endPx - axis.startPx);
}

/** Inverse of {@link axisPx}. */
export function axisValue(axis: LinearAxis, px: number): number {
  return axis.from + ((px - axis.startPx) / (axis.endPx - axis.startPx)) * (axis.to - axis.from);
}

export interface AxisTick {
  readonly value: number;
  readonly px: number;
  readonly text: string;
}

export function axisTicks(axis: LinearAxis, step: number): readonly AxisTick[] {
  const digits = digitsOfStep(step);
  const [low, high] = axis.from < axis.to ? [axis.from, axis.to] : [axis.to, axis.from];
  return ticksBetween(low, high, step).map((value) => ({ value, px: axisPx(axis, value), text: numberText(value, digits) }));
}

/** Path data through points; a NaN lifts the pen. */
export function linePath(xsPx: ArrayLike<number>, ysPx: ArrayLike<number>): string {
  let path = '';
  let down = false;
  for (let i = 0; i < xsPx.length; i++) {
    const there = Number.isFinite(xsPx[i]) && Number.isFinite(ysPx[i]);
    if (there) path += `${down ? 'L' : 'M'}${tenths(xsPx[i])} ${tenths(ysPx[i])}`;
    down = there;
  }
  return path;
}

function tenths(px: number): number {
  return Math.round(px * 10) / 10;
}
