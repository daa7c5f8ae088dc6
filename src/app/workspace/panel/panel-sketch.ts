import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Panel } from '../../../../shared/model/design-document';
import { hostWidth } from '../../ui/plots/element-width';
import { panelDrawing } from './panel-drawing';

let nextPattern = 0;

/** The panel seen from its outward side, to scale, with the lengths of its fields. */
@Component({
  selector: 'slant-panel-sketch',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './panel-sketch.html',
  styleUrl: '../drawing/drawing.scss',
})
export class PanelSketch {
  readonly panel = input.required<Panel>();
  readonly maxHeight = input(480);
  private readonly measured = hostWidth();
  protected readonly hatchId = `slant-keep-out-hatch-${(nextPattern += 1)}`;
  protected readonly drawing = computed(() => panelDrawing(this.panel(), { width: Math.max(260, this.measured()), height: this.maxHeight() }));
  protected readonly label = computed(() => {
    const { outline } = this.panel();
    return outline.kind === 'polygon' ? `Panel: polygon of ${outline.pointsMm.length} corners` : `Panel: ${outline.kind}, ${outline.widthMm} by ${outline.heightMm} mm`;
  });
}
