import { gaussLegendre } from '../math/quadrature';
import { hornPower, hornSampler } from './horn-field';
import { outlineBounds, outlineCorners, rowIntervals } from './outline';
import type { SiHorn, SiOutline, SiPanel } from './si-design';

/** Share of the horn's power below which a part is not halved further: 10^-8 is 4e-8 dB of a well-lit panel. */
const ENOUGH = 1e-8;
const MOST_HALVINGS = 12;
const NODES = 6;
/** Parts of one run of a row. */
const MOST_PARTS = 8;

type Density = (xM: number, yM: number) => number;
type Interval = readonly [number, number];

/**
 * Share of the horn's power that hits keep-outs within the outline, 0 to 1, those that overlap counted once: the integral of
 * U cos(incidence) / R^2 as for spillover. Row by row the runs are taken exactly from the edges; over the rows
 * in parts that begin and end at corners, halved until halving changes nothing, since rows of crossing edges have kinks.
 * The sine in the variable of the rows takes away the root with which an ellipse begins and ends.
 */
export function keepOutShare(horn: SiHorn, { outline, keepOuts }: SiPanel): number {
  if (keepOuts.length === 0) return 0;
  const sampleAt = hornSampler(horn);
  const power = hornPower(horn);
  const density: Density = (xM, yM) => {
    const sample = sampleAt(xM, yM);
    return (sample.field * sample.field * sample.cosIncidence) / power;
  };
  // The footprint of cos^2q seen from height h falls off over about h / sqrt(q + 1).
  const partM = Math.abs(horn.position.zM) / Math.sqrt(Math.max(horn.exponentE, horn.exponentH) + 1);
  const breaks = rowBreaks([outline, ...keepOuts]);
  const spans = keepOuts.map((keepOut) => ({ keepOut, ...outlineBounds(keepOut) }));
  let share = 0;
  for (let i = 0; i + 1 < breaks.length; i++) {
    const met = spans.filter(({ bottomM, topM }) => bottomM < breaks[i + 1] && topM > breaks[i]).map(({ keepOut }) => keepOut);
    if (met.length === 0) continue;
    share += overRows([breaks[i], breaks[i + 1]], (yM) => runsOf(outline, met, yM).reduce((sum, run) => sum + alongRun(run, yM, { density, partM }), 0));
  }
  return Math.min(1, Math.max(0, share));
}

/** Where the runs of a row may begin, end or bend: corners, and the ends of ellipses. Rising. */
function rowBreaks(outlines: readonly SiOutline[]): number[] {
  const ys = outlines.flatMap((outline) => {
    if (outline.kind !== 'ellipse') return outlineCorners(outline).map(({ yM }) => yM);
    const { bottomM, topM } = outlineBounds(outline);
    return [bottomM, topM];
  });
  return [...new Set(ys)].sort((a, b) => a - b);
}

/** What keep-outs cover of the outline in a row, without overlaps. */
function runsOf(outline: SiOutline, keepOuts: readonly SiOutline[], yM: number): Interval[] {
  const kept = merged(keepOuts.flatMap((keepOut) => rowIntervals(keepOut, yM)));
  if (kept.length === 0) return [];
  const inside = merged(rowIntervals(outline, yM));
  return kept.flatMap(([from, to]) => inside.map(([low, high]): Interval => [Math.max(from, low), Math.min(to, high)]).filter(([low, high]) => high > low));
}

function merged(intervals: readonly Interval[]): Interval[] {
  const runs: [number, number][] = [];
  for (const [from, to] of [...intervals].sort((a, b) => a[0] - b[0])) {
    const last = runs.at(-1);
    if (last !== undefined && from <= last[1]) last[1] = Math.max(last[1], to);
    else runs.push([from, to]);
  }
  return runs;
}

function alongRun([fromM, toM]: Interval, yM: number, { density, partM }: { density: Density; partM: number }): number {
  const { nodes, weights } = gaussLegendre(NODES);
  const parts = Math.min(MOST_PARTS, Math.max(1, Math.ceil((toM - fromM) / partM)));
  const half = (toM - fromM) / parts / 2;
  let sum = 0;
  for (let part = 0; part < parts; part++) {
    const middle = fromM + (2 * part + 1) * half;
    for (let i = 0; i < nodes.length; i++) sum += weights[i] * half * density(middle + half * nodes[i], yM);
  }
  return sum;
}

/** Integral over the rows of a part, with y = middle + half sin(t). */
function overRows([bottomM, topM]: Interval, rowShare: (yM: number) => number): number {
  const middle = (bottomM + topM) / 2;
  const half = (topM - bottomM) / 2;
  const { nodes, weights } = gaussLegendre(NODES);
  const over = (from: number, to: number): number => {
    const [centre, reach] = [(from + to) / 2, (to - from) / 2];
    return nodes.reduce((sum, node, i) => {
      const t = centre + reach * node;
      return sum + weights[i] * reach * half * Math.cos(t) * rowShare(middle + half * Math.sin(t));
    }, 0);
  };
  const halved = (from: number, to: number, whole: number, left: number): number => {
    const centre = (from + to) / 2;
    const [lower, upper] = [over(from, centre), over(centre, to)];
    if (left === 0 || Math.abs(lower + upper - whole) < ENOUGH) return lower + upper;
    return halved(from, centre, lower, left - 1) + halved(centre, to, upper, left - 1);
  };
  return halved(-Math.PI / 2, Math.PI / 2, over(-Math.PI / 2, Math.PI / 2), MOST_HALVINGS);
}
