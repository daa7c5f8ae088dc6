import type { DesignDocument } from '../../model/design-document';
import { DEFAULT_TOLERANCE } from '../../model/tolerance-contributors';
import type { ToleranceParameters } from '../../model/tolerance-run';
import { exampleDesign, planeWaveDesign } from '../example-design';
import { EXAMPLE_EDITION_ID, exampleEdition } from '../example-edition';
import { placeCells } from '../place-cells';
import { predictPlaced } from '../predict-design';
import { prepareEdition } from '../prepare-edition';
import { numberIn } from './sample-tolerance';
import { toleranceBench, type ToleranceBench } from './tolerance-bench';

const edition = prepareEdition(exampleEdition());
const cells: DesignDocument['cells'] = { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [] };
const mask = { kind: 'custom', points: [[12, 15], [60, 5]] as [number, number][] } as const;
const requirement = { ...exampleDesign().requirement, mask: { ...mask, points: [...mask.points] } };
const design = exampleDesign({ cells, requirement });

function benchOf(of: DesignDocument, parameters: ToleranceParameters = DEFAULT_TOLERANCE): ToleranceBench {
  return toleranceBench({ placed: placeCells(of, edition), edition, parameters });
}

describe('toleranceBench', () => {
  it('reads off the panel as drawn what the prediction says of it', () => {
    const bench = benchOf(design);
    const { figures } = predictPlaced(placeCells(design, edition), { include: {} });
    const reading = bench.read(bench.patternOf('all', null));
    const { hemisphere } = figures.sidelobeDb;
    expect(reading.gainDbi).toBeCloseTo(numberIn(figures.gainAtBeamDbi), 9);
    expect(reading.pointingDeg).toBeCloseTo(numberIn(figures.pointingErrorDeg), 6);
    expect(reading.sidelobeDb).toBeCloseTo(numberIn('levelDb' in hemisphere ? hemisphere.levelDb : hemisphere), 6);
    expect(reading.maskMarginDb).toBeCloseTo(numberIn('marginDb' in figures.maskMargin ? figures.maskMargin.marginDb : figures.maskMargin), 6);
  });

  it('starts from the gain of the vector model where the design asks for it', () => {
    const vector: DesignDocument = { ...design, prediction: { ...design.prediction, model: 'vector' } };
    const bench = benchOf(vector);
    const { figures } = predictPlaced(placeCells(vector, edition), { include: {} });
    expect(bench.read(bench.patternOf('all', null)).gainDbi).toBeCloseTo(numberIn(figures.gainAtBeamDbi), 9);
    // The pattern is that of one polarisation with a scalar element factor: lobes near the beam agree to a tenth of a decibel.
    const { hemisphere } = figures.sidelobeDb;
    const sidelobeDb = numberIn('levelDb' in hemisphere ? hemisphere.levelDb : hemisphere);
    expect(Math.abs(numberIn(bench.read(bench.patternOf('all', null)).sidelobeDb) - sidelobeDb)).toBeLessThan(0.1);
  });

  it('reads the cuts as the prediction does', () => {
    const bench = benchOf(design);
    const pattern = bench.patternOf('all', null);
    const [along] = bench.cuts;
    const middle = along.angleDeg.findIndex((deg) => Math.abs(deg) < 1e-9);
    const { cuts } = predictPlaced(placeCells(design, edition), { include: { cuts: [{ plane: 'along', angleDeg: [along.angleDeg[middle + 5], along.angleDeg[middle + 5], 1] }] } });
    const gains = along.gainsDbi(pattern);
    expect(gains[middle]).toBeCloseTo(bench.read(pattern).gainDbi ?? 0, 9);
    expect(gains[middle + 5]).toBeCloseTo(cuts?.[0].gainDbi[0] ?? 0, 6);
  });

  it('varies one contributor alone with the draws it has among the others', () => {
    const alone = benchOf(design);
    const onlyBow = benchOf(design, { ...DEFAULT_TOLERANCE, contributors: DEFAULT_TOLERANCE.contributors.filter(({ id }) => id === 'bow') });
    expect(alone.read(alone.patternOf('bow', 4))).toEqual(onlyBow.read(onlyBow.patternOf('all', 4)));
  });

  it('says which contributors cannot act, and leaves them out', () => {
    const bench = toleranceBench({ placed: placeCells(planeWaveDesign()), parameters: DEFAULT_TOLERANCE });
    expect(bench.model.notApplied.map(({ id }) => id)).toEqual(['etch-random', 'etch-common', 'permittivity', 'thickness', 'temperature', 'feed-axial', 'feed-x', 'feed-y']);
    expect(bench.model.notApplied[0].reason).toBe('only the cells of an edition have a geometry');
    expect(bench.patternOf('etch-random', 0).farField.powerAt(0, 0)).toBe(bench.patternOf('all', null).farField.powerAt(0, 0));
  });

  it('loses more gain the more a panel is off', () => {
    const spreadOf = (spread: number): number => {
      const bench = benchOf(design, { ...DEFAULT_TOLERANCE, contributors: [{ id: 'phase-scatter', spread, distribution: 'normal' }] });
      return bench.read(bench.patternOf('all', 0)).gainDbi ?? 0;
    };
    expect(spreadOf(10)).toBeGreaterThan(spreadOf(25));
    expect(spreadOf(25)).toBeGreaterThan(spreadOf(50));
  });

  it('refuses a panel that radiates nothing', () => {
    const dark: DesignDocument['illumination'] = { kind: 'horn', positionMm: [0, 0, 200], aimMm: [0, 0, 400], exponentE: 6, exponentH: 6, polarisation: 'x' };
    expect(() => benchOf({ ...design, illumination: dark })).toThrow('the panel radiates nothing towards its first beam, so there is nothing that could be spread');
  });
});
