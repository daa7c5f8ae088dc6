import type { Figure, Figures } from '../../../../shared/model/figures';
import type { FocusFigures, VortexFigures } from '../../../../shared/model/law-figures';
import type { LineFigure } from '../../ui/plots/line-figure';
import { figureText } from '../strip-figures';

export interface LawFact {
  readonly name: string;
  readonly value: string;
}

/** What a target phase of its own kind turned out to do, in words and numbers. */
export function lawFacts({ focus, vortex }: Figures): readonly LawFact[] {
  return [...focusFacts(focus), ...vortexFacts(vortex)];
}

const shown = (figure: Figure, digits: number, unit: string): string => (typeof figure === 'number' ? `${figureText(figure, digits)}${unit}` : `– (${figure.reason})`);

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
