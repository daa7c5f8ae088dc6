import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import type { Link } from '../../../../shared/model/transmission';
import { ChoiceRow } from '../fields/choice-row';
import { DesignField } from '../fields/design-field';
import { RemarkList } from '../fields/remark-list';
import { ViewTitle } from '../../ui/view-title';
import { WORKSPACE_STATE } from '../workspace-state';
import { HowNote } from './how-note';
import { MaskSection } from './mask-section';
import { RequirementParts } from './requirement-part';
import { linkRows, receiverRows, transmitterRows } from './transmission-rows';

const LINK_KINDS = [
  { value: 'none', label: 'No link' },
  { value: 'hop', label: 'From the panel' },
  { value: 'relay', label: 'Over the panel' },
] as const;

/** Transmitter, link and receiver around the panel, with EIRP, received power and G/T. */
@Component({
  selector: 'slant-transmission-section',
  imports: [ChoiceRow, DesignField, HowNote, MaskSection, RemarkList, ViewTitle],
  providers: [RequirementParts],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './transmission-section.html',
  styleUrls: ['../fields/sheet.scss', './transmission-section.scss'],
})
export class TransmissionSection {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly parts = inject(RequirementParts);

  protected readonly canEdit = this.state.canEdit;
  protected readonly linkKinds = LINK_KINDS;
  protected readonly requirement = computed(() => this.state.design().requirement);
  protected readonly linkKind = computed(() => this.requirement().link?.kind ?? 'none');
  protected readonly stale = this.state.stale;
  private readonly figures = computed(() => this.state.prediction()?.head.figures ?? null);
  protected readonly transmitterFacts = computed(() => {
    const figures = this.figures();
    return figures && figures.eirpDbw !== undefined ? transmitterRows(figures) : [];
  });
  protected readonly linkFacts = computed(() => {
    const figures = this.figures();
    return figures ? linkRows(figures) : [];
  });
  protected readonly receiverFacts = computed(() => {
    const figures = this.figures();
    return figures && figures.systemTemperatureK !== undefined ? receiverRows(figures) : [];
  });
  protected setTransmitter(): void {
    this.parts.put('transmitter', { powerW: 1, lossDb: 0, dutyPercent: 100 }, 'Set transmitter');
  }

  protected removeTransmitter(): void {
    this.parts.put('transmitter', undefined, 'Remove transmitter');
  }

  protected chooseLink(kind: string): void {
    if (kind === this.linkKind()) return;
    const first: Readonly<Record<string, Link>> = {
      hop: { kind: 'hop', distanceM: 1000, farGainDbi: 30, excessLossDb: 0 },
      relay: { kind: 'relay', incomingDistanceM: 200, outgoingDistanceM: 100, sourceGainDbi: 30, farGainDbi: 30, excessLossDb: 0 },
    };
    this.parts.put('link', first[kind], kind === 'none' ? 'Remove link' : `Set link: ${LINK_KINDS.find(({ value }) => value === kind)?.label ?? kind}`);
  }

  protected setReceiver(): void {
    this.parts.put('receiver', { antennaTemperatureK: 150, lineLossDb: 0.5, noiseFigureDb: 2 }, 'Set receiver');
  }

  protected removeReceiver(): void {
    this.parts.put('receiver', undefined, 'Remove receiver');
  }
}
