import { checkDesign, designFaults } from './design-faults';
import { EXAMPLE_DESIGN, exampleDesign } from './example-design';
import { InvalidDesign } from './invalid-design';

const { panel, requirement, illumination } = EXAMPLE_DESIGN;

describe('faults between the fields of a design', () => {
  it('finds none in the example', () => {
    expect(designFaults(EXAMPLE_DESIGN)).toEqual([]);
    expect(() => checkDesign(EXAMPLE_DESIGN)).not.toThrow();
  });

  it('names all of them at once, each with its place', () => {
    const faulty = exampleDesign({
      requirement: { ...requirement, bandGHz: [11, 9], mask: { kind: 'custom', points: [[5, 0], [5, -10]] } },
      panel: { ...panel, outline: { kind: 'polygon', pointsMm: [[0, 0], [100, 100], [100, 0], [0, 100]] } },
      illumination: { ...illumination, kind: 'horn', positionMm: [0, 0, 0], aimMm: [0, 0, 0], exponentE: 1, exponentH: 1 },
      synthesis: { kind: 'focus', pointMm: [0, 0, -100] },
      cells: { kind: 'inline', cells: [{ phaseDeg: 0, magnitude: 0 }] },
    });
    expect(designFaults(faulty).map((fault) => fault.pointer)).toEqual([
      '#/requirement/bandGHz',
      '#/requirement/mask/points/1/0',
      '#/panel/outline/pointsMm',
      '#/illumination/positionMm/2',
      '#/illumination/aimMm',
      '#/synthesis/pointMm/2',
      '#/cells/cells',
    ]);
  });

  it('throws them as one error whose message holds each', () => {
    const faulty = exampleDesign({ panel: { ...panel, outline: { kind: 'rectangle', widthMm: 14, heightMm: 300 } }, requirement: { ...requirement, bandGHz: [11, 9] } });
    expect(() => checkDesign(faulty)).toThrow(InvalidDesign);
    expect(() => checkDesign(faulty)).toThrow('#/requirement/bandGHz: must rise; got 11 to 9 GHz; #/panel: the outline is smaller than one period, so the panel has no cells');
  });

  it('names a keep-out that crosses itself', () => {
    const faulty = exampleDesign({ panel: { ...panel, keepOuts: [{ kind: 'polygon', centreMm: [0, 0], pointsMm: [[0, 0], [9, 9], [9, 0], [0, 9]] }] } });
    expect(designFaults(faulty)).toEqual([{ pointer: '#/panel/keepOuts/0/pointsMm', detail: expect.stringContaining('crosses itself') }]);
  });
});
