import type { Direction } from '../../waves/conventions';
import { powerRatioToDb } from '../../units/decibels';
import { hornPatternField } from '../horn-field';
import { hornPower } from '../horn-field';
import { noFigure } from '../no-figure';
import type { Figure } from '../../model/figures';
import { outlineBounds, rowIntervals } from '../outline';
import type { SiHorn, SiOutline } from '../si-design';

/** True where the straight way from the horn in a direction meets the panel. */
export function meetsPanel({ position }: SiHorn, outline: SiOutline, { u, v, w }: Direction): boolean {
  const along = w === 0 ? -1 : -position.zM / w;
  if (along <= 0) return false;
  const [x, y] = [position.xM + along * u, position.yM + along * v];
  const { bottomM, topM } = outlineBounds(outline);
  return y >= bottomM && y <= topM && rowIntervals(outline, y).some(([from, to]) => x >= from && x <= to);
}

/** Gain of the horn itself in a direction that misses the panel: what passes its rim. */
export function spilloverLevelDbi(horn: SiHorn, outline: SiOutline, direction: Direction): Figure {
  if (meetsPanel(horn, outline, direction)) return noFigure('blocked', 'the panel stands in that direction');
  const field = hornPatternField(horn, direction);
  if (field <= 0) return noFigure('behind-horn', 'the horn radiates nothing behind itself');
  return powerRatioToDb((4 * Math.PI * field * field) / hornPower(horn));
}
