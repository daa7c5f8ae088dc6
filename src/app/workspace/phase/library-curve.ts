import { coupledField } from '../../../../shared/antenna/guided-wave/resonant-cell';
import { curveOverCells } from '../../../../shared/antenna/response-curve';
import type { PreparedEdition } from '../../../../shared/antenna/prepare-edition';
import { degFromRad, wrapDeg } from '../../../../shared/units/angles';
import type { LineFigure } from '../../ui/plots/line-figure';
import { numberText } from '../../ui/plots/plot-text';
import type { LivePrediction } from '../live-prediction-data';
import type { EditionInUse } from '../workspace-state';
import { cellName } from './cell-name';

/** What the cells offer at the position of the chosen one, and how often each is used. */
export interface LibraryCurve {
  readonly title: string;
  readonly unit: string;
  readonly figure: LineFigure;
  /** Cell of the stock at each sample. */
  readonly cellOfSample: readonly number[];
}

export interface CurveSource {
  readonly prediction: LivePrediction;
  readonly edition: EditionInUse | null;
  readonly prepared: PreparedEdition | null;
  /** Position on the panel. */
  readonly cell: number;
}

/** Null where the phase is continuous, or while the edition is not at hand. */
export function libraryCurve(source: CurveSource): LibraryCurve | null {
  const { cells } = source.prediction.of;
  if (cells.kind === 'edition') return editionCurve(source);
  if (cells.kind === 'inline') return tableCurve(source, cells.cells.map(({ phaseDeg }) => phaseDeg), 'Table of cells');
  if (cells.kind === 'modulated') return null;
  if (cells.kind === 'resonant') {
    const { states } = cells;
    return states === null ? null : tableCurve(source, Array.from({ length: states }, (_, k) => degFromRad(coupledField((2 * Math.PI * k) / states, { magnitude: 0, phaseRad: 0 }).phaseRad)), 'States of a resonant cell');
  }
  const { levels } = cells;
  return levels === null ? null : tableCurve(source, Array.from({ length: levels }, (_, i) => (360 * i) / levels), 'Phase levels');
}

export function timesUsed({ cells }: LivePrediction, stockSize: number): Int32Array {
  const used = new Int32Array(stockSize);
  for (let i = 0; i < cells.cellIndex.length; i++) if (cells.cellIndex[i] >= 0) used[cells.cellIndex[i]] += 1;
  return used;
}

function editionCurve({ prediction, edition, prepared, cell }: CurveSource): LibraryCurve | null {
  if (!prepared || !edition) return null;
  const { cells, of } = prediction;
  const frequencyGHz = of.requirement.designFrequencyGHz;
  const incidenceDeg = cells.incidenceDeg[cell];
  const curve = curveOverCells(prepared, { cellIndex: 0, frequencyGHz, incidenceDeg, azimuthDeg: cells.incidenceAzimuthDeg[cell], polarisation: of.illumination.polarisation === 'y' ? 'y' : 'x' });
  const chosen = cells.cellIndex[cell];
  // Of a family with several parameters the curve runs over the first, the others held as in the chosen cell.
  const held = (index: number): boolean => chosen < 0 || edition.cells[index].parametersMm.slice(1).every((value, i) => value === edition.cells[chosen].parametersMm[i + 1]);
  const samples = [...curve.cellIndex.keys()].filter((i) => held(curve.cellIndex[i]));
  const stock = samples.map((i) => curve.cellIndex[i]);
  const [parameter] = edition.description.parameters;
  return {
    title: 'Library curve',
    unit: `${numberText(frequencyGHz, 3)} GHz, ${incidenceText(prepared, incidenceDeg)}; bars: times used`,
    cellOfSample: stock,
    figure: curveFigure({ prediction, edition, cell }, { x: samples.map((i) => curve.abscissa[i]), y: samples.map((i) => curve.phaseDeg[i]), stock, xTitle: `${parameter.label}, mm`, used: timesUsed(prediction, edition.cells.length) }),
  };
}

/** Between the angles of the data the response is interpolated, beyond them that of the nearest angle holds. */
function incidenceText({ smallestThetaRad, largestThetaRad }: PreparedEdition, incidenceDeg: number): string {
  const [from, to] = [(smallestThetaRad * 180) / Math.PI, (largestThetaRad * 180) / Math.PI];
  if (from === to) return from === 0 ? 'normal incidence' : `incidence ${numberText(from, 0)}°`;
  return `incidence ${numberText(Math.max(from, Math.min(to, incidenceDeg)), 1)}°`;
}

function tableCurve({ prediction, edition, cell }: CurveSource, phasesDeg: readonly number[], title: string): LibraryCurve {
  const stock = phasesDeg.map((_, i) => i);
  const xTitle = prediction.of.cells.kind === 'inline' ? 'entry' : 'level';
  return {
    title,
    unit: 'bars: times used',
    cellOfSample: stock,
    figure: curveFigure({ prediction, edition, cell }, { x: stock.map((i) => i + 1), y: phasesDeg, stock, xTitle, used: timesUsed(prediction, phasesDeg.length) }),
  };
}

interface CurvePoints {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly stock: readonly number[];
  readonly xTitle: string;
  readonly used: Int32Array;
}

function curveFigure({ prediction, edition, cell }: Pick<CurveSource, 'prediction' | 'edition' | 'cell'>, { x, y, stock, xTitle, used }: CurvePoints): LineFigure {
  const { cells, of } = prediction;
  const [low, high] = [Math.min(...y), Math.max(...y)];
  const from = Math.floor((low - 20) / 90) * 90;
  const to = Math.ceil((high + 20) / 90) * 90;
  const target = wrapDeg(cells.targetPhaseDeg[cell]);
  const at = stock.indexOf(cells.cellIndex[cell]);
  const room = x.length > 1 ? (x[x.length - 1] - x[0]) * 0.04 : 1;
  return {
    title: 'Phase of the cells on offer',
    x: { title: xTitle, from: x[0] - room, to: x[x.length - 1] + room },
    y: { title: of.cells.kind === 'edition' ? 'unwrapped phase, °' : 'phase, °', from, to, step: to - from > 720 ? 180 : 90 },
    lines: [{ label: 'phase', x, y, ink: 'ink', squares: x.length <= 80 }],
    levels: targetLevels(target, low - 45, high + 45),
    bars: { x, counts: stock.map((index) => used[index]) },
    ...(at < 0 ? {} : { chosen: { at, label: `${cellName(of, edition, stock[at])}, ${numberText(wrapDeg(y[at]), 1)}°` } }),
  };
}

/** The target and the same phase whole turns away, as far as the curve reaches. */
function targetLevels(targetDeg: number, from: number, to: number): { readonly at: number; readonly label: string }[] {
  const levels: { readonly at: number; readonly label: string }[] = [];
  for (let turn = Math.ceil((from - targetDeg) / 360); targetDeg + 360 * turn <= to; turn++) {
    const label = turn === 0 ? `target ${numberText(targetDeg, 1)}°` : `the same ${turn < 0 ? '\u2212' : '+'} ${360 * Math.abs(turn)}°`;
    levels.push({ at: targetDeg + 360 * turn, label });
  }
  return levels;
}
