import { powerRatioToDb } from '../../units/decibels';
import { exampleDesign } from '../example-design';
import { illuminatedState } from '../illuminated-state';
import { patternLobes } from '../pattern-lobes';
import { placeCells } from '../place-cells';
import { deviationDrawer } from './deviations';
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
});
