import type { Figure, NoFigure } from '../../model/figures';
import type { ExposureLimit } from '../../model/transmission-figures';

/*
 * A reason may carry fields of any name, so that a figure which is an object cannot be told from one by a name alone:
 * one that has a reason is none.
 */

export function isReason(value: object): value is NoFigure {
  return 'reason' in value;
}

/** Distance to a limit, or why there is none. */
export function limitDistance(limit: ExposureLimit | NoFigure): Figure {
  return isReason(limit) ? limit : limit.distanceM;
}

