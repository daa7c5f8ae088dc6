import type { CellEdition, CellQuality, QualityFinding, QualityReport, QualityVerdict } from '../model/cell-family';
import type { ResponseOrigin } from '../model/response-origin';
import { checkPhaseJumps, checkPhaseSlope } from './cell-quality-frequency';
import { checkNoise, checkReferencePlane } from './cell-quality-measurement';
import { checkOutliers, checkPhaseRange } from './cell-quality-parameter';
import { checkPassivity } from './cell-quality-passivity';
import { checkCoverage, checkDuplicates, checkExcludedRegions, checkMissingPoints } from './cell-quality-points';
import { checkReciprocity } from './cell-quality-reciprocity';
import { checkRepeatability } from './cell-quality-repeatability';
import { prepareSubject } from './cell-quality-subject';
import type { PointedFinding, QualityCheck } from './cell-quality-subject';

/** One check and the question it answers. */
export interface CellCheck {
  /** Names that its findings carry. */
  readonly finds: readonly string[];
  readonly question: string;
  readonly run: QualityCheck;
}

/** Every check of an edition, in the order in which a report lists them. */
export const CELL_CHECKS: readonly CellCheck[] = [
  { finds: ['coverage'], question: 'Does the band hold the design frequency, and which angles are given?', run: checkCoverage },
  { finds: ['excluded-region'], question: 'How many points does the laboratory exclude?', run: checkExcludedRegions },
  { finds: ['phase-range', 'largest-gap'], question: 'Do the cells reach every phase at the design frequency?', run: checkPhaseRange },
  { finds: ['reference-plane'], question: 'Are the phases given at the top of the slab?', run: checkReferencePlane },
  { finds: ['missing-points'], question: 'Is every point of the grid given?', run: checkMissingPoints },
  { finds: ['duplicate-points'], question: 'Is every cell given once?', run: checkDuplicates },
  { finds: ['passivity'], question: 'Does any cell return more power than comes in?', run: checkPassivity },
  { finds: ['reciprocity'], question: 'Does a cell answer alike both ways?', run: checkReciprocity },
  { finds: ['phase-slope'], question: 'Does the phase fall with frequency, as exp(+jwt) demands?', run: checkPhaseSlope },
  { finds: ['repeatability'], question: 'Does a cell that was measured twice give the same?', run: checkRepeatability },
  { finds: ['noise'], question: 'How much of the response is noise?', run: checkNoise },
  { finds: ['phase-jump'], question: 'Does the phase step where its neighbours in frequency do not?', run: checkPhaseJumps },
  { finds: ['outlier'], question: 'Does a cell stand off its neighbours in size?', run: checkOutliers },
];

/**
 * Judges an edition by every check. Points in regions the laboratory excludes are counted and not judged. With the origin of the
 * responses every finding names the file and the line it speaks of, as far as there is one.
 */
export function judgeEdition(edition: CellEdition, origin?: ResponseOrigin): QualityReport {
  const subject = prepareSubject(edition, origin?.repeats);
  const findings = CELL_CHECKS.flatMap(({ run }) => run(subject)).map((finding) => locatedFinding(finding, edition, origin));
  const family = findings.filter(({ cellId }) => cellId === undefined);
  const byCell = new Map<string, QualityFinding[]>(edition.cells.map(({ id }) => [id, []]));
  for (const finding of findings) if (finding.cellId !== undefined) byCell.get(finding.cellId)?.push(finding);
  const cells = edition.cells.map(({ id }): CellQuality => {
    const own = byCell.get(id) ?? [];
    return { cellId: id, verdict: worstVerdict(own), findings: own };
  });
  return { verdict: worstVerdict([...family, ...cells]), family, cells };
}

/** The finding with its file and line instead of its place in the table. */
function locatedFinding({ point, isWholeCurve, ...finding }: PointedFinding, { cells, responses }: CellEdition, origin?: ResponseOrigin): QualityFinding {
  if (origin === undefined || finding.file !== undefined) return finding;
  const perCurve = responses.frequenciesHz.length;
  if (point !== undefined) {
    const file = origin.fileOfCurve[Math.floor(point / perCurve)];
    const line = isWholeCurve === true ? 0 : origin.lineOfPoint[point];
    return { ...finding, ...(file === null ? {} : { file }), ...(file !== null && line > 0 ? { line } : {}) };
  }
  const cell = cells.findIndex(({ id }) => id === finding.cellId);
  if (cell < 0) return finding;
  // A finding about a cell as a whole has a file only where all of the cell came from one.
  const perCell = responses.thetasRad.length * responses.phisRad.length;
  const files = new Set(origin.fileOfCurve.slice(cell * perCell, (cell + 1) * perCell).filter((file) => file !== null));
  const [only] = files;
  return files.size === 1 ? { ...finding, file: only } : finding;
}

/** Fail before warn before pass; `not-evaluated` only when nothing was judged. */
export function worstVerdict(parts: readonly { readonly verdict: QualityVerdict }[]): QualityVerdict {
  const order: readonly QualityVerdict[] = ['fail', 'warn', 'pass'];
  return order.find((verdict) => parts.some((part) => part.verdict === verdict)) ?? 'not-evaluated';
}
