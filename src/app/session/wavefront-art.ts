import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, afterNextRender, viewChild } from '@angular/core';
import { panelTargetPhase } from '../../../shared/antenna/panel-target-phase';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { paintPhaseThumbnail } from '../ui/plots/phase-thumbnail';

const SIDE = 320;

/** The target phase of the starting design, drawn for real: the first picture anyone sees of what the product does. */
@Component({
  selector: 'slant-wavefront-art',
  template: '<canvas #drawing role="img" aria-label="Target phase of a panel of 40 by 40 cells: rings about the horn\'s foot, shifted towards the beam"></canvas>',
  styles: `
    canvas {
      display: block;
      width: min(100%, 320px);
      aspect-ratio: 1;
      border: 1px solid var(--ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WavefrontArt {
  private readonly drawing = viewChild.required<ElementRef<HTMLCanvasElement>>('drawing');

  constructor() {
    afterNextRender(() => this.paint());
  }

  private paint(): void {
    const { lattice, targetPhaseDeg } = panelTargetPhase(STARTING_DESIGN);
    const { stepXM, stepYM } = lattice.grid;
    paintPhaseThumbnail(this.drawing().nativeElement, { xM: lattice.xM, yM: lattice.yM, phaseDeg: targetPhaseDeg, stepXM, stepYM }, SIDE);
  }
}
