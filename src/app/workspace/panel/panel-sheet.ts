import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { derivedValues } from '../../../../shared/antenna/derived-values';
import { MAX_CELL_COUNT } from '../../../../shared/model/design-document';
import type { Figure } from '../../../../shared/model/figures';
import { editValue } from '../design-field-edit';
import { DesignChoice } from '../fields/design-choice';
import { DesignField } from '../fields/design-field';
import { DesignTable } from '../fields/design-table';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { SheetNotes } from '../fields/sheet-notes';
import { SheetHeader } from '../sheet-header';
import { figureText } from '../strip-figures';
import { ViewTitle } from '../../ui/view-title';
import { WORKSPACE_STATE } from '../workspace-state';
import { KeepOuts } from './keep-outs';
import { LatticeSketch } from './lattice-sketch';
import { latticeOfKind, outlineOfKind } from './outline-choices';
import { CORNER_COLUMNS, OUTLINE_OPTIONS, nextCorner } from './outline-fields';
import { PanelSketch } from './panel-sketch';

const LATTICE_OPTIONS = [
  { value: 'rectangular', label: 'Rectangular' },
  { value: 'triangular', label: 'Triangular' },
] as const;

/** The aperture: operation, outline, lattice and keep-outs, drawn to scale. */
@Component({
  selector: 'slant-panel-sheet',
  imports: [DesignChoice, DesignField, DesignTable, KeepOuts, LatticeSketch, PanelSketch, RemarkList, SheetNotes, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './panel-sheet.html',
  styleUrls: ['../fields/sheet.scss', './panel-sheet.scss'],
})
export class PanelSheet {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  protected readonly outlineOptions = OUTLINE_OPTIONS;
  protected readonly latticeOptions = LATTICE_OPTIONS;
  protected readonly cornerColumns = CORNER_COLUMNS;
  protected readonly nextCorner = nextCorner;
  protected readonly design = this.state.design;
  protected readonly panel = computed(() => this.design().panel);
  protected readonly derived = computed(() => derivedValues(this.design()));
  protected readonly cellCount = computed(() => countText(this.derived().cellCount));
  protected readonly facts = computed(() => {
    const derived = this.derived();
    return [
      { name: 'Cells', value: this.cellCount(), note: `at most ${figureText(MAX_CELL_COUNT, 0)}` },
      { name: 'Wavelength λ', value: `${figureText(derived.wavelengthMm, 3)} mm`, note: `at ${this.design().requirement.designFrequencyGHz} GHz` },
      { name: 'Largest dimension D', value: `${figureText(derived.largestDimensionMm, 1)} mm`, note: `${figureText(derived.apertureOverWavelength, 2)} λ` },
      { name: 'Area', value: `${figureText(derived.areaMm2 / 100, 1)} cm²`, note: '' },
      { name: 'Far field from 2D²/λ', value: `${figureText(derived.farFieldDistanceM, 2)} m`, note: 'for deep sidelobes farther' },
    ];
  });
  /** Both limits on the spacing with what this lattice has, also while nothing is predicted. */
  protected readonly spacings = computed(() => {
    const { spacingMm, largestFreeSpacingMm, largestCellSpacingMm } = this.derived();
    return [
      { name: 'No grating lobe of a beam, λ / (1 + sin θ)', limit: largestFreeSpacingMm, spacing: spacingMm },
      { name: 'Cells of one order at the edge, λ / (1 + sin incidence)', limit: largestCellSpacingMm, spacing: spacingMm },
    ].map(({ name, limit, spacing }) => ({
      name,
      spacing: `${figureText(spacing, 3)} mm`,
      limit: typeof limit === 'number' ? `${figureText(limit, 3)} mm` : limit.reason,
      kept: typeof limit === 'number' && spacing <= limit,
    }));
  });

  constructor() {
    const header = inject(SheetHeader);
    effect(() => {
      const { operation, outline, lattice } = this.panel();
      const size = outline.kind === 'polygon' ? `polygon of ${outline.pointsMm.length} corners` : `${outline.kind} ${outline.widthMm} × ${outline.heightMm} mm`;
      header.show({ number: 2, title: 'Panel', subtitle: `${operation}ing ${size}, ${lattice.kind} lattice, ${this.cellCount()} cells`, scale: 'as drawn' });
    });
  }

  protected chooseOutline(kind: string): void {
    const option = OUTLINE_OPTIONS.find(({ value }) => value === kind);
    if (option) this.put('/panel/outline', outlineOfKind(this.panel().outline, option.value), `Outline: ${option.label}`);
  }

  protected chooseLattice(kind: string): void {
    const option = LATTICE_OPTIONS.find(({ value }) => value === kind);
    if (option) this.put('/panel/lattice', latticeOfKind(this.panel().lattice, option.value), `Lattice: ${option.label}`);
  }

  private put(pointer: string, value: unknown, name: string): void {
    const edit = editValue(this.design(), pointer, value);
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow(pointer);
    this.state.change(name, () => edit.design);
  }
}

function countText(count: Figure): string {
  return typeof count === 'number' ? figureText(count, 0) : count.reason;
}
