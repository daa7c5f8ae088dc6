import { integrateOverOutline } from './outline-integral';
import type { SiOutline } from './si-design';

const effort = { nodes: 12, partM: 0.5, pivot: { xM: 0.2, yM: 0.1 } };
const rectangle: SiOutline = { kind: 'rectangle', centre: { xM: 0.5, yM: 0 }, widthM: 3, heightM: 1 };
const ellipse: SiOutline = { kind: 'ellipse', centre: { xM: 0.5, yM: -0.25 }, widthM: 3, heightM: 1 };
const notched: SiOutline = {
  kind: 'polygon',
  points: [[0, 0], [4, 0], [4, 4], [3, 4], [3, 2], [1, 2], [1, 4], [0, 4]].map(([xM, yM]) => ({ xM, yM })),
};

describe('integration over an outline', () => {
  it('gives areas', () => {
    const one = (): number => 1;
    expect(integrateOverOutline(rectangle, one, effort)).toBeCloseTo(3, 12);
    expect(integrateOverOutline(ellipse, one, effort)).toBeCloseTo((Math.PI * 3) / 4, 12);
    expect(integrateOverOutline(notched, one, effort)).toBeCloseTo(12, 11);
  });

  it('gives second moments of a rectangle and an ellipse', () => {
    expect(integrateOverOutline(rectangle, (x) => x * x, effort)).toBeCloseTo(27 / 12 + 3 * 0.25, 11);
    // Ellipse: pi a b (a^2 / 4 + x0^2)
    expect(integrateOverOutline(ellipse, (x) => x * x, effort)).toBeCloseTo(Math.PI * 1.5 * 0.5 * (1.5 ** 2 / 4 + 0.25), 11);
  });

  it('does not depend on the direction in which a polygon runs, or on a pivot outside it', () => {
    const reversed: SiOutline = { kind: 'polygon', points: notched.kind === 'polygon' ? [...notched.points].reverse() : [] };
    const f = (x: number, y: number): number => Math.exp(-x) * Math.cos(y);
    const value = integrateOverOutline(notched, f, effort);
    expect(integrateOverOutline(reversed, f, effort)).toBeCloseTo(value, 10);
    expect(integrateOverOutline(notched, f, { ...effort, pivot: { xM: 2, yM: 3.5 } })).toBeCloseTo(value, 8);
    // Whole square less the notch, each by hand.
    const part = (x0: number, x1: number, y0: number, y1: number): number => (Math.exp(-x0) - Math.exp(-x1)) * (Math.sin(y1) - Math.sin(y0));
    expect(value).toBeCloseTo(part(0, 4, 0, 4) - part(1, 3, 2, 4), 9);
  });
});
