export interface DrawnPoint {
  readonly x: number;
  readonly y: number;
}

/** A dimension as it stands on an engineering drawing: extension lines, a line between short slanted ticks, its figure. */
export interface DimensionLine {
  readonly line: string;
  readonly ticks: string;
  readonly extensions: string;
  readonly text: string;
  readonly textAt: DrawnPoint;
  /** Degrees; the figure of an upright line reads from the right. */
  readonly textTurnDeg: number;
}

const TICK = 4;
const GAP = 3;
const OVERRUN = 4;
/** Distance of the figure's baseline from its line. */
const TEXT_LIFT = 4;

interface HorizontalSpan {
  readonly fromX: number;
  readonly toX: number;
  /** Where the measured edge is, and where the line stands. */
  readonly edgeY: number;
  readonly lineY: number;
  readonly text: string;
}

interface UprightSpan {
  readonly fromY: number;
  readonly toY: number;
  readonly edgeX: number;
  readonly lineX: number;
  readonly text: string;
}

const n = (value: number): string => String(Math.round(value * 100) / 100);

export function horizontalDimension({ fromX, toX, edgeY, lineY, text }: HorizontalSpan): DimensionLine {
  const away = Math.sign(lineY - edgeY) || -1;
  const extension = (x: number): string => `M${n(x)} ${n(edgeY + away * GAP)}V${n(lineY + away * OVERRUN)}`;
  const tick = (x: number): string => `M${n(x - TICK)} ${n(lineY + TICK)}l${2 * TICK} ${-2 * TICK}`;
  return {
    line: `M${n(fromX)} ${n(lineY)}H${n(toX)}`,
    ticks: tick(fromX) + tick(toX),
    extensions: extension(fromX) + extension(toX),
    text,
    textAt: { x: (fromX + toX) / 2, y: lineY - TEXT_LIFT },
    textTurnDeg: 0,
  };
}

export function uprightDimension({ fromY, toY, edgeX, lineX, text }: UprightSpan): DimensionLine {
  const away = Math.sign(lineX - edgeX) || -1;
  const extension = (y: number): string => `M${n(edgeX + away * GAP)} ${n(y)}H${n(lineX + away * OVERRUN)}`;
  const tick = (y: number): string => `M${n(lineX - TICK)} ${n(y + TICK)}l${2 * TICK} ${-2 * TICK}`;
  return {
    line: `M${n(lineX)} ${n(fromY)}V${n(toY)}`,
    ticks: tick(fromY) + tick(toY),
    extensions: extension(fromY) + extension(toY),
    text,
    textAt: { x: lineX - TEXT_LIFT, y: (fromY + toY) / 2 },
    textTurnDeg: -90,
  };
}

/** Millimetres as drawings print them: at most two decimals, none where there are none. */
export function millimetreText(value: number): string {
  return String(Math.round(value * 100) / 100).replace('-', '\u2212');
}
