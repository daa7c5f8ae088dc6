import type { ToleranceContributor } from '../../model/tolerance-run';
import { randomStream } from '../../math/seeded-random';
import { EXAMPLE_DESIGN } from '../example-design';
import { panelLattice } from '../panel-lattice';
import { siPanel } from '../si-design';
import { deviationDrawer, drawPlaces, spreadSi } from './deviations';

const lattice = panelLattice(siPanel(EXAMPLE_DESIGN.panel));
const etch: ToleranceContributor = { id: 'etch-random', spread: 0.02, distribution: 'normal' };
const bow: ToleranceContributor = { id: 'bow', spread: 0.5, distribution: 'uniform' };
const dead: ToleranceContributor = { id: 'dead-cells', spread: 0.1, distribution: 'share' };
const scatter: ToleranceContributor = { id: 'phase-scatter', spread: 90, distribution: 'uniform' };

describe('deviationDrawer', () => {
  it('gives a trial the same bits whatever was drawn before, and whatever else is drawn', () => {
    const draw = deviationDrawer(lattice, 7);
    const together = draw(3, [etch, bow, dead]);
    draw(0, [bow]);
    expect(draw(3, [etch]).cells.get('etch-random')).toEqual(together.cells.get('etch-random'));
    expect(deviationDrawer(lattice, 7)(3, [dead, bow])).toEqual({ ...together, cells: new Map() });
  });

  it('draws in metres and radians from the channel of the contributor', () => {
    const { panel, cells } = deviationDrawer(lattice, 7)(3, [bow, etch]);
    expect(panel.get('bow')).toBeCloseTo(0.5e-3 * (2 * randomStream({ seed: 7, trial: 3, channel: 10 }).uniformAt(0) - 1), 15);
    const stream = randomStream({ seed: 7, trial: 3, channel: 2 });
    // The second cell of the row stands in the second column of 20.
    expect(Array.from(cells.get('etch-random') ?? []).slice(0, 2)).toEqual([20e-6 * stream.normalAt(0), 20e-6 * stream.normalAt(20)]);
    expect(spreadSi(scatter)).toBeCloseTo(Math.PI / 2, 12);
  });

  it('keeps the draw of a cell when others are left out', () => {
    const keepOuts = [{ kind: 'rectangle' as const, widthMm: 60, heightMm: 60, centreMm: [-120, -120] as [number, number] }];
    const fewer = panelLattice(siPanel({ ...EXAMPLE_DESIGN.panel, keepOuts }));
    const all = deviationDrawer(lattice, 1)(0, [etch]).cells.get('etch-random');
    const some = deviationDrawer(fewer, 1)(0, [etch]).cells.get('etch-random');
    expect(fewer.count).toBeLessThan(lattice.count);
    const last = (values: Float64Array | undefined): number | undefined => values?.[values.length - 1];
    expect(last(some)).toBe(last(all));
    expect(drawPlaces(lattice)[21]).toBe(21);
  });

  it('stays within a uniform spread and lets about the share of cells die', () => {
    const drawn = deviationDrawer(lattice, 2)(0, [scatter, dead]);
    const values = drawn.cells.get('phase-scatter') ?? new Float64Array();
    expect(Math.max(...values.map(Math.abs))).toBeLessThan(Math.PI / 2);
    const died = drawn.dead?.reduce((sum, flag) => sum + flag, 0) ?? 0;
    // 40 of 400 with a deviation of 6.
    expect(Math.abs(died - 40)).toBeLessThan(24);
  });

  it('draws nothing for a spread of 0', () => {
    expect(deviationDrawer(lattice, 2)(0, [{ ...bow, spread: 0 }, { ...dead, spread: 0 }])).toEqual({ panel: new Map(), cells: new Map(), dead: null });
  });
});
