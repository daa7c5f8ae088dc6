import type { Problem } from '../../../shared/contracts/common';
import type { DesignDocument } from '../../../shared/model/design-document';
import type { Figures, Verdict, Warning } from '../../../shared/model/figures';
import { SHEETS } from './sheets';
import type { SheetId } from './sheets';

export type SheetStateWord = 'empty' | 'in-work' | 'meets' | 'falls-short' | 'objection' | 'stale';

export interface SheetState {
  readonly id: SheetId;
  readonly word: SheetStateWord;
  /** Why, for the tooltip of the mark. */
  readonly reason: string;
}

export interface PanelFacts {
  readonly design: DesignDocument;
  /** Of the last good prediction; null before the first one. */
  readonly predicted: { readonly figures: Figures; readonly verdicts: readonly Verdict[]; readonly warnings: readonly Warning[] } | null;
  /** Why the design as it stands has no prediction. */
  readonly failure: Problem | null;
  readonly revisionCount: number;
  readonly draftIsRevision: boolean;
}

type Judgement = Omit<SheetState, 'id'>;

/** The mark of each sheet in the rail. */
export function sheetStates(facts: PanelFacts): readonly SheetState[] {
  return SHEETS.map(({ id }) => ({ id, ...judges[id](facts) }));
}

const judges: Readonly<Record<SheetId, (facts: PanelFacts) => Judgement>> = {
  requirement: (facts) => faultOf(facts, ['/requirement']) ?? requirementJudgement(facts),
  panel: (facts) => faultOf(facts, ['/panel']) ?? remarkOf(facts, ['/panel']),
  illumination: (facts) => faultOf(facts, ['/illumination', '/prediction']) ?? remarkOf(facts, ['/illumination', '/prediction']),
  cells: (facts) => faultOf(facts, ['/cells', '/referencePhaseDeg']) ?? cellsJudgement(facts),
  phase: (facts) => faultOf(facts, ['/synthesis']) ?? phaseJudgement(facts),
  pattern: (facts) => staleOf(facts) ?? patternJudgement(facts),
  band: bandJudgement,
  tolerance: toleranceJudgement,
  revisions: revisionsJudgement,
};

