import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { radFromDeg } from '../../../../shared/units/angles';
import { wavenumberRadPerM } from '../../../../shared/waves/conventions';
import { CheckField } from '../../ui/check-field';
import { ChoiceTabs } from '../../ui/choice-tabs';
import { numberText } from '../../ui/plots/plot-text';
import { ViewTitle } from '../../ui/view-title';
import { DesignField } from '../fields/design-field';
import { WORKSPACE_STATE } from '../workspace-state';
import { AxesFigure } from './axes-figure';
import type { CutChoice } from './beam-cut';
import { HarmonicChooser } from './harmonic-chooser';
import { DEEPEST_DB, SHALLOWEST_DB } from './pattern-link';
import type { PatternLink, PatternShow } from './pattern-link';
import { ViewNumber } from './view-number';

const CUTS: readonly { readonly id: CutChoice; readonly label: string }[] = [
  { id: 'along', label: 'Along the beam' },
  { id: 'across', label: 'Across the beam' },
  { id: 'plane', label: 'Plane φ =' },
];

/** The narrow column beside the pattern: steering, which cut, which levels, what is shown, and the axes. */
@Component({
  selector: 'slant-pattern-controls',
  imports: [AxesFigure, CheckField, ChoiceTabs, DesignField, HarmonicChooser, ViewNumber, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './pattern-controls.html',
  styleUrl: './pattern-controls.scss',
})
export class PatternControls {
  private readonly state = inject(WORKSPACE_STATE);
  readonly link = input.required<PatternLink>();
  readonly changed = output<Partial<PatternLink>>();

  protected readonly cuts = CUTS;
  protected readonly deepest = DEEPEST_DB;
  protected readonly shallowest = SHALLOWEST_DB;
  protected readonly forms = [
    { id: 'absolute', label: 'Absolute' },
    { id: 'relative', label: 'Relative' },
  ];
  protected readonly fields = [
    { id: 'co', label: 'Co-polar' },
    { id: 'cross', label: 'Cross' },
  ];
  protected readonly beams = computed(() => this.state.design().requirement.beams);
  protected readonly beamTabs = computed(() => this.beams().map((_, i) => ({ id: String(i), label: String(i + 1) })));
  protected readonly beam = computed(() => Math.min(this.link().beam, this.beams().length - 1));
  protected readonly wanted = computed(() => this.beams()[this.beam()]);
  protected readonly field = computed(() => {
    const { polarisation } = this.state.design().illumination;
    return polarisation === 'x' || polarisation === 'y' ? polarisation : null;
  });
  protected readonly tangential = computed(() => {
    const k = wavenumberRadPerM(this.state.design().requirement.designFrequencyGHz * 1e9);
    return `${numberText(k * Math.sin(radFromDeg(this.wanted().thetaDeg)), 2)} rad/m`;
  });
  protected readonly parentNumber = computed(() => this.state.panel()?.latestRevision?.number ?? null);
  protected readonly isModulated = computed(() => this.state.design().cells.kind === 'modulated');
  protected readonly hasCross = computed(() => this.state.design().prediction.model === 'vector');
  protected readonly hasMask = computed(() => this.state.design().requirement.mask?.kind === 'custom');

  protected chooseCut(cut: CutChoice): void {
    this.changed.emit({ cut, window: null });
  }

  protected chooseForm(form: string): void {
    this.changed.emit({ form: form === 'relative' ? 'relative' : 'absolute', window: null });
  }

  protected chooseField(field: string): void {
    this.changed.emit({ field: field === 'cross' ? 'cross' : 'co' });
  }

  protected chooseBeam(id: string): void {
    // The cut across is that of the first beam.
    const beam = Number(id);
    this.changed.emit({ beam, ...(beam > 0 && this.link().cut === 'across' ? { cut: 'along' as const } : {}) });
  }

  protected toggle(part: keyof PatternShow): void {
    const { show } = this.link();
    this.changed.emit({ show: { ...show, [part]: !show[part] } });
  }

  protected setPlane(planePhiDeg: number): void {
    this.changed.emit({ planePhiDeg, cut: 'plane' });
  }

  protected setFloor(floorDb: number): void {
    this.changed.emit({ depthDb: -floorDb, window: null });
  }
}
