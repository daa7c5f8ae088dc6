import type { DesignDocument } from '../../model/design-document';
import { CONTRIBUTORS } from '../../model/tolerance-contributors';
import type { ToleranceContributor, ToleranceParameters } from '../../model/tolerance-run';
import type { DesignFault } from '../invalid-design';

/** A design with what is asked of its tolerances. */
export interface ToleranceQuestion {
  readonly design: DesignDocument;
  readonly parameters: ToleranceParameters;
}

/** Faults between the parameters of a tolerance run and its design. */
export function toleranceFaults({ design, parameters }: ToleranceQuestion): DesignFault[] {
  const varied = parameters.contributors.filter(({ spread }) => spread > 0);
  if (varied.length === 0) return [{ pointer: '#/parameters/contributors', detail: 'give at least one contributor a spread above 0' }];
  const present = { geometry: design.cells.kind === 'edition', horn: design.illumination.kind === 'horn' };
  const acts = ({ id }: ToleranceContributor): boolean => {
    const { needs } = CONTRIBUTORS[id];
    return needs === null || present[needs];
  };
  if (varied.some(acts)) return [];
  const names = varied.map(({ id }) => CONTRIBUTORS[id].label.toLowerCase()).join(', ');
  return [{ pointer: '#/parameters/contributors', detail: `nothing that acts on this design is varied: ${names} need cells of an edition or a horn` }];
}
