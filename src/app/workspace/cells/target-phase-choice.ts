import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import type { DesignDocument, Synthesis } from '../../../../shared/model/design-document';
import { ViewTitle } from '../../ui/view-title';
import { ChoiceRow } from '../fields/choice-row';
import { DesignField } from '../fields/design-field';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { WORKSPACE_STATE } from '../workspace-state';

const OPTIONS = [
  { value: 'direct', label: 'Far beams' },
  { value: 'focus', label: 'Near-field focus' },
] as const;
const MM_PER_WAVELENGTH_GHZ = 299.792458;

/** What the phase of the cells is for: the wanted beams in the far field, or a focus in front of the panel. */
@Component({
  selector: 'slant-target-phase-choice',
  imports: [ChoiceRow, DesignField, RemarkList, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './target-phase-choice.html',
  styleUrl: '../fields/sheet.scss',
})
export class TargetPhaseChoice {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  /** The focus that stood before, so that a look at the far field loses nothing. */
  private left: Synthesis | null = null;
  protected readonly options = OPTIONS;
  protected readonly axes = ['x', 'y', 'z'] as const;
  protected readonly synthesis = computed(() => this.state.design().synthesis);
  protected readonly canEdit = this.state.canEdit;

  protected choose(kind: string): void {
    const design = this.state.design();
    if (kind === design.synthesis.kind) return;
    if (design.synthesis.kind === 'focus') this.left = design.synthesis;
    const next: Synthesis = kind === 'focus' ? (this.left ?? firstFocus(design)) : { kind: 'direct' };
    this.pending.dropBelow('/synthesis');
    this.state.change(kind === 'focus' ? 'Focus in the near field' : 'Steer far beams', (now) => ({ ...now, synthesis: next }));
  }
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
