import { hornCapturedShare } from './horn-spillover';
import type { SiHorn, SiOutline } from './si-design';

const above = (q: number, heightM: number): SiHorn => ({
  kind: 'horn',
  position: { xM: 0, yM: 0, zM: heightM },
  aim: { xM: 0, yM: 0, zM: 0 },
  exponentE: q,
  exponentH: q,
  polarisation: 'x',
});
const disc = (diameterM: number): SiOutline => ({ kind: 'ellipse', centre: { xM: 0, yM: 0 }, widthM: diameterM, heightM: diameterM });

describe('spillover', () => {
  it.each([
    [6.5, 0.8, 0.900567],
    [8, 1, 0.84994],
    [0.5, 0.4, 0.609756],
  ])('equals 1 - cos^(2q+1) of the edge angle for a centred disc: q = %d, f/D = %d gives %d', (q, focalRatio, share) => {
    const { fraction, uncertainty } = hornCapturedShare(above(q, focalRatio), disc(1));
    expect(fraction).toBeCloseTo(share, 6);
    expect(uncertainty).toBeLessThan(1e-7);
  });

  it('gives 0.914802 for a square of 300 mm under a horn 240 mm away at 20 degrees', () => {
    const horn: SiHorn = { ...above(6.5, 0.225526), position: { xM: -0.082084, yM: 0, zM: 0.225526 } };
    const square: SiOutline = { kind: 'rectangle', centre: { xM: 0, yM: 0 }, widthM: 0.3, heightM: 0.3 };
    expect(hornCapturedShare(horn, square).fraction).toBeCloseTo(0.914802, 6);
  });

  it('is the same for a polygon of the same shape', () => {
    const horn: SiHorn = { ...above(9, 0.2), exponentH: 5, aim: { xM: 0.05, yM: 0.02, zM: 0 } };
    const square: SiOutline = { kind: 'rectangle', centre: { xM: 0, yM: 0 }, widthM: 0.3, heightM: 0.2 };
    const points = [[-0.15, -0.1], [0.15, -0.1], [0.15, 0.1], [-0.15, 0.1]].map(([xM, yM]) => ({ xM, yM }));
    expect(hornCapturedShare(horn, { kind: 'polygon', points }).fraction).toBeCloseTo(hornCapturedShare(horn, square).fraction, 10);
  });

  it('takes nearly all of the power with a panel that is wide against its height, even for a sharp horn', () => {
    const { fraction } = hornCapturedShare(above(200, 0.1), disc(2));
    expect(fraction).toBeCloseTo(1, 8);
  });

  it('takes nothing when the horn looks away', () => {
    expect(hornCapturedShare({ ...above(6, 0.2), aim: { xM: 0, yM: 0, zM: 1 } }, disc(1)).fraction).toBe(0);
  });

  it('does not depend on which side of the panel the horn stands', () => {
    const behind: SiHorn = { ...above(6, 0.2), position: { xM: 0.03, yM: 0, zM: -0.2 } };
    const front: SiHorn = { ...behind, position: { xM: 0.03, yM: 0, zM: 0.2 } };
    expect(hornCapturedShare(behind, disc(0.3)).fraction).toBeCloseTo(hornCapturedShare(front, disc(0.3)).fraction, 12);
  });
});
