import type { ContributorId } from '../../model/tolerance-run';
import { powerRatioToDb } from '../../units/decibels';
import { exampleDesign } from '../example-design';
import { illuminatedState } from '../illuminated-state';
import { patternLobes } from '../pattern-lobes';
import { placeCells } from '../place-cells';
import { directivityRatioAt } from '../radiation-pattern';
import { deviationDrawer, NO_DEVIATIONS } from './deviations';
import { toleranceModel } from './tolerance-model';
import { trialField } from './trial-field';
import { trialGauge } from './trial-gauge';
import { trialLobes } from './trial-lobes';

const contributors = [{ id: 'phase-scatter', spread: 20, distribution: 'normal' }] as const;
const placed = placeCells(exampleDesign({ requirement: { ...exampleDesign().requirement, beams: [{ thetaDeg: 20, phiDeg: 0 }, { thetaDeg: 20, phiDeg: 90 }] } }));
const field = trialField(placed, toleranceModel({ placed, contributors, material: { expansionPpmPerK: 0, permittivityPpmPerK: 0 } }));
const gauge = trialGauge(illuminatedState(placed), field());
const beams = placed.si.beams.map(({ direction }) => direction);

describe('trialLobes', () => {
  it('finds the beams and the highest other lobe that the listing of all lobes finds', () => {
    const draw = deviationDrawer(placed.lattice, 11);
    for (let trial = 0; trial < 12; trial++) {
      const pattern = gauge.patternOf(field(draw(trial, contributors)));
      const listed = patternLobes(pattern, beams);
      const { ofBeams, highestOther } = trialLobes(pattern, beams);
      ofBeams.forEach((top, i) => expect(Math.hypot(top.u - listed.ofBeams[i].u, top.v - listed.ofBeams[i].v)).toBeLessThan(1e-6));
      expect(powerRatioToDb((highestOther?.directivityRatio ?? 0) / listed.others[0].directivityRatio)).toBeCloseTo(0, 6);
    }
  });

  it.each([
    [0.25e-3, 0.15e-3],
    [0.25e-3, 0.3e-3],
    [2.5e-3, 0],
    [2.5e-3, 0.3e-3],
  ])('finds, as the listing does, a first lobe that a shallow saddle parts from the beam: bow %d m, tilt %d m', (bow, tilt) => {
    const wide = exampleDesign({
      panel: { ...exampleDesign().panel, outline: { kind: 'rectangle', widthMm: 600, heightMm: 600 } },
      illumination: { kind: 'horn', positionMm: [-164, 0, 451], aimMm: [0, 0, 0], exponentE: 6.5, exponentH: 6.5, polarisation: 'x' },
    });
    const large = placeCells(wide);
    const spreads = (['bow', 'tilt-x'] as const).map((id) => ({ id, spread: 1, distribution: 'normal' as const }));
    const shaped = trialField(large, toleranceModel({ placed: large, contributors: spreads, material: { expansionPpmPerK: 0, permittivityPpmPerK: 0 } }));
    const [beam] = large.si.beams;
    const panel = new Map<ContributorId, number>([['bow', bow], ['tilt-x', tilt]]);
    const pattern = trialGauge(illuminatedState(large), shaped()).patternOf(shaped({ ...NO_DEVIATIONS, panel }));
    const listed = patternLobes(pattern, [beam.direction]);
    // Along the plane of symmetry every local maximum outside the main lobe, 1.25 lambda over the side away, by plain steps.
    const reach = (1.25 * 2 * Math.PI) / (large.designWavenumber * 0.6);
    const levels = Array.from({ length: 3999 }, (_, i) => directivityRatioAt(pattern, (i - 1999) / 2000, 0));
    const lobes = levels.filter((level, i) => Math.abs((i - 1999) / 2000 - listed.ofBeams[0].u) > reach && level >= (levels[i - 1] ?? 0) && level >= (levels[i + 1] ?? 0));
    const highest = Math.max(...lobes);
    expect(listed.others[0].directivityRatio).toBeGreaterThanOrEqual(highest);
    expect(powerRatioToDb((trialLobes(pattern, [beam.direction]).highestOther?.directivityRatio ?? 0) / listed.others[0].directivityRatio)).toBeCloseTo(0, 6);
  });
});
