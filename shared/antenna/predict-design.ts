import type { DesignDocument } from '../model/design-document';
import type { Figures, Verdict, Warning } from '../model/figures';
import type { Direction } from '../waves/conventions';
import { cellArrays, type CellArrays } from './cell-arrays';
import { designFigures } from './design-figures';
import { designWarnings } from './design-warnings';
import { wrongSide } from './illumination-warnings';
import { patternCut, type Cut, type CutRequest } from './pattern-cut';
import { placeCells, type PlacedDesign } from './place-cells';
import type { PreparedEdition } from './prepare-edition';
import { requirementVerdicts } from './requirement-verdicts';
import { withRimSpillover } from './feed/rim-spillover-cut';
import { illuminatedState, type IlluminatedState } from './illuminated-state';
import { uvMap, type UvMap, type UvShift } from './uv-map';
import { isNumber } from './no-figure';

export interface PredictionOptions {
  /** The edition that the design names; needed where its cells are of kind "edition". */
  readonly edition?: PreparedEdition;
  /** Where to predict; the design frequency when absent. The cells stay those chosen at the design frequency. */
  readonly frequencyGHz?: number;
  /** The harmonic of time-modulated cells to look at; the steered one when absent. */
  readonly harmonic?: number;
  readonly include: {
    readonly cells?: boolean;
    readonly cuts?: readonly CutRequest[];
    readonly uv?: { readonly size: number; readonly shift?: UvShift };
  };
}

export interface Prediction {
  readonly figures: Figures;
  readonly verdicts: Verdict[];
  readonly warnings: Warning[];
  readonly cells?: CellArrays;
  readonly cuts?: Cut[];
  readonly uv?: UvMap;
}

/** What to predict of a design whose cells are placed already. */
export type PlacedPredictionOptions = Omit<PredictionOptions, 'edition'>;

/**
 * Predicts what a design radiates, by the scalar model of the design document or the vector one: design -> lattice -> illumination ->
 * target phase -> assignment -> aperture field -> pattern -> figures, verdicts and warnings.
 * Throws InvalidDesign, naming every fault, where the fields do not go together.
 */
export function predictDesign(design: DesignDocument, options: PredictionOptions): Prediction {
  return predictPlaced(placeCells(design, options.edition), options);
}

/** The same from placed cells on: for many frequencies of one design, place its cells once. */
export function predictPlaced(placed: PlacedDesign, { frequencyGHz, harmonic, include }: PlacedPredictionOptions): Prediction {
  const state = illuminatedState(placed, frequencyGHz, harmonic);
  const { figures, gratingLobeCount, maxIncidence } = designFigures(state);
  const { design, si } = placed;
  const gainOffsetDb = isNumber(state.gainOffsetDb) ? state.gainOffsetDb : 0;
  const beam = si.beams[0].direction;
  return {
    figures,
    verdicts: requirementVerdicts(design.requirement, figures, wrongSide(si)),
    warnings: designWarnings({
      design,
      si,
      wavelengthM: state.wavelengthM,
      gratingLobeCount,
      maxIncidenceRad: maxIncidence,
      figures,
      litCount: state.litCount,
      cellWarnings: placed.stock.warnings(placed.assignment, state.frequencyHz),
    }),
    ...(include.cells ? { cells: cellArrays({ ...placed, targetRad: state.targetRad, responses: state.responses }) } : {}),
    ...(include.cuts ? { cuts: include.cuts.map((request) => bothCuts(state, request, beam, gainOffsetDb)) } : {}),
    ...(include.uv ? { uv: bothMaps(state, include.uv, gainOffsetDb) } : {}),
  };
}

function bothCuts(state: IlluminatedState, request: CutRequest, beam: Direction, gainOffsetDb: number): Cut {
  const cut = withRimSpillover(patternCut(state.pattern, request, beam, gainOffsetDb), state.placed.si, gainOffsetDb);
  return state.vector ? { ...cut, crossGainDbi: patternCut(state.vector.pattern.cross, request, beam, gainOffsetDb).gainDbi } : cut;
}

function bothMaps(state: IlluminatedState, { size, shift }: NonNullable<PredictionOptions['include']['uv']>, gainOffsetDb: number): UvMap {
  const map = uvMap(state.pattern, size, gainOffsetDb, shift);
  return state.vector ? { ...map, crossGainDbi: uvMap(state.vector.pattern.cross, size, gainOffsetDb, shift).gainDbi } : map;
}
