import type { BandPoint, BandResult } from '../../../../shared/model/band-run';
import type { Requirement } from '../../../../shared/model/design-document';
import type { Figure } from '../../../../shared/model/figures';
import { niceStep } from '../../ui/plots/axis-ticks';
import type { FigureLevel, LineFigure, LineInk, PlottedLine } from '../../ui/plots/line-figure';
import { numberText } from '../../ui/plots/plot-text';

/** Another run to lay over the one that is drawn. */
export interface OtherBand {
  readonly label: string;
  readonly result: BandResult;
}

/** What is drawn besides the run itself. */
export interface Besides {
  readonly limits: Limits;
  /** Place among the points that is marked. */
  readonly chosen: number | null;
  readonly against: OtherBand | null;
}

interface Curve {
  readonly label: string;
  readonly ink: LineInk;
  readonly dashed?: boolean;
  figure(point: BandPoint): Figure | undefined;
}

interface Drawing {
  readonly title: string;
  readonly axis: string;
  readonly curves: readonly Curve[];
  readonly levels: readonly FigureLevel[];
  readonly besides: Besides;
}

type Limits = Pick<Requirement, 'minGainDbi' | 'pointingToleranceDeg' | 'maxSidelobeDb'>;

const SQUARES_UP_TO = 60;
/** Limits so many times the height of the curves away from them are told in the table alone. */
const FARTHEST_LEVEL = 3;

/** Gain where it is wanted and where it is highest, over frequency, with the least gain required. */
export function gainFigure(result: BandResult, besides: Besides): LineFigure {
  const { minGainDbi } = besides.limits;
  const levels = minGainDbi === undefined ? [] : [{ at: minGainDbi, label: `≥ ${numberText(minGainDbi, 1)} dBi` }];
  const curves: Curve[] = [
    { label: 'wanted direction', ink: 'ink', figure: ({ gainAtBeamDbi }) => gainAtBeamDbi },
    { label: 'peak', ink: 'patina', dashed: true, figure: ({ gainDbi }) => gainDbi },
    { label: 'spatial part alone', ink: 'patina', figure: ({ spatial }) => spatial?.gainAtBeamDbi },
  ];
  return drawn(result, { title: 'Gain over the band', axis: 'gain, dBi', curves, levels, besides });
}

/** Where the beam stands against where it is wanted, in both planes, between the tolerances. */
export function squintFigure(result: BandResult, besides: Besides): LineFigure {
  const tolerance = besides.limits.pointingToleranceDeg;
  const levels = tolerance === undefined ? [] : [tolerance, -tolerance].map((at) => ({ at, label: `${at > 0 ? '≤ ' : '≥ '}${numberText(at, 2)}°` }));
  const curves: Curve[] = [
    { label: 'along', ink: 'ink', figure: ({ squintAlongDeg }) => squintAlongDeg },
    { label: 'across', ink: 'patina', dashed: true, figure: ({ squintAcrossDeg }) => squintAcrossDeg },
  ];
  return drawn(result, { title: 'Squint over the band', axis: 'squint, °', curves, levels, besides });
}

/** The highest sidelobe of the hemisphere. */
export function sidelobeFigure(result: BandResult, besides: Besides): LineFigure {
  const { maxSidelobeDb } = besides.limits;
  const levels = maxSidelobeDb === undefined ? [] : [{ at: maxSidelobeDb, label: `≤ ${numberText(maxSidelobeDb, 1)} dB` }];
  const curves: Curve[] = [{ label: 'highest sidelobe', ink: 'ink', figure: ({ sidelobeDb }) => sidelobeDb }];
  return drawn(result, { title: 'Highest sidelobe over the band', axis: 'level, dB', curves, levels, besides });
}

function drawn({ points, bandGHz }: BandResult, { title, axis, curves, levels, besides }: Drawing): LineFigure {
  const { chosen, against } = besides;
  const own = curves.map((curve) => lineOf(points, curve));
  const other = against === null ? [] : [lineOf(against.result.points, { ...curves[0], label: `${curves[0].label}, ${against.label}`, ink: 'copper', dashed: false })];
  const lines = [...own, ...other].filter(({ x }) => x.length > 0);
  const range = rangeOf(lines.flatMap(({ y }) => Array.from(y)), levels);
  const mark = chosen === null ? null : markOf(lines[0], points[chosen]?.frequencyGHz);
  return {
    title,
    x: { title: 'frequency, GHz', from: bandGHz[0], to: bandGHz[1] },
    y: { title: axis, ...range },
    lines,
    levels,
    ...(mark === null ? {} : { chosen: mark }),
  };
}

/** Frequencies without a value are left out of the line, not drawn as zero. */
function lineOf(points: readonly BandPoint[], { label, ink, dashed, figure }: Curve): PlottedLine {
  const known = points.flatMap((point) => {
    const value = figure(point);
    return typeof value === 'number' ? [{ x: point.frequencyGHz, y: value }] : [];
  });
  return { label, ink, dashed, squares: dashed !== true && known.length <= SQUARES_UP_TO, x: known.map(({ x }) => x), y: known.map(({ y }) => y) };
}

function rangeOf(values: readonly number[], levels: readonly FigureLevel[]): { from: number; to: number } {
  if (values.length === 0) return { from: 0, to: 1 };
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const height = Math.max(high - low, 0.1);
  const near = levels.map(({ at }) => at).filter((at) => at > low - FARTHEST_LEVEL * height && at < high + FARTHEST_LEVEL * height);
  const [from, to] = [Math.min(low, ...near), Math.max(high, ...near)];
  const room = Math.max(to - from, 0.1);
  const step = niceStep(room, 4);
  return { from: Math.floor((from - 0.04 * room) / step) * step, to: Math.ceil((to + 0.04 * room) / step) * step };
}

function markOf(line: PlottedLine | undefined, frequencyGHz: number | undefined): LineFigure['chosen'] | null {
  if (line === undefined || frequencyGHz === undefined) return null;
  const at = Array.from(line.x).indexOf(frequencyGHz);
  return at < 0 ? null : { at, label: `${numberText(frequencyGHz, 3)} GHz` };
}
