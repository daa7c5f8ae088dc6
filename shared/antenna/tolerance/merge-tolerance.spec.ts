import { placeCells } from '../place-cells';
import { predictPlaced } from '../predict-design';
import { wilsonInterval } from '../../math/wilson-interval';
import { toleranceResult } from '../../model/tolerance-run';
import { mergeTolerance } from './merge-tolerance';
import { numberIn, SAMPLE_TOLERANCE_DESIGN, SAMPLE_TOLERANCE_PARAMETERS, sampleToleranceResult } from './sample-tolerance';
import { toleranceBench } from './tolerance-bench';
import { computeTolerancePart, type ToleranceChunk, type TolerancePart } from './tolerance-part';
import { planTolerance } from './tolerance-plan';

const placed = placeCells(SAMPLE_TOLERANCE_DESIGN);
const { verdicts } = predictPlaced(placed, { include: {} });
const parameters = SAMPLE_TOLERANCE_PARAMETERS;
const compute = (chunk: ToleranceChunk): TolerancePart => computeTolerancePart(toleranceBench({ placed, parameters }), chunk, verdicts, () => undefined);
const chunk = (study: ToleranceChunk['study'], from: number, to: number): ToleranceChunk => ({ study, from, to, cutsTo: study === 'all' ? 20 : 0 });
const result = sampleToleranceResult();

describe('a tolerance run', () => {
  it('gives the same bits however it is cut up and in whatever order the chunks come', () => {
    const pieces = [
      chunk('bow', 7, 20), chunk('all', 13, 20), chunk('phase-scatter', 0, 20), chunk('all', 0, 1), chunk('etch-random', 0, 20), chunk('bow', 0, 7), chunk('all', 1, 13),
    ];
    expect(mergeTolerance(parameters, pieces.map(compute))).toEqual(result);
  });

  it('comes through JSON unchanged and keeps to its schema', () => {
    expect(toleranceResult.parse(JSON.parse(JSON.stringify(result)))).toEqual(result);
    const part = compute(chunk('all', 0, 2));
    expect(JSON.parse(JSON.stringify(part))).toEqual(part);
  });

  it('counts the trials that meet each line, and all lines at once', () => {
    const readings = compute(chunk('all', 0, 20)).readings;
    const meeting = [
      readings.filter(({ gainDbi }) => numberIn(gainDbi) >= 29.05).length,
      readings.filter(({ sidelobeDb }) => numberIn(sidelobeDb) <= -20.5).length,
      readings.filter(({ pointingDeg }) => numberIn(pointingDeg) <= 0.15).length,
    ];
    const shares = result.lines.map(({ share }) => ('met' in share ? share.met : share.reason));
    expect(shares).toEqual([...meeting, 'the trials are computed by the scalar model, which does not hold this line']);
    const both = readings.filter((r) => numberIn(r.gainDbi) >= 29.05 && numberIn(r.sidelobeDb) <= -20.5 && numberIn(r.pointingDeg) <= 0.15).length;
    expect(result.allLines?.met).toBe(both);
    // Some panels miss and some meet: the sample tells the two apart.
    expect(both).toBeGreaterThan(0);
    expect(both).toBeLessThan(20);
  });

  it('gives every share its interval', () => {
    const [{ share }] = result.lines;
    if (!('met' in share)) throw new Error('the gain is judged');
    expect([share.low, share.high]).toEqual([...wilsonInterval(share.met, 20)]);
    expect(share.low).toBeLessThan(share.met / 20);
  });

  it('ranks each contributor by itself on the side that the requirement dreads', () => {
    const [scatter, bow, etch] = result.ranking;
    expect(numberIn(scatter.change.gainDbi)).toBeLessThan(0);
    expect(numberIn(bow.change.sidelobeDb)).toBeGreaterThan(0);
    expect(etch).toMatchObject({ id: 'etch-random', notApplied: 'only the cells of an edition have a geometry', change: { gainDbi: 0 } });
    expect(etch.change.maskMarginDb).toMatchObject({ reason: 'the requirement has no mask that can be judged' });
  });

  it('holds an envelope that rises from 5 over 50 to 95 of 100 and lies about the cut as drawn', () => {
    expect(result.cuts.map(({ plane }) => plane)).toEqual(['along', 'across']);
    for (const { angleDeg, nominalDbi, p5Dbi, p50Dbi, p95Dbi } of result.cuts) {
      const at = angleDeg.findIndex((deg) => Math.abs(deg) < 1e-9);
      expect(angleDeg.every((deg, i) => i === 0 || deg > angleDeg[i - 1])).toBe(true);
      expect(p5Dbi.every((level, i) => level <= p50Dbi[i] && p50Dbi[i] <= p95Dbi[i])).toBe(true);
      expect(nominalDbi[at]).toBeGreaterThan(p50Dbi[at]);
    }
  });

  it('tells spreads that hold the value as drawn near their better end', () => {
    const gain = result.spreads.find(({ measure }) => measure === 'gainDbi');
    expect(numberIn(gain?.nominal)).toBeGreaterThan(numberIn(gain?.p95) - 0.05);
    expect(numberIn(gain?.p5)).toBeLessThan(numberIn(gain?.p50));
  });

  it('refuses to be put together from less than all trials', () => {
    expect(() => mergeTolerance(parameters, [compute(chunk('all', 0, 5))])).toThrow('A tolerance run of 20 trials is put together from 5');
  });

  it('stops between trials when told to', () => {
    let asked = 0;
    const stop = (): void => {
      asked += 1;
      if (asked === 3) throw new Error('stopped');
    };
    expect(() => computeTolerancePart(toleranceBench({ placed, parameters }), chunk('all', 0, 20), verdicts, stop)).toThrow('stopped');
  });
});

describe('planTolerance', () => {
  it('covers every trial of everything together and sixty of each contributor alone, once', () => {
    const plan = planTolerance(SAMPLE_TOLERANCE_DESIGN, { ...parameters, trials: 700 });
    const covered = (study: string): number[] => plan.filter((planned) => planned.chunk.study === study).flatMap((planned) => Array.from({ length: planned.chunk.to - planned.chunk.from }, (_, i) => planned.chunk.from + i));
    expect(covered('all')).toEqual(Array.from({ length: 700 }, (_, i) => i));
    expect(covered('bow')).toEqual(Array.from({ length: 60 }, (_, i) => i));
    expect(Math.max(...plan.map(({ seconds }) => seconds))).toBeLessThanOrEqual(1);
  });

  it('leaves out contributors without a spread', () => {
    const plan = planTolerance(SAMPLE_TOLERANCE_DESIGN, { ...parameters, contributors: [{ id: 'bow', spread: 0, distribution: 'normal' }] });
    expect(new Set(plan.map((planned) => planned.chunk.study))).toEqual(new Set(['all']));
  });
});
