import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import type { Comparison } from '../../../../shared/contracts/comparisons';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { ChoiceTabs } from '../../ui/choice-tabs';
import { ColourKey } from '../../ui/plots/colour-key';
import { PanelMap } from '../../ui/plots/panel-map';
import type { PlotHeading } from '../../ui/plots/plot-export';
import { numberText, signedNumberText } from '../../ui/plots/plot-text';
import { PlotTools } from '../../ui/plots/plot-tools';
import { UvMap } from '../../ui/plots/uv-map';
import { ViewTitle } from '../../ui/view-title';
import { changeLayer, changePlaces, hemisphereDifference } from './comparison-plots';
import type { CellChange } from './comparison-plots';
import { isCompared } from './comparison-rows';

/** Where two states differ: over the cells of the panel, or over the hemisphere. */
@Component({
  selector: 'slant-change-map',
  imports: [ChoiceTabs, ColourKey, PanelMap, PlotTools, UvMap, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './change-map.html',
  styles: `
    :host {
      display: grid;
      gap: 4px;
      align-content: start;
      min-width: 0;
    }
    slant-plot-tools {
      align-self: center;
    }
  `,
})
export class ChangeMap {
  readonly comparison = input.required<Comparison>();
  /** Of the later side: its lattice is drawn. */
  readonly design = input.required<DesignDocument | null>();
  readonly heading = input.required<PlotHeading>();

  private readonly wanted = signal('');
  private readonly compared = computed(() => {
    const { cells } = this.comparison();
    return isCompared(cells) && this.design() ? cells : null;
  });
  protected readonly forms = computed(() => {
    const compared = this.compared();
    return [
      ...(compared?.parameter ? [{ id: 'parameter', label: 'Size' }] : []),
      ...(compared ? [{ id: 'phase', label: 'Phase' }, { id: 'error', label: 'Error' }] : []),
      { id: 'hemisphere', label: 'Hemisphere' },
    ];
  });
  protected readonly form = computed(() => (this.forms().some(({ id }) => id === this.wanted()) ? this.wanted() : this.forms()[0].id));
  protected readonly cells = computed(() => {
    const [compared, design, form] = [this.compared(), this.design(), this.form()];
    return compared && design && form !== 'hemisphere' ? { places: changePlaces(compared, design), layer: changeLayer(compared, form as CellChange) } : null;
  });
  protected readonly keyLabel = computed(() => {
    const layer = this.cells()?.layer;
    if (!layer) return '';
    const clipped = Array.from(layer.values).some((value) => Math.abs(value) > layer.scale.to);
    return `${layer.title}, ${layer.unit}; unchanged cells are bare${clipped ? `; beyond ±${numberText(layer.scale.to, 2)} clipped` : ''}`;
  });
  protected readonly hemisphere = computed(() => hemisphereDifference(this.comparison()));
  protected readonly describe = computed(() => {
    const cells = this.cells();
    return (cell: number): string => {
      if (!cells) return '';
      const value = cells.layer.values[cell];
      const place = `x ${numberText(cells.places.xMm[cell], 1)}, y ${numberText(cells.places.yMm[cell], 1)} mm`;
      return Number.isNaN(value) ? `${place}: unchanged` : `${place}: ${signedNumberText(value, cells.layer.digits)} ${cells.layer.unit}`;
    };
  });

  protected show(form: string): void {
    this.wanted.set(form);
  }
}
