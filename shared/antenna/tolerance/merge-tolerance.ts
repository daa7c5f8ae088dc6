import { mean, quantile } from '../../math/statistics';
import { wilsonInterval } from '../../math/wilson-interval';
import type { Figure, Verdict } from '../../model/figures';
import type { ContributorId, CutEnvelope, MeasureSpread, RankedContributor, ShareMet, ToleranceLine, ToleranceMeasure, ToleranceParameters, ToleranceReading, ToleranceResult } from '../../model/tolerance-run';
import { noFigure } from '../no-figure';
import type { NominalPart, TolerancePart } from './tolerance-part';
import { envelopeTrials, rankingTrials } from './tolerance-plan';

/** The measure that a line of the requirement is held against; a line without one is not judged. */
const MEASURE_OF_LINE: Readonly<Partial<Record<Verdict['line'], ToleranceMeasure>>> = { gain: 'gainDbi', sidelobe: 'sidelobeDb', pointing: 'pointingDeg', mask: 'maskMarginDb' };

/** The fraction on the side that a requirement dreads: 1 trial in 20 goes beyond. */
const BAD_SIDE: Readonly<Record<ToleranceMeasure, number>> = { gainDbi: 0.05, sidelobeDb: 0.95, pointingDeg: 0.95, maskMarginDb: 0.05 };
const MEASURES = Object.keys(BAD_SIDE) as ToleranceMeasure[];

/** Puts the chunks of a run together, in whatever order they come. Throws where one is missing. */
export function mergeTolerance(parameters: ToleranceParameters, parts: readonly TolerancePart[]): ToleranceResult {
  const ofStudy = (study: TolerancePart['study']): TolerancePart[] => parts.filter((part) => part.study === study).sort((a, b) => a.from - b.from);
  const all = ofStudy('all');
  const nominal = all[0]?.nominal;
  const readings = all.flatMap((part) => part.readings);
  if (nominal === null || nominal === undefined || readings.length !== parameters.trials) {
    throw new RangeError(`A tolerance run of ${parameters.trials} trials is put together from ${readings.length}`);
  }
  const lines = nominal.verdicts.map((verdict) => judgedLine(verdict, nominal, readings));
  return {
    trials: parameters.trials,
    rankingTrials: rankingTrials(parameters),
    envelopeTrials: envelopeTrials(parameters),
    lines,
    allLines: shareOfAll(lines, nominal.verdicts, readings),
    spreads: MEASURES.map((measure) => spreadOf(measure, nominal.reading, readings)),
    ranking: parameters.contributors.map(({ id }) => ranked(id, nominal, ofStudy(id).flatMap((part) => part.readings))),
    cuts: nominal.cuts.map((cut, i) => envelopeOf(cut, all.flatMap((part) => part.cuts[i].centiDbi))),
    cellsWithoutNeighbour: nominal.cellsWithoutNeighbour,
  };
}

const isGiven = (value: number | null): value is number => value !== null;
const valuesOf = (measure: ToleranceMeasure, readings: readonly ToleranceReading[]): number[] => readings.map((reading) => reading[measure]).filter(isGiven);
const notThere = (measure: ToleranceMeasure): Figure => noFigure('not-read', measure === 'maskMarginDb' ? 'the requirement has no mask that can be judged' : 'the pattern has no such thing');

function meets({ line, sense, limit }: Verdict, reading: ToleranceReading): boolean {
  const measure = MEASURE_OF_LINE[line];
  const value = measure === undefined ? null : reading[measure];
  // A pattern without any lobe beside its beams keeps every limit on them; no other measure can be missing in a judged line.
  if (value === null) return line === 'sidelobe';
  return sense === 'at-least' ? value >= limit : value <= limit;
}

/** Why a line is not judged; null where it is. */
function obstacleOf({ line, value, reason }: Verdict, { reading }: NominalPart): string | null {
  const measure = MEASURE_OF_LINE[line];
  if (measure === undefined) return 'the trials are computed by the scalar model, which does not hold this line';
  if (typeof value !== 'number' && reading[measure] === null) return reason ?? value.reason;
  return reading[measure] === null && line !== 'sidelobe' ? 'the panel as drawn has no such figure' : null;
}

function shareMet(met: number, of: number): ShareMet {
  const [low, high] = wilsonInterval(met, of);
  return { met, of, low, high };
}

function judgedLine(verdict: Verdict, nominal: NominalPart, readings: readonly ToleranceReading[]): ToleranceLine {
  const { line, sense, limit, unit } = verdict;
  const measure = MEASURE_OF_LINE[line];
  const drawn = measure === undefined ? null : nominal.reading[measure];
  const reason = obstacleOf(verdict, nominal);
  const share = reason === null ? shareMet(readings.filter((reading) => meets(verdict, reading)).length, readings.length) : { reason };
  return { line, sense, limit, unit, nominal: drawn ?? noFigure('not-read', reason ?? 'the pattern has no such thing'), share };
}

function shareOfAll(lines: readonly ToleranceLine[], verdicts: readonly Verdict[], readings: readonly ToleranceReading[]): ShareMet | null {
  const judged = verdicts.filter((_, i) => 'met' in lines[i].share);
  if (judged.length === 0) return null;
  return shareMet(readings.filter((reading) => judged.every((verdict) => meets(verdict, reading))).length, readings.length);
}

function spreadOf(measure: ToleranceMeasure, nominal: ToleranceReading, readings: readonly ToleranceReading[]): MeasureSpread {
  const values = valuesOf(measure, readings);
  const missing = notThere(measure);
  if (values.length === 0) return { measure, nominal: nominal[measure] ?? missing, mean: missing, p5: missing, p50: missing, p95: missing };
  const [p5, p50, p95] = [0.05, 0.5, 0.95].map((fraction) => quantile(values, fraction));
  return { measure, nominal: nominal[measure] ?? missing, mean: mean(values), p5, p50, p95 };
}

function ranked(id: ContributorId, { reading, notApplied }: NominalPart, readings: readonly ToleranceReading[]): RankedContributor {
  const change = (measure: ToleranceMeasure): Figure => {
    const drawn = reading[measure];
    const values = valuesOf(measure, readings);
    return drawn === null || values.length === 0 ? notThere(measure) : quantile(values, BAD_SIDE[measure]) - drawn;
  };
  const reason = notApplied.find((other) => other.id === id)?.reason ?? null;
  return { id, change: { gainDbi: change('gainDbi'), sidelobeDb: change('sidelobeDb'), pointingDeg: change('pointingDeg'), maskMarginDb: change('maskMarginDb') }, notApplied: reason };
}

/** Percentiles angle by angle of gains that stand trial after trial. */
function envelopeOf({ plane, angleDeg, centiDbi }: NominalPart['cuts'][number], gains: readonly number[]): CutEnvelope {
  const samples = angleDeg.length;
  const count = gains.length / samples;
  const column = new Float64Array(count);
  const rows: { p5Dbi: number[]; p50Dbi: number[]; p95Dbi: number[] } = { p5Dbi: [], p50Dbi: [], p95Dbi: [] };
  for (let i = 0; i < samples; i++) {
    for (let trial = 0; trial < count; trial++) column[trial] = gains[trial * samples + i] / 100;
    rows.p5Dbi.push(quantile(column, 0.05));
    rows.p50Dbi.push(quantile(column, 0.5));
    rows.p95Dbi.push(quantile(column, 0.95));
  }
  return { plane, angleDeg: [...angleDeg], nominalDbi: centiDbi.map((value) => value / 100), ...rows };
}
