import type { DesignDocument } from '../../model/design-document';
import type { DesignFault } from '../invalid-design';

/** Why a guided wave has no vector prediction. */
export const NO_RAYS: DesignFault = {
  pointer: '#/prediction/model',
  detail: 'a guided wave meets its cells at no angle, so the vector model has no plane of incidence; choose the scalar one',
};

export function vectorFaults({ prediction, illumination }: DesignDocument): DesignFault[] {
  return prediction.model === 'vector' && illumination.kind === 'guided-wave' ? [NO_RAYS] : [];
}
