import type { Cut } from '../../shared/antenna/pattern-cut';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { beamShift, comparedCuts, comparedPlanes } from './compared-cuts';

const steered = (thetaDeg: number, phiDeg = 0): DesignDocument => ({ ...STARTING_DESIGN, requirement: { ...STARTING_DESIGN.requirement, beams: [{ thetaDeg, phiDeg }] } });
const sine = (deg: number): number => Math.sin((deg * Math.PI) / 180);

describe('comparedPlanes', () => {
  it('takes the plane of both beams and the shift between them in u', () => {
    const [along, across] = comparedPlanes(steered(10, 30), steered(25, 30));
    expect(along).toEqual({ request: { phiDeg: 30, thetaDeg: [-90, 90, 0.1] }, shiftU: expect.closeTo(sine(25) - sine(10), 12) as number });
    expect(across).toEqual({ request: { plane: 'across', angleDeg: [-90, 90, 0.1] }, shiftU: 0 });
  });

  it('has the later beam at a positive angle, and one opposite to it at a negative one', () => {
    const [along] = comparedPlanes(steered(10, 200), steered(25, 20));
    expect(along.request).toMatchObject({ phiDeg: 20 });
    expect(along.shiftU).toBeCloseTo(sine(25) + sine(10), 12);
  });

  it('lets a beam at broadside lie in the plane of the other', () => {
    expect(comparedPlanes(steered(0, 77), steered(25, 20))[0].request).toMatchObject({ phiDeg: 20 });
    expect(comparedPlanes(steered(25, 20), steered(0, 77))[0].request).toMatchObject({ phiDeg: 20 });
  });

  it('goes by the angle from each beam where there is no plane of both', () => {
    expect(comparedPlanes(steered(10, 0), steered(10, 40))[0]).toEqual({ request: { plane: 'along', angleDeg: [-90, 90, 0.1] }, shiftU: 0 });
  });

  it('samples large panels more finely', () => {
    const large: DesignDocument = { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 1000, heightMm: 500 } } };
    // 1000 mm at 28 GHz are 93 wavelengths: lobes of 0.6 degrees, twenty samples each.
    expect(comparedPlanes(STARTING_DESIGN, large)[0].request).toMatchObject({ thetaDeg: [-90, 90, 0.02] });
  });
});

describe('beamShift', () => {
  it('leads from one beam to the other over direction cosines, whatever their azimuths', () => {
    const shift = beamShift(steered(10, 0), steered(30, 90));
    expect(shift.u).toBeCloseTo(-sine(10), 12);
    expect(shift.v).toBeCloseTo(0.5, 12);
    const back = beamShift(steered(30, 90), steered(10, 0));
    expect([back.u, back.v]).toEqual([-shift.u, -shift.v]);
  });

  it('is nothing between equal beams, and between two at broadside whatever their azimuths', () => {
    expect(beamShift(steered(33, 77), steered(33, 77))).toEqual({ u: 0, v: 0 });
    expect(beamShift(steered(0, 77), steered(0, 12))).toEqual({ u: 0, v: 0 });
  });
});

describe('comparedCuts', () => {
  const cut = (levels: readonly number[]): Cut => ({
    request: { phiDeg: 0, thetaDeg: [-90, 90, 90] },
    angleDeg: Float64Array.of(-90, 0, 90),
    thetaDeg: Float64Array.of(90, 0, 90),
    phiDeg: Float64Array.of(180, 0, 0),
    directivityDbi: Float64Array.from(levels),
    gainDbi: Float64Array.from(levels),
  });

  it('compares under one floor, 50 dB below the higher peak of both sides', () => {
    const [plane] = comparedPlanes(steered(20), steered(20));
    const [compared] = comparedCuts([plane], [cut([-20, 30, -10])], [cut([-10, 35, -40])]);
    expect(compared.floorDbi).toBe(-15);
    expect(Array.from(compared.differenceDb)).toEqual([NaN, 5, NaN]);
  });
});
