import type { Dash, Data, Layout } from 'plotly.js-dist-min';
import { angleStepDeg, niceStep } from './axis-ticks';
import type { CutFigure, CutMark, ForbiddenEdge } from './cut-figure';
import { BALLOON_R, placeBalloons } from './place-balloons';
import type { BalloonAnchor, BalloonRoom, PlacedBalloon } from './place-balloons';
import { axisPx, axisValue } from './plot-axis';
import type { LinearAxis } from './plot-axis';
import type { PlotTheme } from './plot-theme';

/** The part of the cut that is shown. */
export interface CutWindow {
  readonly fromDeg: number;
  readonly toDeg: number;
  readonly floorDb: number;
  readonly topDb: number;
}

export const CUT_MARGIN = { left: 40, right: 12, top: 10, bottom: 36 } as const;

/** The library also takes lengths of strokes and gaps, which its types leave out. */
const PARENT_DASH = ('5px,3px' as string) as Dash;

const CROSS_DASH = ('1.5px,2.5px' as string) as Dash;

export interface CutAxes {
  readonly x: LinearAxis;
  readonly y: LinearAxis;
}

export function cutAxes(window: CutWindow, width: number, height: number): CutAxes {
  return {
    x: { from: window.fromDeg, to: window.toDeg, startPx: CUT_MARGIN.left, endPx: width - CUT_MARGIN.right },
    y: { from: window.floorDb, to: window.topDb, startPx: height - CUT_MARGIN.bottom, endPx: CUT_MARGIN.top },
  };
}

export interface CutDrawingSize {
  readonly window: CutWindow;
  readonly width: number;
  readonly height: number;
}

/** Everything on the cut for the plot library. Levels below the floor are drawn on it and stay in the data. */
export function cutDrawing(figure: CutFigure, size: CutDrawingSize, theme: PlotTheme): { readonly data: Data[]; readonly layout: Partial<Layout> } {
  const axes = cutAxes(size.window, size.width, size.height);
  const data: Data[] = [
    ...figure.forbidden.flatMap((edge) => forbiddenTraces(edge, size.window, theme)),
    ...(figure.overlay ? [line(figure.overlay.angleDeg, figure.overlay.levelDb, { color: theme.patina, width: 1.1, dash: PARENT_DASH })] : []),
    ...(figure.cross ? [line(figure.cross.angleDeg, figure.cross.levelDb, { color: theme.copper, width: 1.2, dash: CROSS_DASH })] : []),
    line(figure.main.angleDeg, figure.main.levelDb, { color: theme.ink, width: 1.5 }),
    ...(figure.least ? [leastTrace(figure.least, axes.x, theme)] : []),
    ...markTraces(figure, size, axes, theme),
  ];
  return { data, layout: cutLayout(figure, size, theme) };
}

function line(x: ArrayLike<number>, y: ArrayLike<number>, style: { color: string; width: number; dash?: Dash }): Data {
  return { type: 'scatter', mode: 'lines', x: Array.from(x), y: Array.from(y), line: style, hoverinfo: 'skip' };
}

function forbiddenTraces(edge: ForbiddenEdge, { topDb }: CutWindow, theme: PlotTheme): Data[] {
  const { angleDeg, levelDb } = edge;
  if (angleDeg.length < 2) return [];
  // Well above any window, so that the area reaches its upper edge however it is zoomed.
  const above = Math.max(topDb, ...levelDb) + 500;
  const [first, last] = [angleDeg[0], angleDeg[angleDeg.length - 1]];
  const area: Data = {
    type: 'scatter',
    mode: 'none',
    x: [first, ...angleDeg, last],
    y: [above, ...levelDb, above],
    fill: 'toself',
    fillcolor: 'rgba(0,0,0,0)',
    fillpattern: { shape: '/', fgcolor: theme.hatch, bgcolor: 'rgba(0,0,0,0)', size: 6, solidity: 0.14, fgopacity: 1 },
    hoverinfo: 'skip',
  };
  // The end next to the beam closes upwards; the outer end is the end of the cut.
  const inner = levelDb[0] >= levelDb[levelDb.length - 1] ? 'first' : 'last';
  const x = inner === 'first' ? [first, ...angleDeg] : [...angleDeg, last];
  const y = inner === 'first' ? [above, ...levelDb] : [...levelDb, above];
  return [area, line(x, y, { color: theme.fail, width: 1.2 })];
}

function leastTrace(least: NonNullable<CutFigure['least']>, x: LinearAxis, theme: PlotTheme): Data {
  const half = Math.abs(axisValue(x, 16) - axisValue(x, 0));
  return line([least.angleDeg - half, least.angleDeg + half], [least.levelDb, least.levelDb], { color: theme.ink, width: 2.2 });
}

