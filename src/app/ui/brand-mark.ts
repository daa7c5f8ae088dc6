import { ChangeDetectionStrategy, Component, input } from '@angular/core';

interface MarkCell {
  readonly at: string;
  readonly left: number;
  readonly top: number;
  readonly side: number;
}

const SIDE = 4;
const PITCH = 24 / SIDE;

/** Cells whose copper grows along one diagonal, so that the eye sees a slanted wavefront. */
const CELLS: readonly MarkCell[] = Array.from({ length: SIDE * SIDE }, (_, n) => {
  const [column, row] = [n % SIDE, Math.floor(n / SIDE)];
  const step = (column + (SIDE - 1 - row)) / (2 * (SIDE - 1));
  const side = PITCH * (0.16 + 0.76 * step);
  return { at: `${column},${row}`, left: column * PITCH + (PITCH - side) / 2, top: row * PITCH + (PITCH - side) / 2, side };
});

@Component({
  selector: 'slant-brand-mark',
  template: `
    <svg [attr.width]="size()" [attr.height]="size()" viewBox="0 0 24 24" aria-hidden="true">
      @for (cell of cells; track cell.at) {
        <rect [attr.x]="cell.left" [attr.y]="cell.top" [attr.width]="cell.side" [attr.height]="cell.side" fill="var(--copper)" />
      }
    </svg>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BrandMark {
  readonly size = input(22);
  protected readonly cells = CELLS;
}
