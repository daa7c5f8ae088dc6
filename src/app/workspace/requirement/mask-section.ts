import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { maskOfPanel } from '../../../../shared/antenna/masks/design-mask';
import { FORMULA_WORDS } from '../../../../shared/antenna/masks/mask-formula';
import { maskPoints } from '../../../../shared/antenna/masks/mask-envelope';
import { publishedMask } from '../../../../shared/antenna/masks/published-masks';
import type { Mask } from '../../../../shared/model/mask';
import { valueAt } from '../../../../shared/model/design-pointer';
import { editValue } from '../design-field-edit';
import { ChoiceRow } from '../fields/choice-row';
import { DesignChoice } from '../fields/design-choice';
import { DesignField } from '../fields/design-field';
import { DesignTable } from '../fields/design-table';
import type { DesignColumn } from '../fields/design-table';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { ViewTitle } from '../../ui/view-title';
import { WORKSPACE_STATE } from '../workspace-state';
import { FormulaField } from './formula-field';
import { firstMask, MASK_USES, PUBLISHED_CHOICES } from './mask-choices';
import type { MaskUse } from './mask-choices';
import { HowNote } from './how-note';
import { offAxisTraces } from './mask-drawing';
import { MaskFindingsTable } from './mask-findings-table';
import { MaskSketch } from './mask-sketch';

const FIRST_SPILLOVER_DEG = [60, 120];

/** A mask of the requirement: as points, as a formula or by the name of a published envelope, with what stands above it. */
@Component({
  selector: 'slant-mask-section',
  imports: [ChoiceRow, DesignChoice, DesignField, DesignTable, FormulaField, HowNote, MaskFindingsTable, MaskSketch, RemarkList, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './mask-section.html',
  styleUrls: ['../fields/sheet.scss', './mask-section.scss'],
})
export class MaskSection {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);

  protected readonly canEdit = this.state.canEdit;
  readonly use = input<MaskUse>('gain');
  protected readonly of = computed(() => MASK_USES[this.use()]);
  protected readonly pointer = computed(() => this.of().pointer);
  protected readonly publishedChoices = PUBLISHED_CHOICES;
  protected readonly columns = computed((): readonly DesignColumn[] => [
    { key: '0', label: 'Off axis', dimension: 'angle', unit: '°' },
    // The unit of a density is no unit of a level that a field could read.
    { key: '1', label: 'Level', dimension: this.use() === 'density' ? 'number' : 'level', unit: this.of().unit },
  ]);
  protected readonly formulaWords = FORMULA_WORDS.join(', ');
  protected readonly mask = computed(() => valueAt(this.state.design(), this.pointer()) as Mask | undefined);
  protected readonly kind = computed(() => this.mask()?.kind ?? 'none');
  protected readonly published = computed(() => {
    const mask = this.mask();
    return mask?.kind === 'published' ? (publishedMask(mask.id) ?? null) : null;
  });
  protected readonly facts = computed(() => {
    const known = this.published();
    if (!known) return [];
    return [
      { name: 'Edition', text: known.edition },
      { name: 'Undefined', text: known.undefinedWhere },
      { name: 'Rule', text: known.ruleText },
      { name: 'Written for', text: known.appliesTo },
      { name: 'Source', text: known.source },
      { name: 'Checked', text: known.status },
    ];
  });
  /** In dBi against degrees off the beam; empty where the envelope is not known yet. */
  protected readonly points = computed(() => {
    const design = this.state.design();
    const mask = this.mask();
    if (mask?.kind === 'custom') return mask.points;
    const gainDbi = this.state.prediction()?.head.figures.gainDbi ?? { kind: 'waiting', reason: 'no prediction yet' };
    const envelope = maskOfPanel(mask, design.panel, { frequencyGHz: design.requirement.designFrequencyGHz, gainDbi });
    return envelope ? maskPoints(envelope) : [];
  });
  protected readonly traces = computed(() => {
    const prediction = this.state.prediction();
    const shiftDb = prediction ? this.of().shiftDb(prediction.head.figures) : null;
    if (!prediction || shiftDb === null) return [];
    const traces = prediction.cuts.slice(0, 2).flatMap((cut, place) => offAxisTraces(cut, prediction.of.requirement.beams, place === 1));
    return shiftDb === 0 ? traces : traces.map((trace) => ({ ...trace, gainDbi: trace.gainDbi.map((level) => level + shiftDb) }));
  });
  protected readonly figures = computed(() => {
    const prediction = this.state.prediction();
    // Findings of another mask would say what is no longer asked.
    return prediction && valueAt(prediction.of, this.pointer()) === this.mask() ? prediction.head.figures : null;
  });
  protected readonly verdict = computed(() => {
    const figures = this.figures();
    return figures ? this.of().verdict(figures) : null;
  });
  protected readonly nextPoint = (rows: readonly (readonly number[])[]): readonly number[] => {
    const last = rows.at(-1) ?? [0, 20];
    return [Math.min(180, last[0] + 10), last[1] - 5];
  };

  protected chooseKind(kind: string): void {
    if (kind === this.kind()) return;
    this.pending.dropBelow(this.pointer());
    this.put(this.pointer(), firstMask(kind, this.use(), this.state.design().requirement), `${kind === 'none' ? 'Remove' : 'Set'} ${this.of().name}`);
  }

  protected addStretch(): void {
    const mask = this.mask();
    if (mask?.kind !== 'formula') return;
    const { toDeg } = mask.segments[mask.segments.length - 1];
    const fromDeg = toDeg < 180 ? toDeg : 179;
    const shortened = mask.segments.map((segment) => (segment.toDeg > fromDeg ? { ...segment, toDeg: fromDeg } : segment));
    this.put(`${this.pointer()}/segments`, [...shortened, { fromDeg, toDeg: 180, expression: '-10' }], `Add stretch of the ${this.of().name}`);
  }

  protected removeStretch(place: number): void {
    const mask = this.mask();
    if (mask?.kind !== 'formula') return;
    this.pending.dropBelow(`${this.pointer()}/segments`);
    this.put(`${this.pointer()}/segments`, mask.segments.filter((_, i) => i !== place), `Remove stretch ${place + 1} of the ${this.of().name}`);
  }

  protected toggleSpillover(): void {
    const mask = this.mask();
    if (mask?.kind !== 'published') return;
    this.pending.dropBelow(`${this.pointer()}/spilloverDeg`);
    const declared = mask.spilloverDeg !== undefined;
    this.put(`${this.pointer()}/spilloverDeg`, declared ? undefined : FIRST_SPILLOVER_DEG, declared ? 'Remove spillover region' : 'Declare spillover region');
  }

  protected choosePublished(id: string): void {
    // Another envelope may know no spillover region.
    this.pending.dropBelow(this.pointer());
    this.put(this.pointer(), { kind: 'published', id }, `Mask: ${publishedMask(id)?.title ?? id}`);
  }

  private put(pointer: string, value: unknown, name: string): void {
    const edit = editValue(this.state.design(), pointer, value);
    if (edit.kind === 'changed') this.state.change(name, () => edit.design);
  }
}
