import { EXAMPLE_DESIGN, exampleDesign } from './example-design';
import { panelTargetPhase } from './panel-target-phase';
import { predictDesign } from './predict-design';

describe('target phases for a thumbnail', () => {
  it('are those of the prediction, with the reference phase', () => {
    const design = exampleDesign({ referencePhaseDeg: 77 });
    const { lattice, targetPhaseDeg } = panelTargetPhase(design);
    const { cells } = predictDesign(design, { include: { cells: true } });
    expect(lattice.count).toBe(400);
    targetPhaseDeg.forEach((phase, n) => expect(phase).toBeCloseTo(cells?.targetPhaseDeg[n] ?? NaN, 3));
  });

  it('lie in [0, 360) and count a searched reference as 0', () => {
    const searched = panelTargetPhase(exampleDesign({ referencePhaseDeg: 'search' }));
    expect(searched.targetPhaseDeg).toEqual(panelTargetPhase(EXAMPLE_DESIGN).targetPhaseDeg);
    searched.targetPhaseDeg.forEach((phase) => expect(phase >= 0 && phase < 360).toBe(true));
  });
});
