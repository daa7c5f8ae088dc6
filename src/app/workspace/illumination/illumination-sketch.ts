import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { hostWidth } from '../../ui/plots/element-width';
import { illuminationDrawing } from './illumination-drawing';

/** The panel from its side with what lights it and what leaves it, to scale. */
@Component({
  selector: 'slant-illumination-sketch',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './illumination-sketch.html',
  styleUrl: '../drawing/drawing.scss',
})
export class IlluminationSketch {
  readonly design = input.required<DesignDocument>();
  readonly maxHeight = input(400);
  private readonly measured = hostWidth();
  protected readonly drawing = computed(() => illuminationDrawing(this.design(), { width: Math.max(260, this.measured()), height: this.maxHeight() }));
  protected readonly label = computed(() =>
    `Side view of panel, ${{ horn: 'horn', 'plane-wave': 'plane wave', 'guided-wave': 'guided wave' }[this.design().illumination.kind]} and beams`,
  );
}
