import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router } from '@angular/router';
import { map } from 'rxjs';
import { derivedValues } from '../../../../shared/antenna/derived-values';
import { editValue } from '../design-field-edit';
import { DesignChoice } from '../fields/design-choice';
import { DesignField } from '../fields/design-field';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { SheetHeader } from '../sheet-header';
import { SheetNotes } from '../fields/sheet-notes';
import { figureText } from '../strip-figures';
import { ChoiceTabs } from '../../ui/choice-tabs';
import { ViewTitle } from '../../ui/view-title';
import { WORKSPACE_STATE } from '../workspace-state';
import { BeamsTable } from './beams-table';
import { ExposureSection } from './exposure-section';
import { MaskSection } from './mask-section';
import { requirementLines } from './requirement-lines';
import { SizingSection } from './sizing-section';
import { TransmissionSection } from './transmission-section';
import { VerdictTable } from './verdict-table';

const ANGLE_CHOICES = [
  { id: 'polar', label: 'θ and φ' },
  { id: 'az-el', label: 'Azimuth and elevation' },
] as const;
/** A band drawn for the first time: two per cent to each side. */
const FIRST_BAND_SHARE = 0.02;

/** What must be met: beams, band, limits and mask, each with the verdict of the prediction. */
@Component({
  selector: 'slant-requirement-sheet',
  imports: [BeamsTable, ChoiceTabs, DesignChoice, DesignField, ExposureSection, MaskSection, RemarkList, SheetNotes, SizingSection, TransmissionSection, VerdictTable, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './requirement-sheet.html',
  styleUrls: ['../fields/sheet.scss', './requirement-sheet.scss'],
})
export class RequirementSheet {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  protected readonly canEdit = this.state.canEdit;
  protected readonly design = this.state.design;
  protected readonly requirement = computed(() => this.design().requirement);
  protected readonly derived = computed(() => derivedValues(this.design()));
  protected readonly wavelength = computed(() => figureText(this.derived().wavelengthMm, 3));
  protected readonly angles = toSignal(this.route.queryParamMap.pipe(map((query) => (query.get('angles') === 'az-el' ? 'az-el' : 'polar') as 'polar' | 'az-el')), {
    initialValue: 'polar',
  });
  protected readonly lines = computed(() =>
    requirementLines(this.requirement(), { verdicts: this.state.prediction()?.head.verdicts ?? null, stale: this.state.failure() !== null }),
  );
  protected readonly angleChoices = ANGLE_CHOICES;

  constructor() {
    const header = inject(SheetHeader);
    effect(() => {
      const { beams, designFrequencyGHz } = this.requirement();
      const count = beams.length === 1 ? 'one beam' : `${beams.length} beams`;
      header.show({ number: 1, title: 'Requirement', subtitle: `${count} at ${designFrequencyGHz} GHz, ${this.limitText()}` });
    });
  }

  private limitText(): string {
    const count = this.lines().filter(({ word }) => word !== 'no-limit').length;
    return count === 0 ? 'no limit set' : count === 1 ? 'one limit' : `${count} limits`;
  }

  protected showAngles(angles: string): void {
    const queryParams = { angles: angles === 'polar' ? null : angles };
    void this.router.navigate([], { relativeTo: this.route, queryParams, queryParamsHandling: 'merge', replaceUrl: true });
  }

  protected setBand(): void {
    const { designFrequencyGHz } = this.requirement();
    const edge = (share: number): number => Number((designFrequencyGHz * (1 + share)).toPrecision(5));
    this.put('/requirement/bandGHz', [edge(-FIRST_BAND_SHARE), edge(FIRST_BAND_SHARE)], 'Set band');
  }

  protected removeBand(): void {
    this.pending.dropBelow('/requirement/bandGHz');
    this.put('/requirement/bandGHz', undefined, 'Remove band');
  }

  private put(pointer: string, value: unknown, name: string): void {
    const edit = editValue(this.design(), pointer, value);
    if (edit.kind === 'changed') this.state.change(name, () => edit.design);
  }
}
