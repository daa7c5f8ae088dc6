import type { ContributorId, SpreadKind, ToleranceParameters } from './tolerance-run';

/** One thing that differs between the panel drawn and the panel made. */
export interface ContributorFacts {
  readonly label: string;
  /** Unit of its spread in the options. */
  readonly unit: 'mm' | '' | 'K' | '°';
  /** One draw for the whole panel, or one for every cell. */
  readonly extent: 'panel' | 'cell';
  /** What a design must have for it to act. */
  readonly needs: 'geometry' | 'horn' | null;
  /** Place of its draws in the random streams. Never changed: a seed must keep its meaning. */
  readonly channel: number;
  readonly spread: number;
  readonly distribution: SpreadKind;
  /** What the default rests on. */
  readonly source: string;
  /** What is varied, and how it acts. */
  readonly about: string;
}

const PRACTICE = 'common practice, no source';

/** Every contributor with its default. The channels of phase scatter, dead cells and etch are those of the published checks. */
export const CONTRIBUTORS: Readonly<Record<ContributorId, ContributorFacts>> = {
  'etch-random': {
    label: 'Etch, cell by cell', unit: 'mm', needs: 'geometry', extent: 'cell', channel: 2, spread: 0.01, distribution: 'normal', source: PRACTICE,
    about: 'Each patch is larger or smaller by a draw of its own; its phase follows the neighbouring sizes of the edition.',
  },
  'etch-common': {
    label: 'Etch, whole panel', unit: 'mm', needs: 'geometry', extent: 'panel', channel: 3, spread: 0.02, distribution: 'normal', source: PRACTICE,
    about: 'All patches are larger or smaller by the same.',
  },
  permittivity: {
    label: 'Permittivity', unit: '', needs: 'geometry', extent: 'panel', channel: 4, spread: 0.02, distribution: 'uniform', source: '± 0.02, usual on data sheets of laminates near 2.2; from memory',
    about: 'Relative permittivity of the whole substrate. Estimate: sheet of patches on a grounded slab.',
  },
  thickness: {
    label: 'Substrate thickness', unit: 'mm', needs: 'geometry', extent: 'panel', channel: 5, spread: 0.025, distribution: 'uniform', source: PRACTICE,
    about: 'Thickness of the whole substrate. Estimate: sheet of patches on a grounded slab.',
  },
  temperature: {
    label: 'Temperature', unit: 'K', needs: 'geometry', extent: 'panel', channel: 6, spread: 30, distribution: 'uniform', source: PRACTICE,
    about: 'Difference from the temperature of the cell data: the cells grow and their permittivity drifts. Estimate.',
  },
  lift: {
    label: 'Panel lifted', unit: 'mm', needs: null, extent: 'panel', channel: 7, spread: 0.5, distribution: 'uniform', source: PRACTICE,
    about: 'The whole panel stands nearer to the beam side by the same.',
  },
  'tilt-x': {
    label: 'Panel tilted along x', unit: 'mm', needs: null, extent: 'panel', channel: 8, spread: 0.2, distribution: 'uniform', source: PRACTICE,
    about: 'Rise at the outermost cell along +x, fall along −x.',
  },
  'tilt-y': {
    label: 'Panel tilted along y', unit: 'mm', needs: null, extent: 'panel', channel: 9, spread: 0.2, distribution: 'uniform', source: PRACTICE,
    about: 'Rise at the outermost cell along +y, fall along −y.',
  },
  bow: {
    label: 'Panel bowed', unit: 'mm', needs: null, extent: 'panel', channel: 10, spread: 0.3, distribution: 'normal', source: PRACTICE,
    about: 'Rise of the middle over the farthest cell, z = bow (1 − ρ²/ρ_max²).',
  },
  'feed-axial': {
    label: 'Feed along its axis', unit: 'mm', needs: 'horn', extent: 'panel', channel: 11, spread: 0.5, distribution: 'uniform', source: PRACTICE,
    about: 'The horn stands farther from its aim point, or nearer.',
  },
  'feed-x': {
    label: 'Feed along x', unit: 'mm', needs: 'horn', extent: 'panel', channel: 12, spread: 0.5, distribution: 'uniform', source: PRACTICE,
    about: 'The horn moves along x, still aimed at the same point.',
  },
  'feed-y': {
    label: 'Feed along y', unit: 'mm', needs: 'horn', extent: 'panel', channel: 13, spread: 0.5, distribution: 'uniform', source: PRACTICE,
    about: 'The horn moves along y, still aimed at the same point.',
  },
  'phase-scatter': {
    label: 'Phase scatter, cell by cell', unit: '°', needs: null, extent: 'cell', channel: 0, spread: 3, distribution: 'normal', source: PRACTICE,
    about: 'What no other line covers: measurement of the cells, neighbours of unlike size.',
  },
  'dead-cells': {
    label: 'Dead cells', unit: '', needs: null, extent: 'cell', channel: 1, spread: 0.001, distribution: 'share', source: PRACTICE,
    about: 'Share of the cells that return nothing.',
  },
};

export const CONTRIBUTOR_IDS = Object.keys(CONTRIBUTORS) as readonly ContributorId[];

/** Everything at its default. Drifts of a PTFE laminate with glass: 17 and -125 parts per million and kelvin, common practice. */
export const DEFAULT_TOLERANCE: ToleranceParameters = {
  trials: 500,
  seed: 1,
  contributors: CONTRIBUTOR_IDS.map((id) => ({ id, spread: CONTRIBUTORS[id].spread, distribution: CONTRIBUTORS[id].distribution })),
  material: { expansionPpmPerK: 17, permittivityPpmPerK: -125 },
};
