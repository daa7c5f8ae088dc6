import { ChangeDetectionStrategy, Component, DestroyRef, computed, inject, signal } from '@angular/core';
import { ViewTitle } from '../../ui/view-title';
import { HowNote } from '../fields/how-note';
import { HOW_LAWS_COMPUTED } from '../how-laws-computed';
import { figureText } from '../strip-figures';
import { WORKSPACE_STATE } from '../workspace-state';

/** Orders offered to either side of the carrier. */
const OFFERED = 7;

/** Which harmonic of time-modulated cells the pattern and all figures are of, while this sheet is open. */
@Component({
  selector: 'slant-harmonic-chooser',
  imports: [HowNote, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-view-title text="Harmonic" />
    <label class="label" for="slant-harmonic">Figures and pattern are of</label>
    <select id="slant-harmonic" class="entry" (change)="choose($any($event.target).value)">
      @for (option of options(); track option.order) {
        <option [value]="option.order" [selected]="option.order === shown()">{{ option.label }}</option>
      }
    </select>
    @if (summary(); as said) {
      <p class="label">{{ said }}</p>
    }
    <slant-how-note [how]="how" />
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: var(--s2);
      min-width: 0;
    }
    select {
      font: inherit;
      color: inherit;
      background: var(--raised);
      border: 1px solid var(--rule);
      padding: var(--s1) 2px;
      width: 100%;
      min-width: 0;
      text-overflow: ellipsis;
    }
  `,
})
export class HarmonicChooser {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly chosen = signal<number | null>(null);
  protected readonly how = HOW_LAWS_COMPUTED.modulation;
  private readonly cells = computed(() => {
    const { cells } = this.state.design();
    return cells.kind === 'modulated' ? cells : null;
  });
  protected readonly shown = computed(() => this.chosen() ?? this.cells()?.harmonic ?? 1);
  private readonly modulation = computed(() => this.state.prediction()?.head.figures.modulation);
  protected readonly options = computed(() => {
    const steered = this.cells()?.harmonic ?? 1;
    const shares = new Map((this.modulation()?.harmonics ?? []).map(({ order, share }) => [order, share]));
    const orders = Array.from({ length: 2 * OFFERED + 1 }, (_, i) => i - OFFERED);
    return (orders.includes(steered) ? orders : [...orders, steered]).map((order) => {
      const share = shares.get(order);
      const level = share === undefined ? '' : share < 1e-12 ? ', none' : `, ${figureText(10 * Math.log10(share), 2)} dB`;
      return { order, label: `${order === 0 ? 'carrier' : figureText(order, 0)}${order === steered ? ' steered' : ''}${level}` };
    });
  });
  protected readonly summary = computed(() => {
    const modulation = this.modulation();
    if (!modulation) return null;
    return `${figureText(modulation.offsetMHz, 3)} MHz off the carrier, with ${figureText((modulation.shownShare / modulation.wholePower) * 100, 1)} % of what the cells re-radiate over all harmonics.`;
  });

  constructor() {
    inject(DestroyRef).onDestroy(() => this.state.requestHarmonic?.(null));
  }

  protected choose(value: string): void {
    this.chosen.set(Number(value));
    this.state.requestHarmonic?.(Number(value));
  }
}
