import type { PanelOverview } from '../../../shared/contracts/projects';
import type { Verdict } from '../../../shared/model/figures';
import type { MarkState } from '../ui/state-mark';

/** "cross-polar" as it is spoken. */
export const lineText = (line: Verdict['line']): string => line.replaceAll('-', ' ');

/** What the draft does to its requirement, as predicted. */
export function requirementMark({ summary, summaryPending }: PanelOverview): { readonly state: MarkState; readonly detail: string } {
  if (summary === null) return summaryPending ? { state: 'not-evaluated', detail: 'Being computed' } : { state: 'in-work', detail: 'Not predicted as it stands; the sheet says why' };
  const named = (word: Verdict['verdict']): string => summary.verdicts.filter(({ verdict }) => verdict === word).map(({ line }) => lineText(line)).join(', ');
  if (summary.verdicts.length === 0) return { state: 'in-work', detail: 'No limit set' };
  if (named('falls-short') !== '') return { state: 'falls-short', detail: `Falls short in ${named('falls-short')}` };
  if (named('not-evaluated') !== '') return { state: 'in-work', detail: `Not evaluated: ${named('not-evaluated')}` };
  return { state: 'meets', detail: 'Every line is met, as predicted' };
}
