import type { DesignDocument } from '../../model/design-document';
import type { DesignFault } from '../invalid-design';
import { sequenceOf } from './modulated-stock';
import { harmonicAmplitude } from './switching-sequence';

/** Below this a harmonic is rounding. */
const ABSENT = 1e-9;

/** Faults between the fields of time-modulated cells. */
export function modulationFaults({ cells, illumination }: DesignDocument): DesignFault[] {
  if (cells.kind !== 'modulated') return [];
  if (illumination.kind === 'guided-wave') return [{ pointer: '#/cells/kind', detail: 'time-modulated cells are lit by a horn or a plane wave; got a guided wave' }];
  const { edges, states, harmonic } = cells;
  if (edges) {
    const fits = edges.length === states.length + 1 && edges[0] === 0 && edges[edges.length - 1] === 1 && edges.every((edge, i) => i === 0 || edge > edges[i - 1]);
    if (!fits) return [{ pointer: '#/cells/edges', detail: `must rise from 0 to 1 in ${states.length} parts, one for each state; got ${edges.join(', ')}` }];
  }
  if (harmonic === 0) return [{ pointer: '#/cells/harmonic', detail: 'delays do not turn the carrier; steer another harmonic than 0' }];
  const { re, im } = harmonicAmplitude(sequenceOf(cells), harmonic);
  return Math.hypot(re, im) > ABSENT ? [] : [{ pointer: '#/cells/harmonic', detail: `this sequence has nothing at harmonic ${harmonic}` }];
}
