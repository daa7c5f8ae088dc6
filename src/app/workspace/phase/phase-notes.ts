import { degFromRad } from '../../../../shared/units/angles';
import { numberText } from '../../ui/plots/plot-text';
import { ruleText } from '../cells/rule-options';
import type { LivePrediction } from '../live-prediction-data';
import type { EditionInUse } from '../workspace-state';

export const RESONANT_RULES = { projection: 'projection', nearest: 'nearest field', 'phase-only': 'phase only' } as const;

/** The line beside the title: how many cells, of what, by which rule. */
export function phaseSubtitle({ cells, of }: LivePrediction, edition: EditionInUse | null): string {
  const count = `${numberText(cells.xMm.length, 0)} cells`;
  switch (of.cells.kind) {
    case 'ideal':
      return `${count}, ideal phase, ${of.cells.levels === null ? 'continuous' : `${of.cells.levels} levels`}`;
    case 'inline':
      return `${count}, what-if table of ${of.cells.cells.length}, nearest phase`;
    case 'modulated':
      return `${count}, ${of.cells.states.length} states switched in time, harmonic ${of.cells.harmonic}`;
    case 'resonant':
      return `${count}, resonant, ${RESONANT_RULES[of.cells.rule]}, ${of.cells.states === null ? 'continuous' : `${of.cells.states} states`}`;
    case 'edition': {
      const rule = ruleText(of.cells.rule);
      return edition ? `${count}, edition ${edition.number ?? 'not published'} of ${edition.familyName}, ${rule}` : `${count}, ${rule}`;
    }
  }
}

/** Assumptions of the map, as drawing notes. */
export function phaseNotes({ head, of }: LivePrediction, edition: EditionInUse | null): readonly string[] {
  const light = of.illumination;
  const horn = light.kind !== 'horn' ? '' : of.panel.operation === 'reflect' ? ' and the horn' : '; the horn is behind';
  const side = `Seen from the side of the beams${horn}.`;
  const foot = light.kind === 'horn' ? ` Cross and circle: foot of the horn, x ${numberText(light.positionMm[0], 1)}, y ${numberText(light.positionMm[1], 1)}, z ${numberText(light.positionMm[2], 1)} mm.` : '';
  return [side + foot, ...coverageNote(head.figures.maxIncidenceDeg, edition), 'A prediction is array theory, not a measurement.'];
}

function coverageNote(maxIncidenceDeg: LivePrediction['head']['figures']['maxIncidenceDeg'], edition: EditionInUse | null): readonly string[] {
  if (!edition || typeof maxIncidenceDeg !== 'number') return [];
  const { thetasRad } = edition.responses;
  const steepest = degFromRad(thetasRad[thetasRad.length - 1]);
  const data = `Cell data ${edition.description.provenance}${steepest === 0 ? ' at normal incidence' : ` up to ${numberText(steepest, 0)}°`}`;
  return maxIncidenceDeg > steepest + 0.5 ? [`${data}, used up to ${numberText(maxIncidenceDeg, 1)}°: beyond the data the nearest angle holds.`] : [`${data}; the panel needs ${numberText(maxIncidenceDeg, 1)}°.`];
}
