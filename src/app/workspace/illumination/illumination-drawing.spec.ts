import type { DesignDocument } from '../../../../shared/model/design-document';
import { replacedAt } from '../../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { illuminationDrawing } from './illumination-drawing';

const space = { width: 560, height: 420 };
const withHorn = (positionMm: [number, number, number]): DesignDocument => replacedAt(STARTING_DESIGN, '/illumination/positionMm', positionMm);

describe('illuminationDrawing', () => {
  it('draws the horn, the panel and the beam of the starting design to one scale', () => {
    const { pixelsPerMm, horn, origin, panelFrom, panelTo, beams } = illuminationDrawing(STARTING_DESIGN, space);
    expect(panelTo.x - panelFrom.x).toBeCloseTo(200 * pixelsPerMm, 6);
    expect((horn?.at.x ?? 0) - origin.x).toBeCloseTo(-60 * pixelsPerMm, 6);
    expect(origin.y - (horn?.at.y ?? 0)).toBeCloseTo(180 * pixelsPerMm, 6);
    expect(Math.atan2(beams[0].tip.x - origin.x, origin.y - beams[0].tip.y)).toBeCloseTo((20 * Math.PI) / 180, 9);
  });

  it('writes the lengths of the fields and the offset angle of the horn', () => {
    const { dimensions, offsetArc } = illuminationDrawing(STARTING_DESIGN, space);
    expect(dimensions.map(({ text }) => text)).toEqual(['200', '180', '60']);
    // atan(60 / 180)
    expect(offsetArc?.text).toBe('18.4°');
  });

  it('keeps everything inside the space it was given', () => {
    for (const position of [[-60, 0, 180], [0, 0, 900], [400, 300, 100], [0, -250, -120]] as [number, number, number][]) {
      const drawing = illuminationDrawing(withHorn(position), space);
      const xs = [drawing.panelFrom.x, drawing.panelTo.x, drawing.horn?.at.x ?? 0, ...drawing.beams.map(({ tip }) => tip.x)];
      expect(Math.min(...xs)).toBeGreaterThanOrEqual(0);
      expect(Math.max(...xs)).toBeLessThanOrEqual(space.width);
      expect(drawing.height).toBeLessThanOrEqual(space.height + 1e-9);
    }
  });

  it('takes the plane of the offset, its axis towards positive x', () => {
    expect(illuminationDrawing(withHorn([-60, 0, 180]), space).planePhiDeg).toBe(0);
    expect(illuminationDrawing(withHorn([0, 50, 180]), space).planePhiDeg).toBe(90);
    expect(illuminationDrawing(withHorn([0, -50, 180]), space).planePhiDeg).toBe(90);
    expect(illuminationDrawing(withHorn([-50, -50, 180]), space).planePhiDeg).toBe(45);
  });

  it('draws the horn of a transmitting panel below it', () => {
    const { horn, origin } = illuminationDrawing(withHorn([0, 0, -180]), space);
    expect(horn?.at.y).toBeGreaterThan(origin.y);
  });

  it('draws a guided wave as an arrow under the panel, from a launch to both sides', () => {
    const wave = { kind: 'guided-wave', launch: { kind: 'plane', directionDeg: 180 }, effectiveIndex: 1.6, leakageNpPerM: 6, polarisation: 'x' } as const;
    const plane = illuminationDrawing({ ...STARTING_DESIGN, illumination: wave }, space);
    expect([plane.horn, plane.wavefronts, plane.planePhiDeg]).toEqual([null, null, 0]);
    // Towards -x: from the right edge to the left.
    expect(plane.axis.startsWith(`M${Math.round(plane.panelTo.x * 100) / 100} `)).toBe(true);
    const radial = illuminationDrawing({ ...STARTING_DESIGN, illumination: { ...wave, launch: { kind: 'radial', centreMm: [10, 0], radiusMm: 5 } } }, space);
    expect(radial.axis.match(/M/g)).toHaveLength(4);
  });

  it('needs no offset figure for a centred horn', () => {
    const { dimensions, offsetArc } = illuminationDrawing(withHorn([0, 0, 180]), space);
    expect(dimensions.map(({ text }) => text)).toEqual(['200', '180']);
    expect(offsetArc).toBeNull();
  });

  it('draws a plane wave from where it comes', () => {
    const wave: DesignDocument = { ...STARTING_DESIGN, illumination: { kind: 'plane-wave', thetaDeg: 30, phiDeg: 180, polarisation: 'x' } };
    const { axis, origin, horn, wavefronts } = illuminationDrawing(wave, space);
    const [fromX] = axis.slice(1).split(' ').map(Number);
    expect(fromX).toBeLessThan(origin.x);
    expect([horn, wavefronts === null]).toEqual([null, false]);
  });
});