/** Pointers come with and without the leading number sign. */
export function pointerIsUnder(pointer: string, root: string): boolean {
  const path = pointer.replace(/^#/, '');
  return path === root || path.startsWith(`${root}/`);
}

function faultOf({ failure }: PanelFacts, roots: readonly string[]): Judgement | null {
  const fault = failure?.errors?.find((error) => roots.some((root) => pointerIsUnder(error.pointer.replace(/^#?\/design/, ''), root)));
  return fault ? { word: 'falls-short', reason: fault.detail } : null;
}

function staleOf({ failure, predicted }: PanelFacts): Judgement | null {
  return failure && predicted ? { word: 'stale', reason: `Of an earlier state: ${failure.detail}` } : null;
}

function waiting(facts: PanelFacts): Judgement {
  return facts.failure ? { word: 'falls-short', reason: facts.failure.detail } : { word: 'empty', reason: 'No prediction yet' };
}

function requirementJudgement(facts: PanelFacts): Judgement {
  const stale = staleOf(facts);
  if (stale) return stale;
  if (!facts.predicted) return waiting(facts);
  const { verdicts } = facts.predicted;
  if (verdicts.length === 0) return { word: 'in-work', reason: 'No limit set' };
  const short = verdicts.filter((line) => line.verdict === 'falls-short');
  if (short.length > 0) return { word: 'falls-short', reason: `Falls short in ${lineNames(short)}` };
  const open = verdicts.filter((line) => line.verdict === 'not-evaluated');
  if (open.length > 0) return { word: 'in-work', reason: `Not evaluated: ${lineNames(open)}` };
  return { word: 'meets', reason: 'Every line is met, as predicted' };
}

const LINE_NAMES: Readonly<Record<Verdict['line'], string>> = {
  gain: 'gain',
  sidelobe: 'sidelobe level',
  pointing: 'pointing',
  mask: 'mask',
  'cross-polar': 'cross-polar discrimination',
  'cross-polar-mask': 'cross-polar mask',
  'received-power': 'received power',
  'gain-over-temperature': 'gain over temperature',
  'eirp-density': 'EIRP density',
};

/** A line of the requirement in running text. */
export const lineName = (line: Verdict['line']): string => LINE_NAMES[line];

function lineNames(verdicts: readonly Verdict[]): string {
  return verdicts.map((verdict) => LINE_NAMES[verdict.line]).join(', ');
}

function remarkOf(facts: PanelFacts, roots: readonly string[]): Judgement {
  if (!facts.predicted) return waiting(facts);
  const remarks = facts.predicted.warnings.filter((warning) => roots.some((root) => pointerIsUnder(warning.pointer, root)));
  const serious = remarks.find((warning) => warning.severity === 'serious');
  // Not a verdict: no line of the requirement is measured by it.
  if (serious) return { word: 'objection', reason: serious.message };
  const mild = remarks.find((warning) => warning.severity === 'warn');
  if (mild) return { word: 'in-work', reason: mild.message };
  return { word: 'meets', reason: 'No objection' };
}

function cellsJudgement(facts: PanelFacts): Judgement {
  const remark = remarkOf(facts, ['/cells', '/referencePhaseDeg']);
  if (remark.word !== 'meets') return remark;
  if (facts.design.cells.kind === 'ideal') return { word: 'in-work', reason: 'Ideal cells cannot be etched: choose an edition of the library' };
  if (facts.design.cells.kind === 'modulated') return { word: 'in-work', reason: 'A switching sequence is a model: nothing can be etched from it yet' };
  if (facts.design.cells.kind === 'resonant') return { word: 'in-work', reason: 'Resonant cells are a model of a tuning: nothing can be etched from them yet' };
  if (facts.design.cells.kind === 'inline') return { word: 'in-work', reason: 'A what-if table cannot be etched: choose an edition of the library' };
  return remark;
}

function phaseJudgement(facts: PanelFacts): Judgement {
  const stale = staleOf(facts);
  if (stale) return stale;
  if (!facts.predicted) return waiting(facts);
  const { evanescentCells, cellCount } = facts.predicted.figures;
  if (evanescentCells > 0) return { word: 'objection', reason: `${evanescentCells} of ${cellCount} cells ask for a wave that does not travel` };
  return remarkOf(facts, ['/synthesis', '/requirement/beams']);
}

function patternJudgement(facts: PanelFacts): Judgement {
  const requirement = requirementJudgement(facts);
  if (requirement.word !== 'meets') return requirement;
  const lobe = facts.predicted?.warnings.find(({ code, severity }) => (code === 'grating-lobe' || code === 'image-lobe') && severity !== 'note');
  return lobe ? { word: 'in-work', reason: lobe.message } : requirement;
}

/** Runs are not part of the prediction, so the mark says only whether there is a band to compute. */
function bandJudgement({ design }: PanelFacts): Judgement {
  return design.requirement.bandGHz ? { word: 'in-work', reason: 'Judged by a run over the band' } : { word: 'empty', reason: 'The requirement names no band' };
}

/** Runs are not part of the prediction, so the mark says only whether there is something that a run could judge. */
function toleranceJudgement(facts: PanelFacts): Judgement {
  if (!facts.predicted) return waiting(facts);
  const judged = facts.predicted.verdicts.length > 0;
  return judged ? { word: 'in-work', reason: 'Judged by a run of panels made by chance' } : { word: 'empty', reason: 'No limit set that panels could miss' };
}

function revisionsJudgement({ revisionCount, draftIsRevision }: PanelFacts): Judgement {
  if (revisionCount === 0) return { word: 'empty', reason: 'No revision frozen yet' };
  if (draftIsRevision) return { word: 'meets', reason: 'The draft equals its latest revision' };
  return { word: 'in-work', reason: 'The draft has changed since its latest revision' };
}
