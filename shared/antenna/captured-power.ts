import type { Cells } from '../model/design-document';
import type { Figure } from '../model/figures';
import { powerRatioToDb } from '../units/decibels';
import { guideLengthM } from './guided-wave/guided-wave-illumination';
import { leakedShare } from './guided-wave/leaked-power';
import { hornCapturedShare } from './horn-spillover';
import { noFigure, nothingLit } from './no-figure';
import type { SiDesign } from './si-design';

/** What of the source's power the cells get. */
export interface CapturedPower {
  readonly spilloverDb: Figure;
  readonly spilloverUncertaintyDb: number;
  /** Share of the source's power that reaches the cells, as it counts in the gain. */
  readonly capturedDb: Figure;
}

/** Spillover of a horn; the leaked share of a guided wave; a plane wave has no power to take a share of. */
export function capturedPower({ illumination, panel }: SiDesign): CapturedPower {
  if (illumination.kind === 'plane-wave') {
    return without(noFigure('plane-wave', 'a plane wave fills all space, so no share of it misses the panel'), 0);
  }
  if (illumination.kind === 'guided-wave') {
    const share = leakedShare(illumination.leakageNpPerM, guideLengthM(illumination, panel.outline));
    return without(noFigure('guided-wave', 'a guided wave misses no panel; what it does not leak is in the leaked share'), powerRatioToDb(share));
  }
  const { fraction, uncertainty } = hornCapturedShare(illumination, panel.outline);
  if (fraction <= 0) return { spilloverDb: nothingLit(), spilloverUncertaintyDb: 0, capturedDb: nothingLit() };
  const spilloverDb = Math.min(0, powerRatioToDb(fraction));
  return { spilloverDb, spilloverUncertaintyDb: powerRatioToDb(1 + uncertainty / fraction), capturedDb: spilloverDb };
}

function without(spilloverDb: Figure, capturedDb: number): CapturedPower {
  return { spilloverDb, spilloverUncertaintyDb: 0, capturedDb };
}

/**
 * The cell loss as it stands among the figures. What a resonant cell does not couple goes on in the guide: the leaked
 * share has counted it, so there is no loss of the cells themselves.
 */
export function countedCellLossDb(cells: Cells, cellLossDb: Figure): Figure {
  return cells.kind === 'resonant' ? noFigure('resonant', 'what a resonant cell does not couple stays in the guide and is in the leaked share') : cellLossDb;
}
