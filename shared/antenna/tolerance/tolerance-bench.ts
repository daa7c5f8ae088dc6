import type { ContributorId, ToleranceParameters, ToleranceReading } from '../../model/tolerance-run';
import { illuminatedState } from '../illuminated-state';
import { InvalidDesign } from '../invalid-design';
import type { PlacedDesign } from '../place-cells';
import type { PreparedEdition } from '../prepare-edition';
import type { RadiationPattern } from '../radiation-pattern';
import { deviationDrawer } from './deviations';
import { envelopeAngles, type EnvelopeAngles } from './envelope-angles';
import { toleranceModel, type ToleranceModel } from './tolerance-model';
import { trialField } from './trial-field';
import { isReadable, trialGauge, type SpectrumOf } from './trial-gauge';

/** What is varied: everything together, or one contributor alone. */
export type ToleranceStudy = 'all' | ContributorId;

/** A cut that is read in every trial. */
export interface BenchCut extends EnvelopeAngles {
  gainsDbi(pattern: RadiationPattern): Float64Array;
}

/** A design ready for trials. */
export interface ToleranceBench {
  readonly model: ToleranceModel;
  readonly cuts: readonly BenchCut[];
  /** The pattern of one trial, in absolute gain; the panel as drawn for null. */
  patternOf(study: ToleranceStudy, trial: number | null): RadiationPattern;
  read(pattern: RadiationPattern): ToleranceReading;
}

export interface BenchSubject {
  readonly placed: PlacedDesign;
  readonly edition?: PreparedEdition;
  readonly parameters: ToleranceParameters;
  readonly spectrumOf?: SpectrumOf;
}

/** Prepares the trials of a design. Throws InvalidDesign where nothing is radiated. */
export function toleranceBench({ placed, edition, parameters, spectrumOf }: BenchSubject): ToleranceBench {
  const { contributors, material, seed } = parameters;
  const nominal = illuminatedState(placed);
  if (!isReadable(nominal)) throw new InvalidDesign([{ pointer: '#/illumination', detail: 'the panel radiates nothing towards its first beam, so there is nothing that could be spread' }]);
  const model = toleranceModel({ placed, edition, contributors, material });
  const fieldOf = trialField(placed, model);
  const gauge = trialGauge(nominal, fieldOf(), spectrumOf);
  const draw = deviationDrawer(placed.lattice, seed);
  const acting = contributors.filter(({ id }) => !model.notApplied.some((other) => other.id === id));
  const [beam] = placed.si.beams;
  return {
    model,
    cuts: (['along', 'across'] as const).map((plane) => {
      const angles = envelopeAngles(beam.direction, plane, placed.lattice, placed.designWavenumber);
      return { ...angles, gainsDbi: gauge.gainsReader(angles.directions) };
    }),
    patternOf: (study, trial) => gauge.patternOf(trial === null ? fieldOf() : fieldOf(draw(trial, study === 'all' ? acting : acting.filter(({ id }) => id === study)))),
    read: gauge.read,
  };
}
