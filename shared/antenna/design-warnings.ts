import type { DesignDocument } from '../model/design-document';
import type { Figures, Warning } from '../model/figures';
import { directionText } from './angle-text';
import { guidedWaveWarnings } from './guided-wave/guided-wave-warnings';
import { illuminationWarnings } from './illumination-warnings';
import { keepOutWarning } from './keep-out-warning';
import { latticeWarnings, type LatticeFacts } from './lattice-warnings';
import { polarisationWarnings } from './vector/polarisation-warnings';

export interface DesignFacts extends LatticeFacts {
  readonly design: DesignDocument;
  readonly litCount: number;
  /** Remarks of the cells in use on what their data cover. */
  readonly cellWarnings: readonly Warning[];
}

const RANK: Readonly<Record<Warning['severity'], number>> = { serious: 0, warn: 1, note: 2 };

/** All remarks on a design with their reasons and numbers, the serious ones first. */
export function designWarnings(facts: DesignFacts): Warning[] {
  const warnings = [
    ...illuminationWarnings(facts.si, facts.litCount),
    ...keepOutWarning(facts.si, facts.figures.spilloverDb),
    ...facts.cellWarnings,
    ...polarisationWarnings(facts.design),
    ...latticeWarnings(facts),
    ...guidedWaveWarnings(facts.si, facts.wavelengthM, facts.design.cells.kind === 'resonant'),
    ...imageLobeWarning(facts.design, facts.figures),
    ...boundsWarning(facts.figures),
    ...tableWarning(facts.design),
  ];
  return warnings.sort((a, b) => RANK[a.severity] - RANK[b.severity]);
}

/** A lobe this little below the beam is as strong as it: less is not told from rounding. */
const AS_STRONG_DB = 0.005;

function imageLobeWarning({ synthesis }: DesignDocument, { sidelobeDb: { hemisphere } }: Figures): Warning[] {
  // A panel focused in its near field has no one beam in the far field that another lobe could rival, nor has a ring.
  if (synthesis.kind !== 'direct') return [];
  if (!('levelDb' in hemisphere) || typeof hemisphere.levelDb !== 'number' || hemisphere.levelDb < -AS_STRONG_DB) return [];
  const { levelDb, thetaDeg, phiDeg } = hemisphere as { levelDb: number; thetaDeg: number; phiDeg: number };
  return [
    {
      code: 'image-lobe',
      pointer: '#/requirement/beams/0',
      severity: 'serious',
      message: `A lobe at ${directionText(thetaDeg, phiDeg)} is ${levelDb < AS_STRONG_DB ? 'as strong as' : `${levelDb.toFixed(2)} dB stronger than`} the wanted beam.`,
      numbers: { levelDb, thetaDeg, phiDeg },
    },
  ];
}

/** Projections that did not arrive say so, with how far off they are. */
function boundsWarning({ projections }: Figures): Warning[] {
  if (!projections || projections.outcome === 'reached') return [];
  const { outcome, iterations, worstExcessDb, worstShortfallDb } = projections;
  const why = outcome === 'stalled' ? 'The projections have stalled: with these amplitudes, or from this start, the bounds are not to be had.' : 'The projections ended while still coming nearer: more iterations may help.';
  return [
    {
      code: 'bounds-not-reached',
      pointer: '#/synthesis',
      severity: 'warn',
      message: `${why} After ${iterations} iterations the pattern exceeds its upper bound by up to ${worstExcessDb.toFixed(2)} dB and falls short of the lower one by up to ${worstShortfallDb.toFixed(2)} dB.`,
      numbers: { iterations, worstExcessDb, worstShortfallDb },
    },
  ];
}

function tableWarning({ cells }: DesignDocument): Warning[] {
  if (cells.kind !== 'inline') return [];
  return [
    {
      code: 'provenance',
      pointer: '#/cells',
      severity: 'note',
      message: `The ${cells.cells.length} cells are a what-if table: the same at every frequency and angle, and nobody has measured them.`,
      numbers: { cells: cells.cells.length },
    },
  ];
}
