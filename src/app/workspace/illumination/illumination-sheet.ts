import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { ColourKey } from '../../ui/plots/colour-key';
import { PanelMap } from '../../ui/plots/panel-map';
import { ViewTitle } from '../../ui/view-title';
import { editValue } from '../design-field-edit';
import { DesignChoice } from '../fields/design-choice';
import { DesignField } from '../fields/design-field';
import { HowNote } from '../fields/how-note';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { SheetNotes } from '../fields/sheet-notes';
import { HOW_LAWS_COMPUTED } from '../how-laws-computed';
import { SheetHeader } from '../sheet-header';
import { figureText } from '../strip-figures';
import { WORKSPACE_STATE } from '../workspace-state';
import { GuidedWaveFields } from './guided-wave-fields';
import { designOfIllumination } from './illumination-choices';
import { illuminationNotes } from './illumination-notes';
import { geometryFacts, illuminationSubtitle, predictedFacts } from './illumination-facts';
import { amplitudeLayer, cellPlaces, incidenceLayer, incidentPhaseLayer } from './illumination-layers';
import { IlluminationSketch } from './illumination-sketch';
import { ModelFields } from './model-fields';

const KIND_OPTIONS = [
  { value: 'horn', label: 'Horn' },
  { value: 'plane-wave', label: 'Plane wave' },
  { value: 'guided-wave', label: 'Guided wave' },
] as const;
const POLARISATION_OPTIONS = [
  { value: 'x', label: 'Linear x' },
  { value: 'y', label: 'Linear y' },
  { value: 'rhcp', label: 'RHCP' },
  { value: 'lhcp', label: 'LHCP' },
] as const;

/** What lights the panel: drawn from the side to scale, with what falls on each cell. */
@Component({
  selector: 'slant-illumination-sheet',
  imports: [ColourKey, DesignChoice, DesignField, GuidedWaveFields, HowNote, IlluminationSketch, ModelFields, PanelMap, RemarkList, SheetNotes, ViewTitle],
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
    const incidence = prediction.of.illumination.kind === 'guided-wave' ? null : incidenceLayer(prediction);
    return { places: cellPlaces(prediction), amplitude: amplitudeLayer(prediction), phase: incidentPhaseLayer(prediction), incidence, cells: prediction.cells };
  });
  protected readonly geometry = computed(() => geometryFacts(this.design()));
  protected readonly predicted = computed(() => {
    const prediction = this.state.prediction();
    return prediction ? predictedFacts(prediction.head.figures) : [];
  });
  protected readonly hows = computed(() => {
    const { kind } = this.illumination();
    if (kind === 'guided-wave') return [HOW_LAWS_COMPUTED.guidedWave];
    return kind === 'horn' ? [HOW_LAWS_COMPUTED.blockage, HOW_LAWS_COMPUTED.specular] : [HOW_LAWS_COMPUTED.specular];
  });
  protected readonly notes = computed(() => illuminationNotes(this.design()));
  protected readonly describe = (cell: number): string => {
    const maps = this.maps();
    if (!maps) return '';
    return `x ${figureText(maps.cells.xMm[cell], 1)}, y ${figureText(maps.cells.yMm[cell], 1)} mm: ${figureText(maps.amplitude.values[cell], 2)} dB, phase ${figureText(maps.phase.values[cell], 1)}°${maps.incidence ? `, incidence ${figureText(maps.cells.incidenceDeg[cell], 1)}°` : ''}`;
  };

  constructor() {
    const header = inject(SheetHeader);
    effect(() => {
      header.show({ number: 3, title: 'Illumination', subtitle: illuminationSubtitle(this.illumination()), scale: 'as drawn' });
    });
  }

  protected chooseKind(kind: string): void {
    const option = KIND_OPTIONS.find(({ value }) => value === kind);
    if (!option) return;
    const edit = editValue(this.design(), '', designOfIllumination(this.design(), option.value));
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow('/illumination');
    this.pending.dropBelow('/cells');
    this.state.change(`Illumination: ${option.label}`, () => edit.design);
  }
}