/** Squares on the cut, leaders and numbered balloons. Those outside the window are not drawn. */
function markTraces(figure: CutFigure, { window, width, height }: CutDrawingSize, axes: CutAxes, theme: PlotTheme): Data[] {
  const inside = figure.marks.filter(({ angleDeg, levelDb }) => angleDeg >= window.fromDeg && angleDeg <= window.toDeg && levelDb <= window.topDb);
  if (inside.length === 0) return [];
  const clipped = inside.map((mark) => ({ ...mark, levelDb: Math.max(window.floorDb, mark.levelDb) }));
  const anchors = clipped.map((mark) => ({ name: mark.name, x: axisPx(axes.x, mark.angleDeg), y: axisPx(axes.y, mark.levelDb) }));
  const placed = placeInAxes(anchors, traceObstacles(figure, axes), { width, height });
  const balloonX = placed.map(({ balloonX: px }) => axisValue(axes.x, px));
  const balloonY = placed.map(({ balloonY: px }) => axisValue(axes.y, px));
  const leader = (mark: CutMark, i: number): [number | null, number | null][] => [[mark.angleDeg, mark.levelDb], [balloonX[i], balloonY[i]], [null, null]];
  const leaders = clipped.flatMap(leader);
  const plain = { type: 'scatter', hoverinfo: 'skip', cliponaxis: false } as const;
  return [
    { ...plain, mode: 'lines', x: leaders.map(([x]) => x), y: leaders.map(([, y]) => y), line: { color: theme.ink, width: 0.9 } },
    { ...plain, mode: 'markers', x: clipped.map(({ angleDeg }) => angleDeg), y: clipped.map(({ levelDb }) => levelDb), marker: { symbol: 'square', size: 5, color: theme.ink } },
    {
      ...plain,
      mode: 'text+markers',
      x: balloonX,
      y: balloonY,
      text: placed.map(({ name }) => name),
      textposition: 'middle center',
      textfont: { family: theme.fontFigure, size: 11, color: theme.ink },
      marker: { symbol: 'circle', size: 17, color: theme.paper, line: { color: theme.ink, width: 1.2 } },
    },
  ];
}

/** The library leaves out a mark whose centre lies outside the axes, so the centres stay within them; rims may stand out. */
function placeInAxes(anchors: readonly BalloonAnchor[], obstacles: BalloonRoom['obstacles'], { width, height }: { readonly width: number; readonly height: number }): readonly PlacedBalloon[] {
  const [left, top] = [CUT_MARGIN.left - BALLOON_R, CUT_MARGIN.top - BALLOON_R];
  const moved = <Point extends { readonly x: number; readonly y: number }>(point: Point): Point => ({ ...point, x: point.x - left, y: point.y - top });
  const room = { width: width - CUT_MARGIN.right + BALLOON_R - left, height: height - CUT_MARGIN.bottom + BALLOON_R - top, obstacles: obstacles.map(moved) };
  return placeBalloons(anchors.map(moved), room).map((placed, i) => ({ ...anchors[i], balloonX: placed.balloonX + left, balloonY: placed.balloonY + top }));
}

/** Balloons keep off the trace, which is what the eye looks for. */
function traceObstacles({ main }: CutFigure, { x, y }: CutAxes): { readonly x: number; readonly y: number; readonly r: number }[] {
  const step = Math.max(1, Math.floor(main.angleDeg.length / 500));
  const found: { x: number; y: number; r: number }[] = [];
  for (let i = 0; i < main.angleDeg.length; i += step) {
    if (main.levelDb[i] > y.from) found.push({ x: axisPx(x, main.angleDeg[i]), y: axisPx(y, main.levelDb[i]), r: 2 });
  }
  return found;
}

function cutLayout(figure: CutFigure, { window, width, height }: CutDrawingSize, theme: PlotTheme): Partial<Layout> {
  const ticks = { family: theme.fontFigure, size: 11, color: theme.muted };
  const axis = { gridcolor: theme.rule, linecolor: theme.ruleStrong, linewidth: 1, mirror: true, zeroline: false, tickfont: ticks, ticks: '', automargin: false } as const;
  const words = { family: theme.fontText, size: 11, color: theme.muted };
  const note = { showarrow: false, xref: 'paper', yref: 'paper', y: 0, yanchor: 'top', yshift: -20, font: words } as const;
  const plotWidth = Math.max(1, width - CUT_MARGIN.left - CUT_MARGIN.right);
  return {
    width,
    height,
    margin: { l: CUT_MARGIN.left, r: CUT_MARGIN.right, t: CUT_MARGIN.top, b: CUT_MARGIN.bottom, pad: 0 },
    paper_bgcolor: 'rgba(0,0,0,0)',
    plot_bgcolor: theme.raised,
    showlegend: false,
    hovermode: false,
    font: ticks,
    xaxis: { ...axis, range: [window.fromDeg, window.toDeg], dtick: angleStepDeg(window.toDeg - window.fromDeg, plotWidth / 38), tick0: 0 },
    yaxis: { ...axis, range: [window.floorDb, window.topDb], dtick: niceStep(window.topDb - window.floorDb, Math.max(2, (height - 46) / 34)), tick0: 0 },
    annotations: [
      { ...note, text: figure.levelTitle, x: 0, xanchor: 'left', xshift: -CUT_MARGIN.left },
      { ...note, text: figure.angleTitle, x: 1, xanchor: 'right' },
    ],
  };
}
