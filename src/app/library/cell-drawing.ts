import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { CellEntry, FamilyDescription } from '../../../shared/model/cell-family';
import { cellOutlines } from './cell-outlines';

const SIDE = 180;

/** The copper of one cell within its period, to scale, with the period as dimension. */
@Component({
  selector: 'slant-cell-drawing',
  template: `
    <svg [attr.viewBox]="'-24 -24 ' + (side + 48) + ' ' + (side + 48)" [attr.width]="side + 48" [attr.height]="side + 48" role="img" [attr.aria-label]="label()">
      <rect x="0" y="0" [attr.width]="drawing().width" [attr.height]="drawing().height" fill="var(--substrate)" stroke="var(--rule-strong)" stroke-dasharray="6 2 1 2" />
      @for (shape of drawing().shapes; track $index) {
        <path [attr.d]="shape.path" [attr.fill]="shape.hole ? 'var(--substrate)' : 'var(--copper-metal)'" fill-rule="evenodd" />
      }
      <path [attr.d]="'M0 -8H' + drawing().width" stroke="var(--muted)" fill="none" />
      <path [attr.d]="'M-3 -5l6 -6M' + (drawing().width - 3) + ' -5l6 -6'" stroke="var(--ink)" fill="none" />
      <text [attr.x]="drawing().width / 2" y="-12" text-anchor="middle">{{ period() }}</text>
    </svg>
    <p class="label figure">{{ parameters() }}</p>
  `,
  styles: `
    svg {
      max-width: 100%;
      height: auto;
    }
    text {
      fill: var(--muted);
      font-family: var(--font-figure);
      font-size: 11px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CellDrawing {
  readonly description = input.required<FamilyDescription>();
  readonly cell = input.required<CellEntry>();
  protected readonly side = SIDE;
  protected readonly drawing = computed(() => cellOutlines(this.description(), this.cell(), SIDE));
  protected readonly period = computed(() => `${this.description().periodXMm} mm`);
  protected readonly parameters = computed(() =>
    this.description()
      .parameters.map(({ label, unit }, i) => `${label} ${this.cell().parametersMm[i]} ${unit}`)
      .join(', '),
  );
  protected readonly label = computed(() => `Cell ${this.cell().id}: ${this.parameters()}, period ${this.period()}`);
}
