import { powerRatioToDb } from '../../units/decibels';
import type { Figure } from '../../model/figures';
import type { CellAssignment } from '../cell-stock';
import { noFigure, nothingLit } from '../no-figure';
import type { PanelLattice } from '../panel-lattice';
import type { SiDesign } from '../si-design';
import { gainBudget, type BudgetResult } from './gain-budget';
import { vectorHornPower } from './vector-horn';
import { wavePower } from './vector-light';
import { vectorPattern, type VectorPattern } from './vector-pattern';
import { vectorCapturedShare } from './vector-spillover';
import type { VectorPlacement } from './vector-stock';

/** What the vector model needs of a placed design. */
export interface PlacedVector {
  readonly si: SiDesign;
  readonly lattice: PanelLattice;
  readonly light: { readonly pathM: Float64Array };
  readonly assignment: CellAssignment;
  readonly vector: VectorPlacement;
}

/** A placed design in use at one frequency, as the vector model sees it. */
export interface VectorState {
  readonly pattern: VectorPattern;
  /** Undefined where nothing of the wanted polarisation goes to the beam. */
  readonly result: BudgetResult | undefined;
  readonly spilloverDb: Figure;
  readonly spilloverUncertaintyDb: number;
  readonly cellLossDb: Figure;
  /** Gain less directivity: the power radiated over that of the source. */
  readonly gainOffsetDb: Figure;
  /** Power radiated, by the far field of the model, over the power that leaves the cells. */
  readonly radiatedOverLeavingDb: Figure;
}

export function vectorState(placed: PlacedVector, frequencyHz: number, wavenumber: number): VectorState {
  const { lattice, light, assignment, vector } = placed;
  const leaving = vector.stock.leaving(assignment, frequencyHz);
  const query = { lattice, light: vector.waves, pathM: light.pathM, leaving, wavenumber, form: vector.form };
  const pattern = vectorPattern(query);
  const captured = lattice.cellAreaM2 * wavePower(vector.waves);
  const out = lattice.cellAreaM2 * wavePower(leaving);
  const { share, uncertainty, sourcePower, spilloverDb } = sourceOf(placed, captured);
  return {
    pattern,
    result: gainBudget({ ...query, capturedShare: share, sourcePower }),
    spilloverDb,
    spilloverUncertaintyDb: share > 0 ? powerRatioToDb(1 + uncertainty / share) : 0,
    cellLossDb: ratioDb(out, captured),
    gainOffsetDb: ratioDb(pattern.radiatedPower, sourcePower),
    radiatedOverLeavingDb: ratioDb(pattern.radiatedPower, out),
  };
}

function ratioDb(part: number, whole: number): Figure {
  if (whole <= 0) return nothingLit();
  return part > 0 ? powerRatioToDb(part / whole) : noFigure('nothing-reflected', 'no lit cell returns anything');
}

interface Source {
  readonly share: number;
  readonly uncertainty: number;
  readonly sourcePower: number;
  readonly spilloverDb: Figure;
}

/** The power that gain is reckoned against: the horn's, or what a plane wave brings to the cells. */
function sourceOf({ si: { illumination, panel } }: PlacedVector, captured: number): Source {
  if (illumination.kind !== 'horn') {
    return { share: 1, uncertainty: 0, sourcePower: captured, spilloverDb: noFigure('plane-wave', 'a plane wave fills all space, so no share of it misses the panel') };
  }
  const { fraction, uncertainty } = vectorCapturedShare(illumination, panel.outline);
  const spilloverDb = fraction > 0 ? Math.min(0, powerRatioToDb(fraction)) : nothingLit();
  return { share: fraction, uncertainty, sourcePower: vectorHornPower(illumination), spilloverDb };
}
