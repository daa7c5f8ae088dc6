import { curveOverCells } from '../../../../shared/antenna/response-curve';
import type { PreparedEdition } from '../../../../shared/antenna/prepare-edition';
import type { LineFigure } from '../../ui/plots/line-figure';
import { phaseCoverage } from './phase-coverage';
import type { PhaseCoverage } from './phase-coverage';

export interface EditionCurve {
  readonly figure: LineFigure;
  readonly coverage: PhaseCoverage | null;
  /** Cell of the edition at each sample of the curve. */
  readonly cellIndex: Int32Array;
  /** Phase of each cell at the small angle, by its index. */
  readonly phaseDegOf: ReadonlyMap<number, number>;
}

export interface CurveQuestion {
  readonly frequencyGHz: number;
  /** The steepest incidence of the panel. */
  readonly steepestDeg: number;
  readonly polarisation: 'x' | 'y';
  /** How often each cell is used, by its index. */
  readonly use: Int32Array;
}

/** Phase against the first parameter at the smallest and at the steepest angle, with how often each cell is used. */
export function editionCurve(prepared: PreparedEdition, { frequencyGHz, steepestDeg, polarisation, use }: CurveQuestion): EditionCurve {
  const flatDeg = (prepared.smallestThetaRad * 180) / Math.PI;
  const steepDeg = Math.min(steepestDeg, (prepared.largestThetaRad * 180) / Math.PI);
  const fixed = { cellIndex: 0, frequencyGHz, azimuthDeg: 0, polarisation };
  const flat = curveOverCells(prepared, { ...fixed, incidenceDeg: flatDeg });
  const steep = steepDeg > flatDeg + 0.5 ? curveOverCells(prepared, { ...fixed, incidenceDeg: steepDeg }) : null;
  const phases = [...flat.phaseDeg, ...(steep?.phaseDeg ?? [])];
  const [parameter] = prepared.edition.description.parameters;
  const from = flat.abscissa[0];
  const to = flat.abscissa[flat.abscissa.length - 1];
  const room = to > from ? (to - from) * 0.03 : 1;
  return {
    cellIndex: flat.cellIndex,
    coverage: phaseCoverage(flat.phaseDeg),
    phaseDegOf: new Map(Array.from(flat.cellIndex, (cell, i) => [cell, flat.phaseDeg[i]])),
    figure: {
      title: 'Phase of the cells',
      x: { title: `${parameter.label}, mm`, from: from - room, to: to + room },
      y: { title: 'unwrapped phase, °', from: Math.floor(Math.min(...phases) / 90) * 90, to: Math.ceil(Math.max(...phases) / 90) * 90, step: 90 },
      lines: [
        { label: `at ${flatDeg.toFixed(0)}°`, x: flat.abscissa, y: flat.phaseDeg, ink: 'ink', squares: flat.abscissa.length <= 80 },
        ...(steep ? [{ label: `at ${steepDeg.toFixed(0)}°`, x: steep.abscissa, y: steep.phaseDeg, ink: 'patina' as const, dashed: true }] : []),
      ],
      bars: { x: flat.abscissa, counts: Float64Array.from(flat.cellIndex, (cell) => use[cell]) },
    },
  };
}
