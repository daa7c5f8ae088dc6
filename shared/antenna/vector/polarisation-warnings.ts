import type { DesignDocument, Polarisation } from '../../model/design-document';
import type { Warning } from '../../model/figures';
import { ORTHOGONAL } from './vector-pattern';

const isCircular = (polarisation: Polarisation): boolean => polarisation === 'rhcp' || polarisation === 'lhcp';

/** What an unrotated cell makes of the polarisation that lights it: metal-like reflection turns a circular sense around, passing through keeps it. */
function returned(lit: Polarisation, operation: DesignDocument['panel']['operation']): Polarisation {
  return isCircular(lit) && operation === 'reflect' ? ORTHOGONAL[lit] : lit;
}

/** In the vector model the polarisation of the beam follows from that of the source and the cells; the scalar one does not ask. */
export function polarisationWarnings({ prediction, requirement, illumination, panel }: DesignDocument): Warning[] {
  if (prediction.model !== 'vector') return [];
  const wanted = requirement.polarisation;
  const lit = illumination.polarisation;
  const given = returned(lit, panel.operation);
  // Half of a linear wave is of either circular sense and the other way round: a loss that the budget shows, no contradiction.
  if (given === wanted || isCircular(given) !== isCircular(wanted)) return [];
  const message = isCircular(wanted)
    ? `The beam is wanted ${wanted} and the panel is lit with ${lit}: cells that are not rotated ${panel.operation === 'reflect' ? 'turn its sense around on reflection' : 'keep its sense'}, so the beam is ${given}.`
    : `The beam is wanted along ${wanted} and the panel is lit with ${lit}: the wanted polarisation is only what the cells and the geometry convert.`;
  return [{ code: 'polarisation', pointer: '#/illumination/polarisation', severity: 'serious', message, numbers: {} }];
}
