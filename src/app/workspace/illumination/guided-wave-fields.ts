import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import type { Illumination } from '../../../../shared/model/design-document';
import { editValue } from '../design-field-edit';
import { ChoiceRow } from '../fields/choice-row';
import { DesignField } from '../fields/design-field';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { WORKSPACE_STATE } from '../workspace-state';
import { launchOfKind } from './illumination-choices';

const LAUNCH_OPTIONS = [
  { value: 'plane', label: 'Plane, from an edge' },
  { value: 'radial', label: 'Radial, from a point' },
] as const;

/** The fields of a wave that runs under the panel. */
@Component({
  selector: 'slant-guided-wave-fields',
  imports: [ChoiceRow, DesignField, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-choice-row label="Launch" [options]="options" [chosen]="launch()?.kind ?? null" [locked]="!canEdit()" (picked)="choose($event)" />
    <div class="triple">
      @if (launch()?.kind === 'plane') {
        <slant-design-field pointer="/illumination/launch/directionDeg" label="Runs towards φ" dimension="angle" unit="°" />
      } @else {
        <slant-design-field pointer="/illumination/launch/centreMm/0" label="Launch x" dimension="length" unit="mm" />
        <slant-design-field pointer="/illumination/launch/centreMm/1" label="Launch y" dimension="length" unit="mm" />
        <slant-design-field pointer="/illumination/launch/radiusMm" label="Launch radius" dimension="length" unit="mm" />
      }
    </div>
    <div class="triple">
      <slant-design-field pointer="/illumination/effectiveIndex" label="Effective index n" dimension="number" />
      <slant-design-field pointer="/illumination/leakageNpPerM" label="Leakage α, 1/m" dimension="number" />
    </div>
    <slant-remark-list [pointers]="['/illumination/launch', '/illumination/launch/centreMm']" />
    <p class="hint">
      Field exp(−(α + jkn)s) along its way, from a point also over √ρ. The index is the same at every frequency. The leaked share 1 − exp(−2αL) counts in the gain as the spillover of a horn does; there is no angle of incidence.
    </p>
  `,
  styleUrls: ['../fields/sheet.scss', '../fields/field-rows.scss', './illumination-sheet.scss'],
})
export class GuidedWaveFields {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  /** What each launch held when it was left, so that a look at the other loses nothing. */
  private readonly left = new Map<string, Extract<Illumination, { kind: 'guided-wave' }>['launch']>();
  protected readonly options = LAUNCH_OPTIONS;
  protected readonly canEdit = this.state.canEdit;
  protected readonly launch = computed(() => {
    const { illumination } = this.state.design();
    return illumination.kind === 'guided-wave' ? illumination.launch : null;
  });

  protected choose(kind: string): void {
    const launch = this.launch();
    if (!launch || launch.kind === kind || (kind !== 'plane' && kind !== 'radial')) return;
    this.left.set(launch.kind, launch);
    const edit = editValue(this.state.design(), '/illumination/launch', this.left.get(kind) ?? launchOfKind(kind));
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow('/illumination/launch');
    this.state.change(kind === 'plane' ? 'Launch: plane' : 'Launch: radial', () => edit.design);
  }
}
