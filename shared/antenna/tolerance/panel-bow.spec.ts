import { EXAMPLE_DESIGN } from '../example-design';
import { panelLattice } from '../panel-lattice';
import { siPanel } from '../si-design';
import { heightPhaseRad, panelShapes } from './panel-bow';

const lattice = panelLattice(siPanel(EXAMPLE_DESIGN.panel));

describe('a panel that is not flat', () => {
  it('has heights of 1 in the middle of a bow and 0 at the farthest cell', () => {
    const { bow, lift, tiltX, tiltY } = panelShapes(lattice);
    const corner = 0;
    const middle = lattice.xM.findIndex((x, n) => Math.abs(x) < 0.008 && Math.abs(lattice.yM[n]) < 0.008);
    expect(bow[corner]).toBeCloseTo(0, 12);
    expect(bow[middle]).toBeCloseTo(1 - 1 / 361, 12);
    expect(new Set(lift)).toEqual(new Set([1]));
    expect([tiltX[corner], tiltX[19], tiltY[corner], tiltY[lattice.count - 1]]).toEqual([-1, 1, -1, 1]);
    expect(Math.max(...tiltX) + Math.min(...tiltX)).toBeCloseTo(0, 12);
  });

  it('turns a single column into no tilt', () => {
    const single = panelLattice(siPanel({ ...EXAMPLE_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 15, heightMm: 300 } }));
    expect(new Set(panelShapes(single).tiltX)).toEqual(new Set([0]));
  });

  it('changes the phase by both ways of a reflection and by their difference in transmission', () => {
    const wavenumber = 200;
    expect(heightPhaseRad(wavenumber, 'reflect', 1, 1)(0.001)).toBeCloseTo(0.4, 12);
    expect(heightPhaseRad(wavenumber, 'transmit', 1, 1)(0.001)).toBe(0);
    expect(heightPhaseRad(wavenumber, 'reflect', 0.8, 0.5)(0.001)).toBeCloseTo(0.26, 12);
  });
});
