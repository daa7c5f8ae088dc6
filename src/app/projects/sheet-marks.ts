import type { PanelOverview } from '../../../shared/contracts/projects';
import type { MarkState } from '../ui/state-mark';
import { requirementMark } from './requirement-mark';

/** The state of one sheet of a panel, as far as the overview knows it. */
export interface SheetMark {
  /** Last part of the address of the sheet. */
  readonly id: string;
  readonly title: string;
  readonly state: MarkState;
  /** Why. */
  readonly detail: string;
}

type Summary = NonNullable<PanelOverview['summary']>;
type Judgement = Pick<SheetMark, 'state' | 'detail'>;

/** Sheets that fields belong to, and the parts of the design whose remarks count there. */
const FIELD_SHEETS = [
  { id: 'panel', title: 'Panel', roots: ['/panel'] },
  { id: 'illumination', title: 'Illumination', roots: ['/illumination', '/prediction'] },
  { id: 'cells', title: 'Cells', roots: ['/cells', '/referencePhaseDeg'] },
  { id: 'phase', title: 'Phase', roots: ['/synthesis', '/requirement/beams'] },
] as const;

const NOT_ETCHED: Readonly<Partial<Record<PanelOverview['design']['cells']['kind'], string>>> = {
  ideal: 'Ideal cells cannot be etched',
  resonant: 'Resonant cells are a model, nothing to etch',
  inline: 'A what-if table cannot be etched',
};

/** The sheets in the order of the work. Each word is as strict as the one in the rail of the workspace. */
export function sheetMarks(panel: PanelOverview): readonly SheetMark[] {
  const requirement = requirementMark(panel);
  return [
    { id: 'requirement', title: 'Requirement', ...requirement },
    ...FIELD_SHEETS.map(({ id, title, roots }) => ({ id, title, ...fieldJudgement(panel, id, roots) })),
    { id: 'pattern', title: 'Pattern', ...requirement },
    { id: 'revisions', title: 'Revisions', ...revisionJudgement(panel) },
  ];
}

function fieldJudgement(panel: PanelOverview, id: string, roots: readonly string[]): Judgement {
  const { summary, design } = panel;
  if (summary === null) return requirementMark(panel);
  const remark = worstRemark(summary, roots);
  if (remark !== null) return remark;
  const hindrance = id === 'cells' ? NOT_ETCHED[design.cells.kind] : undefined;
  return hindrance === undefined ? { state: 'meets', detail: 'No objection' } : { state: 'in-work', detail: hindrance };
}

function worstRemark({ remarks = [] }: Summary, roots: readonly string[]): Judgement | null {
  const own = remarks.filter(({ pointer }) => roots.some((root) => isUnder(pointer.replace(/^#/, ''), root)));
  const [worst] = [...own.filter(({ severity }) => severity === 'serious'), ...own];
  return worst === undefined ? null : { state: worst.severity === 'serious' ? 'objection' : 'in-work', detail: worst.message };
}

const isUnder = (pointer: string, root: string): boolean => pointer === root || pointer.startsWith(`${root}/`);

function revisionJudgement({ latestRevision, draftIsRevision }: PanelOverview): Judgement {
  if (latestRevision === null) return { state: 'empty', detail: 'No revision frozen yet' };
  if (draftIsRevision) return { state: 'meets', detail: `The draft equals revision ${latestRevision.number}` };
  return { state: 'in-work', detail: `The draft has changed since revision ${latestRevision.number}` };
}
