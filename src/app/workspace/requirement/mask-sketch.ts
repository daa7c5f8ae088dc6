import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { hostWidth } from '../../ui/plots/element-width';
import { maskDrawing } from './mask-drawing';
import type { OffAxisTrace } from './mask-drawing';

let nextPattern = 0;

/** The mask as a forbidden area against the angle off the beam, with the predicted gain below it. */
@Component({
  selector: 'slant-mask-sketch',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './mask-sketch.html',
  styleUrls: ['../drawing/drawing.scss', './mask-sketch.scss'],
})
export class MaskSketch {
  readonly points = input.required<readonly (readonly [number, number])[]>();
  readonly traces = input<readonly OffAxisTrace[]>([]);
  readonly unit = input('dBi');
  /** Draws a square at every point: for points that a person has set. */
  readonly marked = input(true);
  readonly height = input(240);
  private readonly measured = hostWidth();
  protected readonly hatchId = `slant-mask-hatch-${(nextPattern += 1)}`;
  protected readonly drawing = computed(() => maskDrawing(this.points(), this.traces(), { width: Math.max(260, this.measured()), height: this.height() }));
}
