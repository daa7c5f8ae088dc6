import type { BandParameters } from '../../model/band-run';
import type { DesignDocument } from '../../model/design-document';
import type { DesignFault } from '../invalid-design';

/** A design with what is asked of its band. */
export interface BandQuestion {
  readonly design: DesignDocument;
  readonly parameters: BandParameters;
}

/** Faults between the parameters of a band run and its design. */
export function bandFaults({ design, parameters }: BandQuestion): DesignFault[] {
  return [...edgeFaults(design, parameters), ...phaseCentreFaults(design, parameters)];
}

function edgeFaults({ requirement }: DesignDocument, { bandGHz }: BandParameters): DesignFault[] {
  const band = bandGHz ?? requirement.bandGHz;
  if (band === undefined) return [{ pointer: '#/parameters/bandGHz', detail: 'say the band: the requirement names none' }];
  const pointer = bandGHz === undefined ? '#/design/requirement/bandGHz' : '#/parameters/bandGHz';
  return band[0] < band[1] ? [] : [{ pointer, detail: `must rise; got ${band[0]} to ${band[1]} GHz` }];
}

function phaseCentreFaults({ illumination }: DesignDocument, { phaseCentre }: BandParameters): DesignFault[] {
  if (phaseCentre === undefined) return [];
  if (illumination.kind !== 'horn') return [{ pointer: '#/parameters/phaseCentre', detail: 'only a horn has a phase centre that moves' }];
  const faults: DesignFault[] = [];
  phaseCentre.forEach(([frequencyGHz], i) => {
    if (i > 0 && frequencyGHz <= phaseCentre[i - 1][0]) {
      faults.push({ pointer: `#/parameters/phaseCentre/${i}/0`, detail: `frequencies must rise; got ${frequencyGHz} after ${phaseCentre[i - 1][0]} GHz` });
    }
  });
  const { positionMm, aimMm } = illumination;
  const distanceMm = Math.hypot(...positionMm.map((coordinate, axis) => aimMm[axis] - coordinate));
  phaseCentre.forEach(([, offsetMm], i) => {
    const heightMm = positionMm[2] + (offsetMm / distanceMm) * (aimMm[2] - positionMm[2]);
    if (offsetMm >= distanceMm || heightMm * positionMm[2] <= 0) {
      faults.push({ pointer: `#/parameters/phaseCentre/${i}/1`, detail: `${offsetMm} mm would take the phase centre to its aim or through the panel; the aim is ${round(distanceMm)} mm away` });
    }
  });
  return faults;
}

const round = (value: number): number => Math.round(value * 100) / 100;
