import type { CutFigure } from './cut-figure';
import { polarFrame, polarGrid, polarPath, polarPoint } from './polar-drawing';

const figure: CutFigure = {
  title: 'Cut', angleTitle: 'θ, °', levelTitle: 'gain, dBi',
  main: { label: 'draft', angleDeg: [-90, 0, 90], levelDb: [-20, 40, 10] },
  overlay: null, forbidden: [], forbiddenLabel: '', least: null, marks: [],
  fromDeg: -90, toDeg: 90, floorDb: -20, topDb: 40,
};

describe('polar form', () => {
  const frame = polarFrame(figure, 248, 128);
  it('puts angle 0 upwards and positive angles to the right', () => {
    expect(polarPoint(frame, 0, 40)).toEqual({ x: 124, y: frame.centreY - frame.radius });
    expect(polarPoint(frame, 90, 40).x).toBeCloseTo(124 + frame.radius, 9);
  });
  it('keeps what lies below the floor in the centre instead of dropping it', () => {
    expect(polarPoint(frame, 45, -80)).toEqual({ x: frame.centreX, y: frame.centreY });
  });
  it('shows the very samples of the rectangular form', () => {
    expect(polarPath(frame, figure.main)).toBe(`M124 ${frame.centreY}L124 ${frame.centreY - frame.radius}L${124 + frame.radius / 2} ${frame.centreY}`);
  });
  it('draws rings of level and spokes of angle', () => {
    const { rings, spokes } = polarGrid(frame, figure);
    expect(rings.map(({ text }) => text)).toEqual(['\u221220', '\u221210', '0', '10', '20', '30', '40']);
    expect(spokes.map(({ text }) => text)).toEqual(['\u221290', '\u221260', '\u221230', '0', '30', '60', '90']);
  });
  it('takes a whole disc for angles beyond 90 degrees', () => {
    expect(polarFrame({ ...figure, fromDeg: -180, toDeg: 180 }, 300, 300).centreY).toBe(150);
  });
});
