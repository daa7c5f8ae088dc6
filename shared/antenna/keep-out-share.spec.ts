import fc from 'fast-check';
import { exampleDesign } from './example-design';
import { hornCapturedShare } from './horn-spillover';
import { keepOutShare } from './keep-out-share';
import { keepOutWarning } from './keep-out-warning';
import { predictDesign } from './predict-design';
import { siDesign, type SiHorn, type SiOutline, type SiPanel } from './si-design';

const horn: SiHorn = { kind: 'horn', position: { xM: -0.05, yM: 0.01, zM: 0.2 }, aim: { xM: 0.01, yM: 0, zM: 0 }, exponentE: 8, exponentH: 5, polarisation: 'x' };
const box = (widthM: number, heightM: number, xM = 0, yM = 0): SiOutline => ({ kind: 'rectangle', centre: { xM, yM }, widthM, heightM });
const disc = (widthM: number, heightM: number, xM = 0, yM = 0): SiOutline => ({ kind: 'ellipse', centre: { xM, yM }, widthM, heightM });
const panel = (outline: SiOutline, ...keepOuts: SiOutline[]): SiPanel => ({ ...siDesign(exampleDesign()).panel, outline, keepOuts });
/** The independent way: rays to the true edge of each shape. */
const hit = (outline: SiOutline): number => hornCapturedShare(horn, outline).fraction;

describe('keepOutShare', () => {
  const outline = box(0.3, 0.24);

  it.each([
    ['a rectangle', box(0.05, 0.03, 0.02, -0.04)],
    ['an ellipse', disc(0.08, 0.02, -0.05, 0.03)],
    ['a polygon', { kind: 'polygon', points: [[0, 0], [0.1, 0.01], [0.02, 0.09]].map(([xM, yM]) => ({ xM, yM })) } satisfies SiOutline],
  ])('is what hits %s, as integrated along its edge', (_name, keepOut) => {
    expect(keepOutShare(horn, panel(outline, keepOut))).toBeCloseTo(hit(keepOut), 7);
  });

  it('counts overlapping keep-outs once and what lies outside the outline not at all', () => {
    const [left, right, both] = [box(0.06, 0.04, -0.01), box(0.06, 0.04, 0.01), box(0.08, 0.04)];
    expect(keepOutShare(horn, panel(outline, left, right))).toBeCloseTo(hit(both), 7);
    expect(keepOutShare(horn, panel(outline, box(0.1, 0.24, 0.15)))).toBeCloseTo(hit(box(0.05, 0.24, 0.125)), 7);
    expect(keepOutShare(horn, panel(outline, box(0.1, 0.1, 0.3)))).toBe(0);
    expect(keepOutShare(horn, panel(outline))).toBe(0);
  });

  it('takes all when a keep-out covers the outline, also where an ellipse crosses its edge', () => {
    expect(keepOutShare(horn, panel(outline, box(1, 1)))).toBeCloseTo(hit(outline), 7);
    // An ellipse through all four sides and one rectangle: what both leave free is the corners.
    const [round, square] = [disc(0.34, 0.27), box(0.3, 0.24)];
    const inside = keepOutShare(horn, panel(square, round));
    expect(inside).toBeCloseTo(keepOutShare(horn, panel(round, square)), 7);
    expect(inside).toBeLessThan(hit(square) - 1e-3);
  });

  it('never falls when a keep-out is added, and never exceeds what hits the outline', () => {
    const shape = fc.record({ round: fc.boolean(), w: fc.double({ min: 0.005, max: 0.2, noNaN: true }), h: fc.double({ min: 0.005, max: 0.2, noNaN: true }), x: fc.double({ min: -0.2, max: 0.2, noNaN: true }), y: fc.double({ min: -0.2, max: 0.2, noNaN: true }) });
    fc.assert(
      fc.property(fc.array(shape, { minLength: 1, maxLength: 3 }), (shapes) => {
        const keepOuts = shapes.map(({ round, w, h, x, y }) => (round ? disc(w, h, x, y) : box(w, h, x, y)));
        const [most, fewer] = [keepOutShare(horn, panel(outline, ...keepOuts)), keepOutShare(horn, panel(outline, ...keepOuts.slice(1)))];
        expect(most).toBeGreaterThanOrEqual(fewer - 1e-6);
        expect(most).toBeLessThanOrEqual(Math.min(hit(outline), keepOuts.reduce((sum, keepOut) => sum + hit(keepOut), 0)) + 1e-6);
      }),
      { numRuns: 15 },
    );
  });
});

describe('keepOutWarning', () => {
  const design = exampleDesign({ panel: { ...exampleDesign().panel, keepOuts: [{ kind: 'rectangle', widthMm: 45, heightMm: 45, centreMm: [0, 0] }] } });

  it('says how many decibels the figures are too high by; the spillover stays that of the outline', () => {
    const [with_, without] = [predictDesign(design, { include: {} }), predictDesign(exampleDesign(), { include: {} })];
    expect(with_.figures.spilloverDb).toBe(without.figures.spilloverDb);
    const found = with_.warnings.find(({ code }) => code === 'keep-out-power');
    const si = siDesign(design);
    if (si.illumination.kind !== 'horn') throw new Error('the example has a horn');
    const [taken, all] = [hornCapturedShare(si.illumination, si.panel.keepOuts[0]).fraction, hornCapturedShare(si.illumination, si.panel.outline).fraction];
    expect(found?.numbers['costDb']).toBeCloseTo(-10 * Math.log10(1 - taken / all), 6);
    expect(found).toMatchObject({ severity: 'warn', pointer: '#/panel/keepOuts', message: expect.stringContaining(`${((100 * taken) / all).toFixed(2)} % of the power`) });
    expect(without.warnings.some(({ code }) => code === 'keep-out-power')).toBe(false);
  });

  it('is a note where it is little, and silent where there is no horn or no light', () => {
    const little = siDesign({ ...design, panel: { ...design.panel, keepOuts: [{ kind: 'ellipse', widthMm: 10, heightMm: 10, centreMm: [100, 100] }] } });
    expect(keepOutWarning(little, -0.4)).toMatchObject([{ severity: 'note' }]);
    expect(keepOutWarning(siDesign(design), { kind: 'nothing-lit', reason: 'dark' })).toEqual([]);
    const lit = siDesign({ ...design, illumination: { kind: 'plane-wave', thetaDeg: 0, phiDeg: 0, polarisation: 'x' } });
    expect(keepOutWarning(lit, 0)).toEqual([]);
  });
});
