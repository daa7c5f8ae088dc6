import { axesDrawing, projected } from './axes-projection';

describe('drawing of the axes', () => {
  it('has z upwards, x to the right and in front, y to the right and behind', () => {
    const [x, y, z] = [projected(1, 0, 0, 100), projected(0, 1, 0, 100), projected(0, 0, 1, 100)];
    expect([z.x, z.y < 0]).toEqual([0, true]);
    expect([x.x > 0, x.y > 0, y.x > 0, y.y < 0]).toEqual([true, true, true, true]);
  });
  it('stands the beam over its foot', () => {
    const drawing = axesDrawing({ thetaDeg: 20, phiDeg: 30 }, 'x', 74);
    expect(drawing.beam.x).toBeCloseTo(drawing.foot.x, 9);
    expect(drawing.beam.y).toBeLessThan(drawing.foot.y);
  });
  it('points a beam at broadside along z', () => {
    const { beam, z } = axesDrawing({ thetaDeg: 0, phiDeg: 77 }, null, 74);
    expect([beam.x, Math.sign(beam.y)]).toEqual([0, Math.sign(z.y)]);
  });
  it('lays the field along the axis of its polarisation', () => {
    const { fieldFrom, fieldTo, x } = axesDrawing({ thetaDeg: 20, phiDeg: 0 }, 'x', 74);
    expect((fieldTo.y - fieldFrom.y) / (fieldTo.x - fieldFrom.x)).toBeCloseTo(x.y / x.x, 9);
  });
});
