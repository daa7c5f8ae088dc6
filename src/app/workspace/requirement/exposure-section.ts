import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { ViewTitle } from '../../ui/view-title';
import { WORKSPACE_STATE } from '../workspace-state';
import { HowNote } from './how-note';
import { limitRows, zoneRows } from './transmission-rows';

/** Power densities in front of the transmitting panel and the distances to published limits, with the cautions. */
@Component({
  selector: 'slant-exposure-section',
  imports: [HowNote, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './exposure-section.html',
  styleUrls: ['../fields/sheet.scss', './transmission-section.scss'],
})
export class ExposureSection {
  private readonly state = inject(WORKSPACE_STATE);
  protected readonly stale = this.state.stale;
  protected readonly exposure = computed(() => {
    const exposure = this.state.prediction()?.head.figures.exposure;
    // What was estimated for a transmitter that is gone says nothing.
    if (exposure === undefined || this.state.design().requirement.transmitter === undefined) return null;
    if ('reason' in exposure) return { limits: [], zones: [], reason: String(exposure.reason) };
    return { limits: limitRows(exposure), zones: zoneRows(exposure), reason: null };
  });
}
