import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { derivedValues } from '../../../../shared/antenna/derived-values';
import type { Figure } from '../../../../shared/model/figures';
import { ColourKey } from '../../ui/plots/colour-key';
import { PanelMap } from '../../ui/plots/panel-map';
import { ViewTitle } from '../../ui/view-title';
import { editValue } from '../design-field-edit';
import { DesignChoice } from '../fields/design-choice';
import { DesignField } from '../fields/design-field';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { SheetNotes } from '../fields/sheet-notes';
import { SheetHeader } from '../sheet-header';
import { figureText } from '../strip-figures';
import { WORKSPACE_STATE } from '../workspace-state';
import { illuminationOfKind } from './illumination-choices';
import { amplitudeLayer, cellPlaces, incidenceLayer } from './illumination-layers';
import { IlluminationSketch } from './illumination-sketch';

const KIND_OPTIONS = [
  { value: 'horn', label: 'Horn' },
  { value: 'plane-wave', label: 'Plane wave' },
] as const;
const POLARISATION_OPTIONS = [
  { value: 'x', label: 'Linear x' },
  { value: 'y', label: 'Linear y' },
  { value: 'rhcp', label: 'RHCP' },
  { value: 'lhcp', label: 'LHCP' },
] as const;

interface Fact {
  readonly name: string;
  readonly value: string;
}

/** What lights the panel: drawn from the side to scale, with what falls on each cell. */
@Component({
  selector: 'slant-illumination-sheet',
  imports: [ColourKey, DesignChoice, DesignField, IlluminationSketch, PanelMap, RemarkList, SheetNotes, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './illumination-sheet.html',
  styleUrls: ['../fields/sheet.scss', './illumination-sheet.scss'],
})
export class IlluminationSheet {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  protected readonly kindOptions = KIND_OPTIONS;
  protected readonly polarisationOptions = POLARISATION_OPTIONS;
  protected readonly axes = ['x', 'y', 'z'] as const;
  protected readonly design = this.state.design;
  protected readonly stale = computed(() => this.state.failure() !== null);
  protected readonly illumination = computed(() => this.design().illumination);
  protected readonly maps = computed(() => {
    const prediction = this.state.prediction();
    if (!prediction || prediction.cells.xMm.length === 0) return null;
    return { places: cellPlaces(prediction), amplitude: amplitudeLayer(prediction), incidence: incidenceLayer(prediction), cells: prediction.cells };
  });
  protected readonly geometry = computed<readonly Fact[]>(() => {
    const derived = derivedValues(this.design());
    const illumination = this.illumination();
    const shown = (figure: Figure, digits: number, unit: string): string => (typeof figure === 'number' ? `${figureText(figure, digits)}${unit}` : '–');
    if (illumination.kind !== 'horn') return [{ name: 'Incidence, everywhere', value: shown(derived.maxIncidenceDeg, 1, '°') }];
    return [
      { name: 'f/D', value: shown(derived.focalRatio, 3, '') },
      { name: 'Offset angle', value: `${figureText(offsetAngleDeg(illumination.positionMm, illumination.aimMm), 1)}°` },
      { name: 'Steepest incidence', value: shown(derived.maxIncidenceDeg, 1, '°') },
      { name: 'Gain of the horn, 2(2q + 1)', value: shown(derived.hornGainDbi, 2, ' dBi') },
      { name: 'Half-power width, E and H', value: `${shown(derived.hornBeamwidthDeg.e, 1, '°')}, ${shown(derived.hornBeamwidthDeg.h, 1, '°')}` },
    ];
  });
  protected readonly predicted = computed<readonly Fact[]>(() => {
    const figures = this.state.prediction()?.head.figures;
    if (!figures) return [];
    const shown = (figure: Figure, digits: number): string => (typeof figure === 'number' ? `${figureText(figure, digits)} dB` : `– (${figure.reason})`);
    return [
      { name: 'Edge taper', value: shown(figures.edgeTaperDb, 2) },
      { name: 'Spillover', value: shown(figures.spilloverDb, 2) },
      { name: 'Taper loss, held by the directivity', value: shown(figures.taperDb, 2) },
    ];
  });
  protected readonly describe = (cell: number): string => {
    const maps = this.maps();
    if (!maps) return '';
    return `x ${figureText(maps.cells.xMm[cell], 1)}, y ${figureText(maps.cells.yMm[cell], 1)} mm: ${figureText(maps.amplitude.values[cell], 2)} dB, incidence ${figureText(maps.cells.incidenceDeg[cell], 1)}°`;
  };

  constructor() {
    const header = inject(SheetHeader);
    effect(() => {
      const illumination = this.illumination();
      const subtitle =
        illumination.kind === 'horn'
          ? `horn at ${illumination.positionMm.map((value) => figureText(value, Number.isInteger(value) ? 0 : 1)).join(', ')} mm, exponents ${illumination.exponentE} and ${illumination.exponentH}`
          : `plane wave from θ ${illumination.thetaDeg}°, φ ${illumination.phiDeg}°`;
      header.show({ number: 3, title: 'Illumination', subtitle, scale: 'as drawn' });
    });
  }

  protected chooseKind(kind: string): void {
    const option = KIND_OPTIONS.find(({ value }) => value === kind);
    if (!option) return;
    const edit = editValue(this.design(), '/illumination', illuminationOfKind(this.design(), option.value));
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow('/illumination');
    this.state.change(`Illumination: ${option.label}`, () => edit.design);
  }
}

/** Between the axis of the horn and the normal of the panel. */
function offsetAngleDeg(position: readonly number[], aim: readonly number[]): number {
  const across = Math.hypot(aim[0] - position[0], aim[1] - position[1]);
  return (Math.atan2(across, Math.abs(aim[2] - position[2])) * 180) / Math.PI;
}
