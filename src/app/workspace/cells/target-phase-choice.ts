import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { latticeGrid } from '../../../../shared/antenna/panel-lattice';
import { siPanel } from '../../../../shared/antenna/si-design';
import type { DesignDocument, Synthesis } from '../../../../shared/model/design-document';
import { ViewTitle } from '../../ui/view-title';
import { ChoiceRow } from '../fields/choice-row';
import { DesignField } from '../fields/design-field';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { LawOutcome } from '../laws/law-outcome';
import { WORKSPACE_STATE } from '../workspace-state';
import { ProjectionsFields, firstGoal } from './projections-fields';

const OPTIONS = [
  { value: 'direct', label: 'Far beams' },
  { value: 'focus', label: 'Near-field focus' },
  { value: 'vortex', label: 'Vortex beams' },
  { value: 'projections', label: 'Shaped pattern' },
  { value: 'diffuse', label: 'Diffuse scattering' },
] as const;
const STEP_NAMES: Readonly<Record<Synthesis['kind'], string>> = {
  direct: 'Steer far beams',
  focus: 'Focus in the near field',
  vortex: 'Make vortex beams',
  projections: 'Shape the pattern',
  diffuse: 'Scatter diffusely',
};
const MM_PER_WAVELENGTH_GHZ = 299.792458;

/** What the phase of the cells is for: the wanted beams in the far field, or a focus in front of the panel. */
@Component({
  selector: 'slant-target-phase-choice',
  imports: [ChoiceRow, DesignField, LawOutcome, ProjectionsFields, RemarkList, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './target-phase-choice.html',
  styleUrl: '../fields/sheet.scss',
})
export class TargetPhaseChoice {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  /** What each kind held when it was left, so that a look at another loses nothing. */
  private readonly left = new Map<Synthesis['kind'], Synthesis>();
  protected readonly options = OPTIONS;
  protected readonly axes = ['x', 'y', 'z'] as const;
  protected readonly synthesis = computed(() => this.state.design().synthesis);
  protected readonly canEdit = this.state.canEdit;

  protected choose(picked: string): void {
    const design = this.state.design();
    const kind = OPTIONS.find(({ value }) => value === picked)?.value;
    if (kind === undefined || kind === design.synthesis.kind) return;
    this.left.set(design.synthesis.kind, design.synthesis);
    const next = this.left.get(kind) ?? firstSynthesis(design, kind);
    this.pending.dropBelow('/synthesis');
    this.state.change(STEP_NAMES[kind], (now) => ({ ...now, synthesis: next }));
  }
}

/** What a kind starts from. */
export function firstSynthesis(design: DesignDocument, kind: Synthesis['kind']): Synthesis {
  switch (kind) {
    case 'direct':
      return { kind };
    case 'focus':
      return firstFocus(design);
    case 'vortex':
      return { kind, order: 1 };
    case 'projections':
      return { kind, goal: firstGoal('sectors'), iterations: 200 };
    case 'diffuse':
      return { kind, ...firstBlocks(design), states: 2, seed: 1 };
  }
}

/** Blocks so large that there are at most 8 along a side: a board that is searched at once. */
function firstBlocks({ panel }: DesignDocument): { blockColumns: number; blockRows: number } {
  const { columnCount, rowCount } = latticeGrid(siPanel(panel));
  return { blockColumns: Math.max(1, Math.ceil(columnCount / 8)), blockRows: Math.max(1, Math.ceil(rowCount / 8)) };
}

/** On the first wanted beam, at about a third of the far-field distance: near enough to be a focus worth the name. */
export function firstFocus({ requirement, panel }: DesignDocument): Synthesis {
  const [beam] = requirement.beams;
  const { outline } = panel;
  const sides = outline.kind === 'polygon' ? spanOf(outline.pointsMm) : [outline.widthMm, outline.heightMm];
  const distanceMm = (2 * Math.hypot(...sides) ** 2 * requirement.designFrequencyGHz) / MM_PER_WAVELENGTH_GHZ / 3;
  const [theta, phi] = [(beam.thetaDeg * Math.PI) / 180, (beam.phiDeg * Math.PI) / 180];
  const at = (share: number): number => Math.round(distanceMm * share * 10) / 10 + 0;
  return { kind: 'focus', pointMm: [at(Math.sin(theta) * Math.cos(phi)), at(Math.sin(theta) * Math.sin(phi)), at(Math.cos(theta))] };
}

function spanOf(points: readonly (readonly [number, number])[]): [number, number] {
  const span = (axis: 0 | 1): number => Math.max(...points.map((point) => point[axis])) - Math.min(...points.map((point) => point[axis]));
  return [span(0), span(1)];
}
