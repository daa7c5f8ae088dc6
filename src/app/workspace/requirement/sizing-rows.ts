import type { SizingAdvice } from '../../../../shared/antenna/sizing/size-panel';
import { sizedDesign } from '../../../../shared/antenna/sizing/sized-design';
import { designFaults } from '../../../../shared/antenna/design-faults';
import { designDocument } from '../../../../shared/model/design-document';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { degFromRad } from '../../../../shared/units/angles';
import { powerRatioToDb } from '../../../../shared/units/decibels';
import { fieldLabel } from '../../../../shared/model/design-labels';
import { designPartText } from '../../../../shared/model/design-text';
import { figureText } from '../strip-figures';

export interface SizingRow {
  readonly name: string;
  readonly value: string;
}

/** Why a proposal cannot be taken; null where it can. */
export function proposalObstacle(proposal: DesignDocument): string | null {
  const parsed = designDocument.safeParse(proposal);
  if (!parsed.success) return `${nameOf(parsed.error.issues[0].path.map(String).join('/'))} would lie outside its range`;
  const [fault] = designFaults(proposal);
  return fault === undefined ? null : `${nameOf(fault.pointer.replace(/^#\//, ''))} ${fault.detail}`;
}

/** The panel as a whole has no field of its own. */
function nameOf(path: string): string {
  return path === 'panel' ? 'the panel' : fieldLabel(`/${path}`).label.toLowerCase();
}

/** The advice as it would stand in the design. */
export function sizingRows(advice: SizingAdvice, design: DesignDocument): readonly SizingRow[] {
  const { panel, illumination } = sizedDesign(design, advice);
  const horn = illumination.kind === 'horn' ? illumination : null;
  return [
    { name: 'Outline', value: String(designPartText(panel.outline)) },
    { name: 'Lattice', value: String(designPartText(panel.lattice)) },
    { name: 'Period limited by', value: `${advice.periodLimitedBy} of ${figureText(degFromRad(advice.periodLimitedBy === 'scan' ? advice.steepestScanRad : advice.largestIncidenceRad), 1)}°` },
    { name: 'Horn at', value: horn ? `${horn.positionMm.map((mm) => String(mm).replace('-', '−')).join(', ')} mm` : '–' },
    { name: 'Horn exponent q', value: horn ? String(horn.exponentE) : '–' },
    { name: 'Spillover and taper', value: `${figureText(powerRatioToDb(advice.illuminationEfficiency), 2)} dB` },
  ];
}
