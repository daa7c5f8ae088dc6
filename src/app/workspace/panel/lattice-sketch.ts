import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Lattice } from '../../../../shared/model/design-document';
import { latticeDetail } from './lattice-detail';

/** A few cells of the lattice, enlarged, with the lengths that repeat. */
@Component({
  selector: 'slant-lattice-sketch',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let drawn = detail();
    <svg [attr.width]="drawn.width" [attr.height]="drawn.height" [attr.viewBox]="'0 0 ' + drawn.width + ' ' + drawn.height" role="img" [attr.aria-label]="label()">
      <path class="cell" [attr.d]="drawn.cells" />
      @for (dimension of drawn.dimensions; track $index) {
        <path class="extension" [attr.d]="dimension.extensions" />
        <path class="dimension" [attr.d]="dimension.line + dimension.ticks" />
        <text
          class="dimension-text"
          [attr.transform]="'translate(' + dimension.textAt.x + ' ' + dimension.textAt.y + ') rotate(' + dimension.textTurnDeg + ')'"
          >{{ dimension.text }}</text
        >
      }
    </svg>
  `,
  styleUrl: '../drawing/drawing.scss',
})
export class LatticeSketch {
  readonly lattice = input.required<Lattice>();
  protected readonly detail = computed(() => latticeDetail(this.lattice(), 176));
  protected readonly label = computed(() => {
    const lattice = this.lattice();
    return lattice.kind === 'rectangular'
      ? `Rectangular lattice, ${lattice.periodXMm} by ${lattice.periodYMm} mm`
      : `Triangular lattice, ${lattice.periodXMm} mm along the row, rows ${lattice.rowSpacingMm} mm apart`;
  });
}
