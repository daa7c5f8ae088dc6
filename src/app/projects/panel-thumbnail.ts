import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, afterRenderEffect, input, viewChild } from '@angular/core';
import { panelTargetPhase } from '../../../shared/antenna/panel-target-phase';
import { InvalidDesign } from '../../../shared/antenna/invalid-design';
import type { DesignDocument } from '../../../shared/model/design-document';
import { paintPhaseThumbnail } from '../ui/plots/phase-thumbnail';

const SIDE = 76;

/** The target phase of a panel, computed here from its design. A design that cannot be laid out stays an empty square. */
@Component({
  selector: 'slant-panel-thumbnail',
  template: '<canvas #drawing aria-hidden="true" [style.width.px]="side" [style.height.px]="side"></canvas>',
  styles: `
    canvas {
      display: block;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelThumbnail {
  readonly design = input.required<DesignDocument>();
  private readonly drawing = viewChild.required<ElementRef<HTMLCanvasElement>>('drawing');
  protected readonly side = SIDE;

  constructor() {
    afterRenderEffect(() => this.paint(this.design()));
  }

  private paint(design: DesignDocument): void {
    try {
      const { lattice, targetPhaseDeg } = panelTargetPhase(design);
      const { stepXM, stepYM } = lattice.grid;
      paintPhaseThumbnail(this.drawing().nativeElement, { xM: lattice.xM, yM: lattice.yM, phaseDeg: targetPhaseDeg, stepXM, stepYM }, SIDE);
    } catch (error) {
      if (!(error instanceof InvalidDesign)) throw error;
    }
  }
}
