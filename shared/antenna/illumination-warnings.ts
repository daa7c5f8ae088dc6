import type { NoFigure, Warning } from '../model/figures';
import { hornAxis } from './horn-field';
import { noFigure } from './no-figure';
import { outlineBounds, rowIntervals } from './outline';
import type { SiDesign, SiHorn, SiOutline } from './si-design';

/** Remarks on where the horn stands and looks. */
export function illuminationWarnings(si: SiDesign, litCount: number): Warning[] {
  if (si.illumination.kind !== 'horn') return [];
  return [...sideWarning(si.illumination, si.operation), ...aimWarning(si.illumination, si.panel.outline, litCount)];
}

/**
 * Why no line of the requirement can be judged: the model reckons only with what reaches a cell, so it gives figures for
 * a horn on the side from which the panel cannot work, too.
 */
export function wrongSide(si: SiDesign): NoFigure | undefined {
  if (si.illumination.kind !== 'horn' || isOnItsSide(si.illumination, si.operation)) return undefined;
  return noFigure('behind-panel', si.operation === 'reflect' ? 'the horn stands behind a reflecting panel' : 'the horn stands in front of a transmitting panel');
}

function isOnItsSide(horn: SiHorn, operation: SiDesign['operation']): boolean {
  return horn.position.zM > 0 === (operation === 'reflect');
}

function sideWarning(horn: SiHorn, operation: SiDesign['operation']): Warning[] {
  if (isOnItsSide(horn, operation)) return [];
  const zMm = horn.position.zM * 1000;
  return [
    {
      code: 'behind-panel',
      pointer: '#/illumination/positionMm/2',
      severity: 'serious',
      message:
        operation === 'reflect'
          ? `A reflecting panel is lit from in front, z > 0; the horn stands at z = ${zMm.toFixed(1)} mm, behind it.`
          : `A transmitting panel is lit from behind, z < 0; the horn stands at z = ${zMm.toFixed(1)} mm, in front of it.`,
      numbers: { zMm },
    },
  ];
}

function aimWarning(horn: SiHorn, outline: SiOutline, litCount: number): Warning[] {
  const [bx, by, bz] = hornAxis(horn);
  const along = -horn.position.zM / bz;
  const reaches = bz !== 0 && along > 0;
  const xM = horn.position.xM + along * bx;
  const yM = horn.position.yM + along * by;
  if (reaches && isInside(outline, xM, yM)) return [];
  return [
    {
      code: 'illumination-misses',
      pointer: '#/illumination/aimMm',
      severity: litCount === 0 ? 'serious' : 'warn',
      message: reaches
        ? `The axis of the horn meets the plane of the panel at x = ${(xM * 1000).toFixed(1)}, y = ${(yM * 1000).toFixed(1)} mm, outside its outline.`
        : 'The axis of the horn never meets the plane of the panel.',
      numbers: reaches ? { xMm: xM * 1000, yMm: yM * 1000, litCells: litCount } : { litCells: litCount },
    },
  ];
}

function isInside(outline: SiOutline, xM: number, yM: number): boolean {
  const { bottomM, topM } = outlineBounds(outline);
  return yM >= bottomM && yM <= topM && rowIntervals(outline, yM).some(([from, to]) => xM >= from && xM <= to);
}
