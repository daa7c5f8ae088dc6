import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';

/** A state of a demonstration panel, frozen with a message that its figures bear out; a test holds them against each other. */
export interface DemoRevision {
  readonly message: string;
  readonly design: DesignDocument;
  /** Family whose newest edition the cells come from; ideal cells where absent. */
  readonly familyName?: string;
}

export interface DemoPanel {
  readonly name: string;
  readonly revisions: readonly DemoRevision[];
}

export const DEMO_PROJECT = 'Merrow Point sea-rescue link';

/** Standing for the edition, which is known only by name here. */
const cellsOfEdition = (editionId: string): DesignDocument['cells'] => ({ kind: 'edition', editionId, rule: 'nearest-phase', excludedCells: [] });

/** The design with the cells of this edition. */
export const onEdition = (design: DesignDocument, editionId: string): DesignDocument => ({ ...design, cells: cellsOfEdition(editionId) });

const lighthouse: DesignDocument = {
  ...STARTING_DESIGN,
  requirement: {
    ...STARTING_DESIGN.requirement,
    mask: { kind: 'custom', points: [[4, 18], [8, 15], [20, 8], [40, 1], [60, -1], [90, -1]] },
  },
};

const steered = (design: DesignDocument, thetaDeg: number): DesignDocument => ({
  ...design,
  requirement: { ...design.requirement, beams: [{ thetaDeg, phiDeg: 0 }] },
});
const searched = (design: DesignDocument): DesignDocument => ({ ...design, referencePhaseDeg: 'search' });

const lighthousePanel: DemoPanel = {
  name: 'A, lighthouse relay',
  revisions: [
    {
      message: 'Ideal phase at every cell: what this size, horn and beam could give at best. Every line is met, the mask with 1.8 dB to spare.',
      design: lighthouse,
    },
    {
      message: 'Four states 90° apart, which would be the cheapest to make. Costs 0.8 dB of gain, still enough, but the rounding lifts far sidelobes 4.0 dB above the mask.',
      design: lighthouse,
      familyName: 'Four-state ring and patch, 5 mm lattice',
    },
    {
      message: 'Ring and patch with all sizes, reference phase searched, beam moved to 19.5° to see how much the mast would have to turn. Gain is back, but one lobe exceeds the mask by 0.3 dB.',
      design: searched(steered(lighthouse, 19.5)),
      familyName: 'Ring and patch, 5 mm lattice',
    },
    {
      message: 'Beam at 20° again as the survey asks, same cells. Every line is met, the mask with 0.7 dB to spare.',
      design: searched(lighthouse),
      familyName: 'Ring and patch, 5 mm lattice',
    },
  ],
};

const slipway: DesignDocument = {
  ...STARTING_DESIGN,
  requirement: {
    designFrequencyGHz: 28,
    beams: [{ thetaDeg: 38, phiDeg: 75 }],
    polarisation: 'x',
    minGainDbi: 35,
    pointingToleranceDeg: 0.3,
    maxSidelobeDb: -12,
    mask: { kind: 'custom', points: [[5, 28], [10, 22], [20, 18], [40, 14], [90, 12]] },
  },
  panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 300, heightMm: 300 } },
  illumination: { kind: 'plane-wave', thetaDeg: 20, phiDeg: 200, polarisation: 'x' },
};

const slipwayPanel: DemoPanel = {
  name: 'B, slipway wall',
  revisions: [
    {
      message: 'Two phase states under the wave from the mast. The gain would do, but rounding to two states makes an image of the beam on the other side, just as strong: not usable.',
      design: { ...slipway, cells: { kind: 'ideal', levels: 2 } },
    },
    {
      message: 'Square patches described against the angle of incidence. The image is gone, 3.4 dB of gain are won, and every line is met.',
      design: slipway,
      familyName: 'Square patch, 5 mm lattice, oblique incidence',
    },
  ],
};

const training: DesignDocument = {
  ...STARTING_DESIGN,
  requirement: {
    designFrequencyGHz: 10,
    beams: [{ thetaDeg: 25, phiDeg: 0 }, { thetaDeg: 25, phiDeg: 180 }],
    polarisation: 'x',
    minGainDbi: 27.5,
    pointingToleranceDeg: 0.5,
    maxSidelobeDb: -10,
  },
  panel: {
    operation: 'reflect',
    outline: { kind: 'ellipse', widthMm: 450, heightMm: 450 },
    lattice: { kind: 'rectangular', periodXMm: 15, periodYMm: 15 },
    keepOuts: [],
  },
  illumination: { kind: 'horn', positionMm: [0, 0, 400], aimMm: [0, 0, 0], exponentE: 6.5, exponentH: 6.5, polarisation: 'x' },
};

const trainingPanel: DemoPanel = {
  name: 'C, training, two beams',
  revisions: [
    {
      message: 'Two beams from one horn in the middle. Every line is met, but on cells described at normal incidence alone while the horn lights the rim at 29°: not to be trusted yet.',
      design: training,
      familyName: 'Square patch, 15 mm lattice',
    },
    {
      message: 'The same patches described against the angle of incidence. Gain moves by less than 0.05 dB and every line is still met, so the normal-incidence data were good enough here.',
      design: training,
      familyName: 'Square patch, 15 mm lattice, oblique incidence',
    },
  ],
};

export const DEMO_PANELS: readonly DemoPanel[] = [lighthousePanel, slipwayPanel, trainingPanel];
