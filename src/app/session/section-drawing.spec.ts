import { scaleText, sectionDrawing, sectionScale } from './section-drawing';

const subject = { panelWidthMm: 200, hornXMm: -60, hornZMm: 180, beamThetaDeg: 20, wavelengthMm: 10.7, cellPhasesDeg: [0, 90, 180, 270] };

describe('section of a panel', () => {
  it('fits a wide desk and a narrow one without leaving the picture', () => {
    for (const [width, height] of [[985, 826], [600, 826], [360, 300]]) {
      const scale = sectionScale(width, height);
      const { labels, slab } = sectionDrawing(subject, scale);
      expect(slab.x).toBeGreaterThan(0);
      expect(slab.x + slab.width).toBeLessThan(width);
      for (const { x, y } of labels) {
        expect(x).toBeGreaterThan(0);
        expect(x).toBeLessThan(width);
        expect(y).toBeGreaterThan(0);
        expect(y).toBeLessThan(height);
      }
    }
  });

  it('writes the dimensions of the design, the tilt of the beam among them', () => {
    const { labels } = sectionDrawing(subject, sectionScale(985, 826));
    expect(labels.map(({ text }) => text)).toEqual(['200.00', '60.00', '180.00', '20.0°']);
  });

  it('states its scale for a screen of 96 pixels to the inch', () => {
    const scale = sectionScale(985, 826);
    expect(scaleText({ ...scale, pixelsPerMm: 96 / 25.4 })).toBe('1 : 1.0');
    expect(scaleText({ ...scale, pixelsPerMm: 96 / 25.4 / 1.5 })).toBe('1 : 1.5');
    expect(scaleText({ ...scale, pixelsPerMm: (2 * 96) / 25.4 })).toBe('2.0 : 1');
  });

  it('makes a strip the wider the more phase its cell adds', () => {
    const widths = [...sectionDrawing(subject, sectionScale(985, 826)).copper.matchAll(/h([\d.]+)/g)].map(([, width]) => Number(width));
    expect(widths).toHaveLength(4);
    expect([...widths].sort((a, b) => a - b)).toEqual(widths);
  });

  it('points the mouth of the horn at the middle of the panel', () => {
    // The phase centre stands at (-60, 180): turning by atan(-60/180) takes "down" to the direction of the origin.
    expect(sectionDrawing(subject, sectionScale(985, 826)).horn.transform).toContain('rotate(-18.4)');
  });

  it('draws one crest of the incoming wave a wavelength, none below the panel', () => {
    const scale = sectionScale(985, 826);
    const heights = [...sectionDrawing(subject, scale).arcs.matchAll(/[ML][\d.]+ ([\d.]+)/g)].map(([, y]) => Number(y));
    expect(heights.length).toBeGreaterThan(400);
    expect(Math.max(...heights)).toBeLessThanOrEqual(scale.originY + 0.1);
  });
});
