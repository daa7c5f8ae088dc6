import type { Mask } from '../../model/design-document';
import type { DesignFault } from '../invalid-design';
import { unknownMaskText } from './mask-envelope';
import { maskFormula } from './mask-formula';
import { publishedMask } from './published-masks';

/** Levels of a mask lie between these, as those of its points do. */
const MOST_LEVEL_DB = 200;
/** A formula is tried at so many angles of its stretch. */
const TRIED = 361;

/** Faults of a mask that its schema does not show. `at` is the pointer of the mask. */
export function maskFaults(mask: Mask | undefined, at: string): DesignFault[] {
  if (mask === undefined) return [];
  switch (mask.kind) {
    case 'published':
      return publishedFaults(mask, at);
    case 'custom':
      return mask.points.flatMap(([angle], i, points) =>
        i > 0 && angle <= points[i - 1][0] ? [{ pointer: `${at}/points/${i}/0`, detail: `angles must rise; got ${angle} after ${points[i - 1][0]}°` }] : [],
      );
    case 'formula':
      return mask.segments.flatMap((segment, i) => [...segmentFaults(mask, i, at), ...expressionFaults(segment, `${at}/segments/${i}/expression`)]);
  }
}

function publishedFaults({ id, spilloverDeg }: Extract<Mask, { kind: 'published' }>, at: string): DesignFault[] {
  const published = publishedMask(id);
  if (!published) return [{ pointer: `${at}/id`, detail: unknownMaskText(id) }];
  if (spilloverDeg === undefined) return [];
  if (published.rule.kind !== 'allowance') return [{ pointer: `${at}/spilloverDeg`, detail: `${published.title} allows nothing more in a spillover region` }];
  return spilloverDeg[0] < spilloverDeg[1] ? [] : [{ pointer: `${at}/spilloverDeg`, detail: `must rise; got ${spilloverDeg[0]} to ${spilloverDeg[1]}°` }];
}

function segmentFaults({ segments }: Extract<Mask, { kind: 'formula' }>, i: number, at: string): DesignFault[] {
  const { fromDeg, toDeg } = segments[i];
  const faults: DesignFault[] = [];
  if (toDeg <= fromDeg) faults.push({ pointer: `${at}/segments/${i}/toDeg`, detail: `must be greater than ${fromDeg}°; got ${toDeg}` });
  if (i > 0 && fromDeg < segments[i - 1].toDeg) {
    faults.push({ pointer: `${at}/segments/${i}/fromDeg`, detail: `must not lie before the end of the stretch before it, ${segments[i - 1].toDeg}°; got ${fromDeg}` });
  }
  return faults;
}

function expressionFaults({ fromDeg, toDeg, expression }: { fromDeg: number; toDeg: number; expression: string }, pointer: string): DesignFault[] {
  const formula = maskFormula(expression);
  if (formula.kind === 'fault') return [{ pointer, detail: formula.detail }];
  for (let i = 0; i < TRIED; i++) {
    const angle = fromDeg + ((toDeg - fromDeg) * i) / (TRIED - 1);
    const level = formula.levelDb(angle);
    if (Number.isFinite(level) && Math.abs(level) <= MOST_LEVEL_DB) continue;
    return [{ pointer, detail: `must give a level within ±${MOST_LEVEL_DB} dB; gives ${level} at ${Number(angle.toPrecision(6))}°` }];
  }
  return [];
}
