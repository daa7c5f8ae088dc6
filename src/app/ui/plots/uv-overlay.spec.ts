import { TAG_HEIGHT, TAG_WIDTH, azimuthTicks, tagCorner, thetaRings } from './uv-overlay';

const pad = 28;
const disc = (size: number) => ({ centre: size / 2 + pad, radius: size / 2 });

describe('grid of directions', () => {
  it('has rings every 15 degrees, their radius the sine of theta', () => {
    const rings = thetaRings(disc(400));
    expect(rings.map(({ thetaDeg }) => thetaDeg)).toEqual([15, 30, 45, 60, 75]);
    expect(rings[1].radius).toBeCloseTo(100, 9);
  });
  it('has azimuths every 30 degrees counted from u towards v', () => {
    const ticks = azimuthTicks(disc(400));
    expect(ticks).toHaveLength(12);
    expect(ticks[3].phiDeg).toBe(90);
    expect(ticks[3].labelY).toBeLessThan(30);
  });
});

describe('tag of the beam', () => {
  it.each([284, 388])('covers no azimuth label on a disc of %d pixels, wherever the beam is', (size) => {
    for (const [dx, dy] of [[1, -1], [-1, -1], [1, 1], [-1, 1]]) {
      const centre = disc(size).centre;
      const tag = tagCorner(disc(size), { x: centre + dx * 40, y: centre + dy * 40 }, pad);
      for (const { labelX, labelY, phiDeg } of azimuthTicks(disc(size))) {
        const half = String(phiDeg).length * 3.5;
        const apart = labelX + half < tag.x || labelX - half > tag.x + TAG_WIDTH || labelY < tag.y || labelY - 10 > tag.y + TAG_HEIGHT;
        expect({ phiDeg, apart }).toEqual({ phiDeg, apart: true });
      }
    }
  });
  it('stands in the corner nearest to the beam', () => {
    expect(tagCorner(disc(388), { x: 300, y: 100 }, pad)).toMatchObject({ x: 444 - TAG_WIDTH, y: 0 });
    expect(tagCorner(disc(388), { x: 100, y: 300 }, pad)).toMatchObject({ x: 0, y: 444 - TAG_HEIGHT });
  });
});
