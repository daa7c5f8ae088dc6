import { cutAxes, cutDrawing } from './cut-plot-drawing';
import { wholeCut } from './cut-window';
import { axisPx } from './plot-axis';
import type { PlotTheme } from './plot-theme';
import { SAMPLE_CUT } from './sample-cut';

const theme: PlotTheme = {
  name: 'light', paper: '#f7f4ee', raised: '#fff', ink: '#1c2730', muted: '#55606a', rule: '#d8d2c6', ruleStrong: '#857f71', copper: '#9a4a1c', patina: '#1c6965',
  fail: '#b3261e', hatch: 'rgba(179,38,30,.42)', substrate: '#f0e9db', copperMetal: '#9a4a1c', fontText: 'Archivo', fontFigure: 'IBM Plex Mono',
};
const size = { window: wholeCut(SAMPLE_CUT), width: 528, height: 300 };
interface Trace {
  readonly mode: string;
  readonly x: (number | null)[];
  readonly y: (number | null)[];
  readonly text?: string[];
  readonly line?: { readonly color: string; readonly dash?: string };
  readonly fillpattern?: { readonly shape: string };
}
const traces = (of = size): Trace[] => cutDrawing(SAMPLE_CUT, of, theme).data as unknown as Trace[];

describe('cut for the plot library', () => {
  it('hatches what the mask forbids, up to the upper edge', () => {
    const hatched = traces().filter((trace) => trace.fillpattern?.shape === '/');
    expect(hatched).toHaveLength(2);
    for (const area of hatched) expect(Math.max(...area.y.map(Number))).toBeGreaterThan(40);
  });
  it('draws the edge of the mask upwards only beside the beam', () => {
    const edges = traces().filter((trace) => trace.line?.color === theme.fail);
    expect(edges.map(({ x }) => [x[0], x[x.length - 1]])).toEqual([[23.8, 90], [-90, 16.2]]);
    expect(edges.map(({ x }) => x.length)).toEqual([4, 4]);
  });
  it('tells the parent from the present by dash and by colour', () => {
    const [parent] = traces().filter((trace) => trace.line?.color === theme.patina);
    expect(parent.line?.dash).toBe('5px,3px');
    expect(traces().some((trace) => trace.line?.color === theme.ink && !trace.line.dash && trace.x.length === 901)).toBe(true);
  });
  it('keeps every sample, also those below the floor', () => {
    const main = traces().find((trace) => trace.x.length === 901 && trace.line?.color === theme.ink);
    expect(Math.min(...(main?.y.map(Number) ?? []))).toBeLessThan(-20);
  });
  it('numbers the markers in balloons that stay in the plot and off each other', () => {
    const balloons = traces().find((trace) => trace.mode === 'text+markers');
    const { x, y } = cutAxes(size.window, size.width, size.height);
    const places = (balloons?.x ?? []).map((angle, i) => ({ x: axisPx(x, Number(angle)), y: axisPx(y, Number(balloons?.y[i])) }));
    expect(balloons?.text).toEqual(['1', '2', '3']);
    for (const place of places) expect(place.x > 8 && place.x < 520 && place.y > 8 && place.y < 300).toBe(true);
    expect(Math.hypot(places[0].x - places[1].x, places[0].y - places[1].y)).toBeGreaterThan(17);
  });
  it('keeps the centre of every balloon within the axes, outside which the library leaves marks out', () => {
    const [{ angleDeg }] = SAMPLE_CUT.marks;
    // The first marker in the upper left corner, in the upper right one, and below the middle of the upper edge.
    for (const [fromDeg, toDeg] of [[angleDeg - 0.5, angleDeg + 40], [angleDeg - 40, angleDeg + 0.5], [-90, 90]]) {
      const window = { ...size.window, fromDeg, toDeg, topDb: 35.2 };
      const balloons = traces({ ...size, window, height: 240 }).find((trace) => trace.mode === 'text+markers');
      expect(balloons?.text).toContain('1');
      for (const level of balloons?.y.map(Number) ?? []) expect(level <= window.topDb && level >= window.floorDb).toBe(true);
      for (const angle of balloons?.x.map(Number) ?? []) expect(angle >= fromDeg && angle <= toDeg).toBe(true);
    }
  });
  it('draws no marker that lies outside the window', () => {
    const away = traces({ ...size, window: { ...size.window, fromDeg: -90, toDeg: 0 } });
    expect(away.some((trace) => trace.mode === 'text+markers')).toBe(false);
  });
  it('never takes the WebGL traces, which the content policy forbids', () => {
    expect(new Set(cutDrawing(SAMPLE_CUT, size, theme).data.map(({ type }) => type))).toEqual(new Set(['scatter']));
  });
  it('ticks angles every 15 degrees and levels every 10 dB at this size', () => {
    const { layout } = cutDrawing(SAMPLE_CUT, size, theme);
    expect([layout.xaxis?.dtick, layout.yaxis?.dtick]).toEqual([15, 10]);
  });
});
