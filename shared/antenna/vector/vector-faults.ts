import type { DesignDocument } from '../../model/design-document';
import type { DesignFault } from '../invalid-design';

/** Why a guided wave has no vector prediction. */
export const NO_RAYS: DesignFault = {
  pointer: '#/prediction/model',
  detail: 'a guided wave meets its cells at no angle, so the vector model has no plane of incidence; choose the scalar one',
};

/** Harmonics are those of one complex sequence to a cell. */
const NO_HARMONICS: DesignFault = {
  pointer: '#/prediction/model',
  detail: 'time-modulated cells have a harmonic for one response, not for two polarisations; choose the scalar model',
};

export function vectorFaults({ prediction, illumination, cells }: DesignDocument): DesignFault[] {
  if (prediction.model !== 'vector') return [];
  return [...(illumination.kind === 'guided-wave' ? [NO_RAYS] : []), ...(cells.kind === 'modulated' ? [NO_HARMONICS] : [])];
}
