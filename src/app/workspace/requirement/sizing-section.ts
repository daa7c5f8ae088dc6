import { ChangeDetectionStrategy, Component, computed, inject, linkedSignal, signal } from '@angular/core';
import { sizedDesign, sizingAdvice } from '../../../../shared/antenna/sizing/sized-design';
import { PendingEntries } from '../fields/pending-entries';
import { ViewNumber } from '../pattern/view-number';
import { ViewTitle } from '../../ui/view-title';
import { WORKSPACE_STATE } from '../workspace-state';
import { HowNote } from './how-note';
import { proposalObstacle, sizingRows } from './sizing-rows';

/** The optimum of a flat panel lies between -11.5 and -11.0 dB for usual focal ratios. */
const FIRST_TAPER_DB = -11;
const FIRST_FOCAL_RATIO = 0.8;
/** One decibel for the losses, rounding and tolerances of printed cells. */
const FIRST_ALLOWANCE_DB = 1;
const FALLEN_BACK_GAIN_DBI = 30;

/** Proposes aperture, horn and period for the requirement; "use these" puts them into the design in one step. */
@Component({
  selector: 'slant-sizing-section',
  imports: [HowNote, ViewNumber, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <section>
      <slant-view-title text="Sizing advice" unit="a proposal, from the requirement" />
      <div class="fields">
        <slant-view-number label="Gain wanted" dimension="level" unit="dBi" [value]="gainDbi()" [least]="5" [most]="70" (changed)="gainDbi.set($event)" />
        <slant-view-number label="Allowance" dimension="level" unit="dB" [value]="allowanceDb()" [least]="0" [most]="15" (changed)="allowanceDb.set($event)" />
        <slant-view-number label="Edge taper" dimension="level" unit="dB" [value]="edgeTaperDb()" [least]="-30" [most]="-3" (changed)="edgeTaperDb.set($event)" />
        <slant-view-number label="f/D" dimension="number" [value]="focalRatio()" [least]="0.3" [most]="3" (changed)="focalRatio.set($event)" />
      </div>
      <dl>
        @for (fact of facts(); track fact.name) {
          <dt>{{ fact.name }}</dt>
          <dd>{{ fact.value }}</dd>
        }
      </dl>
      <p class="hint">The allowance is for losses, rounding and tolerances of the cells. What the panel then does is for the prediction to say.</p>
      <slant-how-note figure="sizing" />
      @if (canEdit()) {
        @if (obstacle(); as reason) {
          <p class="hint" role="status">Cannot be used: {{ reason }}.</p>
        }
        <div class="actions"><button type="button" class="button" [disabled]="obstacle() !== null" (click)="use()">Use these</button></div>
      }
    </section>
  `,
  styleUrl: '../fields/sheet.scss',
})
export class SizingSection {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);

  protected readonly canEdit = this.state.canEdit;
  protected readonly gainDbi = linkedSignal(() => this.state.design().requirement.minGainDbi ?? FALLEN_BACK_GAIN_DBI);
  protected readonly allowanceDb = signal(FIRST_ALLOWANCE_DB);
  protected readonly edgeTaperDb = signal(FIRST_TAPER_DB);
  protected readonly focalRatio = signal(FIRST_FOCAL_RATIO);
  private readonly advice = computed(() =>
    sizingAdvice(this.state.design(), { gainDbi: this.gainDbi(), allowanceDb: this.allowanceDb(), edgeTaperDb: this.edgeTaperDb(), focalRatio: this.focalRatio() }),
  );
  protected readonly facts = computed(() => sizingRows(this.advice(), this.state.design()));

  private readonly proposal = computed(() => sizedDesign(this.state.design(), this.advice()));
  /** Why the proposal would be no design: too many cells, too large a panel, cells that another illumination needs. */
  protected readonly obstacle = computed(() => proposalObstacle(this.proposal()));

  protected use(): void {
    const proposal = this.proposal();
    this.pending.dropBelow('/panel');
    this.pending.dropBelow('/illumination');
    this.state.change('Use sizing advice', () => proposal);
  }
}
