import type { BandQuestion } from './band-faults';

/** Frequencies nearer than this, in GHz, are one: 1 Hz. */
const ONE_HERTZ_GHZ = 1e-9;

/** The band that is computed: that of the run, else that of the requirement. Expects a question without faults. */
export function bandEdgesGHz({ design, parameters }: BandQuestion): [number, number] {
  const band = parameters.bandGHz ?? design.requirement.bandGHz;
  if (band === undefined) throw new RangeError('neither the run nor the requirement names a band');
  return [band[0], band[1]];
}

/** The frequencies of a band run, rising: evenly spaced with both edges, and the design frequency where it lies between. */
export function bandFrequenciesGHz(question: BandQuestion): number[] {
  const [low, high] = bandEdgesGHz(question);
  const { frequencyCount } = question.parameters;
  const step = (high - low) / (frequencyCount - 1);
  const even = Array.from({ length: frequencyCount }, (_, i) => (i === frequencyCount - 1 ? high : toHertz(low + i * step)));
  const centre = question.design.requirement.designFrequencyGHz;
  const isNew = centre > low && centre < high && even.every((frequency) => Math.abs(frequency - centre) > ONE_HERTZ_GHZ);
  return isNew ? [...even, centre].sort((a, b) => a - b) : even;
}

/** To the hertz, so that 27.15 is not written as 27.150000000000002. */
const toHertz = (frequencyGHz: number): number => Math.round(frequencyGHz * 1e9) / 1e9;
