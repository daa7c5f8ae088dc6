import { bandFaults } from '../../shared/antenna/band/band-faults';
import { bandFrequenciesGHz } from '../../shared/antenna/band/band-frequencies';
import { bandPoint } from '../../shared/antenna/band/band-point';
import { mergeBand } from '../../shared/antenna/band/merge-band';
import { cellCountUpperBound } from '../../shared/antenna/cell-count';
import type { BandPoint } from '../../shared/model/band-run';
import { evenChunks, type ItemRange } from './even-chunks';
import { predictionCost } from './prediction-cost';
import { defineRunType } from './run-type';

// Measured on one core: lobes, beamwidths and peaks cost about the same however small the panel, and an edition is
// interpolated anew at every frequency. A moved phase centre lights every cell anew.
const SECONDS_PER_PATTERN = 0.03;
const SECONDS_PER_EDITION = 0.03;
const SECONDS_PER_RELIT_CELL = 1e-6;

/** A band: every chunk predicts some of the frequencies. */
export const bandRunType = defineRunType<'band', ItemRange, readonly BandPoint[]>({
  kind: 'band',
  version: 'band-1',
  faults: bandFaults,
  plan: (question) => {
    const { design, parameters } = question;
    const once = SECONDS_PER_PATTERN + predictionCost({ design }).seconds + (design.cells.kind === 'edition' ? SECONDS_PER_EDITION : 0);
    const relit = parameters.phaseCentre === undefined ? 0 : cellCountUpperBound(design.panel) * SECONDS_PER_RELIT_CELL;
    return evenChunks(bandFrequenciesGHz(question).length, (once + relit) * (parameters.spatialPart === true ? 2 : 1));
  },
  compute: ({ design, parameters, placed, chunk, checkStop }) =>
    bandFrequenciesGHz({ design, parameters })
      .slice(chunk.from, chunk.to)
      .map((frequencyGHz) => {
        checkStop();
        return bandPoint(placed, parameters, frequencyGHz);
      }),
  merge: (question, parts) => mergeBand(question, parts.flat()),
});
