import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { ChoiceRow } from '../fields/choice-row';
import { DesignField } from '../fields/design-field';
import { RemarkList } from '../fields/remark-list';
import { WORKSPACE_STATE } from '../workspace-state';

type Prediction = DesignDocument['prediction'];

const MODELS = [
  { value: 'vector', label: 'Vector' },
  { value: 'scalar', label: 'Scalar' },
] as const;
const RERADIATIONS = [
  { value: 'power-wave', label: 'Power waves' },
  { value: 'aperture', label: 'Aperture' },
] as const;
const CELL_FACTORS = [
  { value: 'none', label: 'None' },
  { value: 'normal', label: 'Uniform cell' },
  { value: 'beam', label: 'About the beam' },
] as const;

/** Which model predicts the panel, and in which form. */
@Component({
  selector: 'slant-model-fields',
  imports: [ChoiceRow, DesignField, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './model-fields.html',
  styleUrls: ['../fields/sheet.scss', '../fields/field-rows.scss', './illumination-sheet.scss'],
})
export class ModelFields {
  private readonly state = inject(WORKSPACE_STATE);
  protected readonly models = MODELS;
  protected readonly reradiations = RERADIATIONS;
  protected readonly cellFactors = CELL_FACTORS;
  protected readonly canEdit = this.state.canEdit;
  private readonly prediction = computed(() => this.state.design().prediction);
  protected readonly model = computed(() => this.prediction().model ?? 'scalar');
  protected readonly reradiation = computed(() => this.prediction().reradiation ?? 'power-wave');
  protected readonly cellFactor = computed(() => this.prediction().cellFactor ?? 'none');

  protected chooseModel(value: string): void {
    const option = MODELS.find((candidate) => candidate.value === value);
    if (option) this.set(`Model: ${option.label}`, { model: option.value });
  }

  protected chooseReradiation(value: string): void {
    const option = RERADIATIONS.find((candidate) => candidate.value === value);
    if (option) this.set(`Re-radiation: ${option.label}`, { reradiation: option.value });
  }

  protected chooseCellFactor(value: string): void {
    const option = CELL_FACTORS.find((candidate) => candidate.value === value);
    if (option) this.set(`Cell factor: ${option.label}`, { cellFactor: option.value });
  }

  private set(name: string, part: Partial<Prediction>): void {
    this.state.change(name, (design) => ({ ...design, prediction: { ...design.prediction, ...part } }));
  }
}
