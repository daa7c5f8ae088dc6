import type { ApertureField } from '../aperture-field';
import type { PlacedDesign } from '../place-cells';
import { NO_DEVIATIONS, type Deviations } from './deviations';
import type { CellChanges, ToleranceModel } from './tolerance-model';

/** Makes the aperture field of one panel made. */
export type TrialField = (deviations?: Deviations) => ApertureField;

/** The field of the placed cells at the design frequency, under deviations of the model. */
export function trialField(placed: PlacedDesign, model: ToleranceModel): TrialField {
  const { lattice, light, stock, assignment, si, designWavenumber } = placed;
  const { grid, count, column, row } = lattice;
  const responses = stock.respond(assignment, si.designFrequencyHz);
  const places = Int32Array.from(column, (c, n) => row[n] * grid.columnCount + c);
  const size = light.amplitude.map((amplitude, n) => amplitude * responses.magnitude[n]);
  const phase = responses.phaseRad.map((rad, n) => rad - designWavenumber * light.pathM[n]);
  const changes: CellChanges = { phaseRad: new Float64Array(count), logMagnitude: new Float64Array(count) };
  return (deviations = NO_DEVIATIONS) => {
    model.changesBy(deviations, changes);
    const { dead } = deviations;
    const re = new Float64Array(grid.columnCount * grid.rowCount);
    const im = new Float64Array(re.length);
    for (let n = 0; n < count; n++) {
      const at = places[n];
      const lives = dead === null || dead[n] === 0;
      const changed = lives ? size[n] * (changes.logMagnitude[n] === 0 ? 1 : Math.exp(changes.logMagnitude[n])) : 0;
      const angle = phase[n] + changes.phaseRad[n];
      re[at] = changed * Math.cos(angle);
      im[at] = changed * Math.sin(angle);
    }
    return { grid, re, im };
  };
}
