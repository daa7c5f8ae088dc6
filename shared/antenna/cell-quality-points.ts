import type { QualityFinding } from '../model/cell-family';
import { curvePlaces, inGHz, inWords, markRegion, pointIndex } from './cell-quality-subject';
import type { CurvePlace, PointedFinding, QualitySubject } from './cell-quality-subject';

/** Above this share of missing points a curve is no longer interpolated but invented. */
const MISSING_SHARE_LIMIT = 0.1;
const LISTED_FREQUENCIES = 10;

/** Points of the grid that were never given, outside excluded regions. A gap at the design frequency fails. */
export function checkMissingPoints({ edition, excluded, designIndex }: QualitySubject): PointedFinding[] {
  return edition.cells.map((cell, index) => {
    const missing = curvePlaces(edition, index).flatMap((place) => missingAt(place));
    const total = curvePlaces(edition, index).length * edition.responses.frequenciesHz.length;
    const atDesign = missing.filter(({ frequency }) => frequency === designIndex).length;
    const share = missing.length / total;
    const verdict = missing.length === 0 ? 'pass' : atDesign > 0 || share > MISSING_SHARE_LIMIT ? 'fail' : 'warn';
    const frequencies = [...new Set(missing.map(({ frequency }) => frequency))].sort((a, b) => a - b);
    const listed = frequencies.slice(0, LISTED_FREQUENCIES).map((i) => inGHz(edition.responses.frequenciesHz[i]));
    const more = frequencies.length > LISTED_FREQUENCIES ? ' and more' : '';
    const design = atDesign > 0 ? '; the design frequency is among them' : '';
    const detail = missing.length === 0 ? `All ${total} points are given` : `${missing.length} of ${total} points are missing: ${listed.join(', ')}${more}${design}`;
    return { check: 'missing-points', verdict, detail, cellId: cell.id, value: missing.length, limit: 0, ...(missing.length === 0 ? {} : { point: missing[0].point, isWholeCurve: true as const }) };
  });

  function missingAt(place: CurvePlace): { readonly frequency: number; readonly point: number }[] {
    return Array.from(edition.responses.frequenciesHz, (_, frequency) => ({ frequency, point: pointIndex(edition, place, frequency) })).filter(
      ({ point }) => edition.responses.present[point] === 0 && excluded[point] === 0,
    );
  }
}

/** Cells of equal parameters: one of them is a repeat, or one of them is labelled wrongly. */
export function checkDuplicates({ edition }: QualitySubject): QualityFinding[] {
  const seen = new Map<string, string>();
  const findings: QualityFinding[] = [];
  for (const cell of edition.cells) {
    const key = cell.parametersMm.map((value) => value.toPrecision(9)).join(' ');
    const before = seen.get(key);
    if (before === undefined) seen.set(key, cell.id);
    else findings.push({ check: 'duplicate-points', verdict: 'warn', detail: `${cell.id} and ${before} have the same parameters (${cell.parametersMm.join(', ')} mm)`, cellId: cell.id });
  }
  if (findings.length > 0) return findings;
  return [{ check: 'duplicate-points', verdict: 'pass', detail: `The ${edition.cells.length} cells have different parameters` }];
}

/** The band and the angles the edition holds, against the design frequency of its description. */
export function checkCoverage({ edition, designIndex }: QualitySubject): QualityFinding[] {
  const { frequenciesHz, thetasRad, phisRad } = edition.responses;
  if (frequenciesHz.length === 0) return [{ check: 'coverage', verdict: 'fail', detail: 'The edition holds no frequency' }];
  const band = `${inGHz(frequenciesHz[0])} to ${inGHz(frequenciesHz[frequenciesHz.length - 1])} in ${frequenciesHz.length} points`;
  const last = { theta: thetasRad.length - 1, phi: phisRad.length - 1 };
  const angles = thetasRad.length === 1 && phisRad.length === 1 ? `one incidence (${inWords(edition, last)})` : `${thetasRad.length} x ${phisRad.length} incidences up to ${inWords(edition, last)}`;
  const design = `${edition.description.designFrequencyGHz} GHz`;
  if (designIndex === null) return [{ check: 'coverage', verdict: 'fail', detail: `The design frequency ${design} lies outside ${band}` }];
  return [{ check: 'coverage', verdict: 'pass', detail: `${band}, ${angles}; the design frequency ${design} lies within` }];
}

/** How many points each excluded region takes out of the judgement. */
export function checkExcludedRegions({ edition, excluded }: QualitySubject): QualityFinding[] {
  const regions = edition.description.excludedRegions;
  if (regions.length === 0) return [];
  const total = excluded.reduce((count, flag) => count + flag, 0);
  const summary: QualityFinding = { check: 'excluded-region', verdict: 'not-evaluated', detail: `${total} of ${excluded.length} points lie in regions the laboratory excludes; they were not judged`, value: total };
  const empty = regions.filter((region) => markRegion(edition, region, new Uint8Array(excluded.length)) === 0);
  return [summary, ...empty.map((region): QualityFinding => ({ check: 'excluded-region', verdict: 'warn', detail: `An excluded region holds no point of the edition: ${region.reason}` }))];
}
