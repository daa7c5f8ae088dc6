import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { drawnId } from '../../ui/plots/drawn-id';
import { cellDetailDrawing } from './cell-detail-drawing';
import type { DetailSource } from './cell-detail-drawing';

/** Detail A: the copper of the chosen cell with its neighbours and dimensions; without copper the two phases as arrows. */
@Component({
  selector: 'slant-cell-detail',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './cell-detail.html',
  styleUrls: ['../../ui/plots/plot-svg.scss', './cell-detail.scss'],
})
export class CellDetail {
  readonly source = input.required<DetailSource>();
  readonly targetDeg = input.required<number>();
  readonly achievedDeg = input.required<number>();
  readonly label = input.required<string>();

  protected readonly clipId = drawnId('detail');
  protected readonly drawing = computed(() => cellDetailDrawing(this.source()));
  protected readonly bare = computed(() => this.drawing().copper.length === 0);
  /** Anticlockwise from the right, as phases are drawn. */
  protected readonly target = computed(() => this.arrow(this.targetDeg(), 0.86));
  protected readonly achieved = computed(() => this.arrow(this.achievedDeg(), 0.7));

  private arrow(phaseDeg: number, part: number): string {
    const { centreX, centreY, radius } = this.drawing();
    const angle = (phaseDeg * Math.PI) / 180;
    const tip = (turn: number, length: number): string => `${(centreX + length * Math.cos(angle + turn)).toFixed(1)} ${(centreY - length * Math.sin(angle + turn)).toFixed(1)}`;
    const length = radius * part;
    return `M${centreX} ${centreY}L${tip(0, length)}M${tip(0.07, length - 8)}L${tip(0, length)}L${tip(-0.07, length - 8)}`;
  }
}
