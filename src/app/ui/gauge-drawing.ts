/** A dimension line: 0 is its left end, 1 its right. */
export interface Gauge {
  readonly limitAt: number;
  readonly valueAt: number;
  readonly forbidden: 'left' | 'right';
}

export interface GaugeDrawing {
  readonly hatch: string;
  readonly run: string;
  readonly limit: string;
  readonly valueX: number;
}

const WIDTH = 118;
const END = 3;
const HATCH_STEP = 4;

/** Tick at the limit, hatch over the forbidden side, coloured run from limit to value. */
export function gaugeDrawing(gauge: Gauge | null): GaugeDrawing | null {
  if (gauge === null) return null;
  const at = (share: number): number => Math.min(WIDTH - END, Math.max(END, share * WIDTH));
  const [limitX, valueX] = [at(gauge.limitAt), at(gauge.valueAt)];
  const [from, to] = gauge.forbidden === 'left' ? [0, limitX] : [limitX, WIDTH];
  const strokes: string[] = [];
  // Lines of 45 degrees, cut where they would leave the forbidden run.
  for (let x = from - 6; x < to; x += HATCH_STEP) {
    const start = Math.max(x, from);
    const end = Math.min(x + 6, to);
    if (end > start) strokes.push(`M${start} ${7 - (start - x)}L${end} ${7 - (end - x)}`);
  }
  return { hatch: strokes.join(''), run: `M${limitX} 4H${valueX}`, limit: `M${limitX} 0V8`, valueX };
}
