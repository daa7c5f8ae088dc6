import { exampleDesign } from '../../../../shared/antenna/example-design';
import { computedPrediction } from '../computed-prediction';
import type { LivePrediction } from '../live-prediction-data';
import { phaseLayer } from './phase-views';
import type { PhaseLayer, PhaseView } from './phase-views';
import { SAMPLE_EDITION, SAMPLE_PHASE } from './sample-phase';

const source = { prediction: SAMPLE_PHASE, parent: null, parentNumber: null, edition: SAMPLE_EDITION };
const layerOf = (of: PhaseLayer) => {
  if (of.kind === 'none') throw new Error(of.reason);
  return of.layer;
};
const reasonOf = (view: PhaseView, of: Parameters<typeof phaseLayer>[1]): string => {
  const layer = phaseLayer(view, of);
  return layer.kind === 'none' ? layer.reason : 'drawn';
};

describe('views of the panel', () => {
  it('wrap the target phase once round the cyclic map', () => {
    expect(layerOf(phaseLayer('target', source)).scale).toEqual({ map: 'cyclic', from: -180, to: 180 });
  });
  it('centre the error on zero and hold its largest value', () => {
    const { scale, values } = layerOf(phaseLayer('error', source));
    const largest = Math.max(...Array.from(values, Math.abs));
    expect(scale.from).toBe(-scale.to);
    expect(scale.to).toBeGreaterThanOrEqual(largest);
    expect(scale.to).toBeLessThan(2 * largest);
  });
  it('colour cells by the first parameter of their family, the smallest off the paper', () => {
    const layer = layerOf(phaseLayer('cell', source));
    expect([layer.title, layer.unit, layer.values[7]]).toEqual(['size', 'mm', SAMPLE_EDITION.cells[SAMPLE_PHASE.cells.cellIndex[7]].parametersMm[0]]);
    expect(layer.scale.from).toBeLessThan(1);
  });
  it('colour levels of an ideal phase by their number, and have none for a continuous one', () => {
    const levels = computedPrediction(exampleDesign({ cells: { kind: 'ideal', levels: 4 } }));
    expect(layerOf(phaseLayer('cell', { ...source, prediction: levels })).title).toBe('Level');
    expect(reasonOf('cell', { ...source, prediction: computedPrediction(exampleDesign()) })).toContain('continuous ideal phase');
  });
});

describe('what changed', () => {
  const moved = computedPrediction(exampleDesign({ cells: { kind: 'ideal', levels: 8 }, referencePhaseDeg: 30 }));
  const parent = computedPrediction(exampleDesign({ cells: { kind: 'ideal', levels: 8 } }));

  it('says why there is nothing to compare with', () => {
    expect(reasonOf('changed', source)).toContain('no revision yet');
    expect(reasonOf('changed', { ...source, parentNumber: 3 })).toContain('still being predicted');
    const other: LivePrediction = computedPrediction(exampleDesign({ panel: { ...exampleDesign().panel, outline: { kind: 'rectangle', widthMm: 150, heightMm: 150 } } }));
    expect(reasonOf('changed', { ...source, parentNumber: 3, parent: other })).toContain('another lattice');
  });
  it('leaves unchanged cells bare and counts the others', () => {
    const layer = phaseLayer('changed', { prediction: moved, parent, parentNumber: 3, edition: null });
    const values = Array.from(layerOf(layer).values);
    const changed = values.filter((value) => !Number.isNaN(value));
    expect(changed.length).toBeGreaterThan(0);
    expect(changed.length).toBeLessThan(400);
    expect(new Set(changed.map((value) => Math.round(value)))).toEqual(new Set([45]));
    expect(layer.kind === 'layer' && layer.note).toBe(`${changed.length} of 400 cells differ from revision 3; the others are bare`);
  });
  it('says when nothing differs', () => {
    const layer = phaseLayer('changed', { prediction: parent, parent, parentNumber: 3, edition: null });
    expect(layer.kind === 'layer' && layer.note).toBe('no cell differs from revision 3');
  });
});
