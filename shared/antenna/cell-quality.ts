import type { CellEdition, CellQuality, QualityFinding, QualityReport, QualityVerdict } from '../model/cell-family';
import { checkPhaseJumps, checkPhaseSlope } from './cell-quality-frequency';
import { checkNoise, checkReferencePlane } from './cell-quality-measurement';
import { checkOutliers, checkPhaseRange } from './cell-quality-parameter';
import { checkPassivity } from './cell-quality-passivity';
import { checkCoverage, checkDuplicates, checkExcludedRegions, checkMissingPoints } from './cell-quality-points';
import { checkReciprocity } from './cell-quality-reciprocity';
import { prepareSubject } from './cell-quality-subject';
import type { QualityCheck } from './cell-quality-subject';

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
  { finds: ['noise'], question: 'How much of the response is noise?', run: checkNoise },
  { finds: ['phase-jump'], question: 'Does the phase step where its neighbours in frequency do not?', run: checkPhaseJumps },
  { finds: ['outlier'], question: 'Does a cell stand off its neighbours in size?', run: checkOutliers },
];

/** Judges an edition by every check. Points in regions the laboratory excludes are counted and not judged. */
export function judgeEdition(edition: CellEdition): QualityReport {
  const subject = prepareSubject(edition);
  const findings = CELL_CHECKS.flatMap(({ run }) => run(subject));
  const family = findings.filter(({ cellId }) => cellId === undefined);
  const byCell = new Map<string, QualityFinding[]>(edition.cells.map(({ id }) => [id, []]));
  for (const finding of findings) if (finding.cellId !== undefined) byCell.get(finding.cellId)?.push(finding);
  const cells = edition.cells.map(({ id }): CellQuality => {
    const own = byCell.get(id) ?? [];
    return { cellId: id, verdict: worstVerdict(own), findings: own };
  });
  return { verdict: worstVerdict([...family, ...cells]), family, cells };
}

/** Fail before warn before pass; `not-evaluated` only when nothing was judged. */
export function worstVerdict(parts: readonly { readonly verdict: QualityVerdict }[]): QualityVerdict {
  const order: readonly QualityVerdict[] = ['fail', 'warn', 'pass'];
  return order.find((verdict) => parts.some((part) => part.verdict === verdict)) ?? 'not-evaluated';
}
