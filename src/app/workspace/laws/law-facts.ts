import type { Figure, Figures } from '../../../../shared/model/figures';
import type { FocusFigures, VortexFigures } from '../../../../shared/model/law-figures';
import type { LineFigure } from '../../ui/plots/line-figure';
import { figureText } from '../strip-figures';

export interface LawFact {
  readonly name: string;
  readonly value: string;
}

const shown = (figure: Figure, digits: number, unit: string): string => (typeof figure === 'number' ? `${figureText(figure, digits)}${unit}` : `– (${figure.reason})`);

/** What a target phase of its own kind turned out to do, in words and numbers. */
export function lawFacts({ focus, vortex, projections, diffuse }: Figures): readonly LawFact[] {
  return [...focusFacts(focus), ...vortexFacts(vortex), ...projectionFacts(projections), ...diffuseFacts(diffuse)];
}

const OUTCOMES = { reached: 'every bound is kept to 0.05 dB', stalled: 'stalled: it no longer comes nearer', unfinished: 'ended while still coming nearer' } as const;

function projectionFacts(run: Figures['projections']): readonly LawFact[] {
  if (run === undefined) return [];
  const last = run.costs[run.costs.length - 1];
  return [
    { name: 'Outcome', value: OUTCOMES[run.outcome] },
    { name: 'Iterations done', value: figureText(run.iterations, 0) },
    { name: 'Power outside the bounds', value: `${figureText(last.share * 100, 3)} %` },
    { name: 'Worst above the upper bound', value: shown(run.worstExcessDb, 2, ' dB') },
    { name: 'Worst below the lower bound', value: shown(run.worstShortfallDb, 2, ' dB') },
  ];
}

function diffuseFacts(board: Figures['diffuse']): readonly LawFact[] {
  if (board === undefined) return [];
  return [
    { name: 'Peak against a metal plate', value: `${shown(board.peakDb, 2, ' dB')} at θ ${figureText(board.peakThetaDeg, 1)}°, φ ${figureText(board.peakPhiDeg, 1)}°` },
    { name: board.boundBy === 'parseval' ? 'No board lies below (Parseval)' : 'No board lies below (energy of the hemisphere)', value: shown(board.boundDb, 2, ' dB') },
    { name: `Peak in the search, ${board.samples} × ${board.samples} samples`, value: shown(board.boardPeakDb, 2, ' dB') },
    { name: 'Search', value: board.method === 'exhaustive' ? `every board tried, ${figureText(board.equals, 0)} with this peak` : `descent from six seeded boards, ${figureText(board.equals, 0)} with this peak` },
  ];
}

/** The cost of the projections over their iterations, as a level. */
export function costFigure({ projections }: Figures): LineFigure | null {
  if (projections === undefined || projections.costs.length < 2) return null;
  const levels = projections.costs.map(({ share }) => Math.max(-80, 10 * Math.log10(Math.max(1e-8, share))));
  return {
    title: 'Power outside the bounds',
    x: { title: 'iteration', from: 0, to: projections.iterations },
    y: { title: 'share of the whole, dB', from: Math.floor(Math.min(...levels) / 10) * 10, to: 0, step: 10 },
    lines: [{ label: 'cost', x: projections.costs.map(({ iteration }) => iteration), y: levels, ink: 'ink', squares: true }],
  };
}

function focusFacts(focus: Figures['focus']): readonly LawFact[] {
  if (focus === undefined) return [];
  if (!isFocus(focus)) return [{ name: 'Highest level on the axis', value: `– (${focus.reason})` }];
  const { from, to } = focus.halfPowerMm;
  return [
    { name: 'Focus from the centre', value: shown(focus.distanceMm, 1, ' mm') },
    { name: 'Highest level on the axis at', value: shown(focus.maximumMm, 1, ' mm') },
    { name: 'Focal shift', value: shown(focus.shiftMm, 1, ' mm') },
    { name: 'Level there over that at the focus', value: shown(focus.riseDb, 2, ' dB') },
    { name: 'Half power from, to', value: `${shown(from, 0, ' mm')}, ${shown(to, 0, ' mm')}` },
  ];
}

function vortexFacts(vortex: Figures['vortex']): readonly LawFact[] {
  if (vortex === undefined) return [];
  if (!isVortex(vortex)) return [{ name: 'Ring', value: `– (${vortex.reason})` }];
  const { ringDeg, purity, axisDb } = vortex;
  return [
    { name: 'Ring off the axis', value: shown(ringDeg, 2, '°') },
    { name: 'Power on the ring in the wanted order', value: shown(purity * 100, 1, ' %') },
    { name: 'Level on the axis against the ring', value: shown(axisDb, 1, ' dB') },
  ];
}

function isVortex(vortex: NonNullable<Figures['vortex']>): vortex is VortexFigures {
  return 'ringDeg' in vortex && 'axisDb' in vortex;
}

function isFocus(focus: NonNullable<Figures['focus']>): focus is FocusFigures {
  return 'profile' in focus && 'halfPowerMm' in focus;
}

/** The level along the axis, drawn from the panel outward, with the half-power level. */
export function axialFigure({ focus }: Figures): LineFigure | null {
  if (focus === undefined || !isFocus(focus)) return null;
  const { distanceMm, levelDb } = focus.profile;
  const chosen = distanceMm.reduce((nearest, mm, i) => (Math.abs(mm - focus.distanceMm) < Math.abs(distanceMm[nearest] - focus.distanceMm) ? i : nearest), 0);
  return {
    title: 'Level along the axis of the focus',
    x: { title: 'distance from the panel, mm', from: 0, to: distanceMm[distanceMm.length - 1] },
    y: { title: 'below the maximum, dB', from: -20, to: 1, step: 5 },
    lines: [{ label: 'S', x: distanceMm, y: levelDb.map((level) => Math.max(-20, level)), ink: 'ink' }],
    levels: [{ at: -3, label: 'half power' }],
    chosen: { at: chosen, label: 'focus' },
  };
}
