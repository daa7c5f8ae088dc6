import { ChangeDetectionStrategy, Component, computed, effect, inject, signal } from '@angular/core';
import { derivedValues } from '../../../../shared/antenna/derived-values';
import { prepareEdition } from '../../../../shared/antenna/prepare-edition';
import type { Cells, DesignDocument } from '../../../../shared/model/design-document';
import { LinePlot } from '../../ui/plots/line-plot';
import { ViewTitle } from '../../ui/view-title';
import { editValue } from '../design-field-edit';
import { ChoiceRow } from '../fields/choice-row';
import { DesignField } from '../fields/design-field';
import { DesignTable } from '../fields/design-table';
import type { DesignColumn } from '../fields/design-table';
import { HowNote } from '../fields/how-note';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { SheetNotes } from '../fields/sheet-notes';
import { HOW_LAWS_COMPUTED } from '../how-laws-computed';
import { SheetHeader } from '../sheet-header';
import { figureText } from '../strip-figures';
import { WORKSPACE_STATE } from '../workspace-state';
import { AssignmentFields } from './assignment-fields';
import { cellCosts } from './cell-costs';
import { EditionCells } from './edition-cells';
import { EditionChooser } from './edition-chooser';
import { editionCurve } from './edition-curve';
import { ModulatedFields } from './modulated-fields';
import { cellUse, phaseCoverage } from './phase-coverage';
import { ResonantFields } from './resonant-fields';
import { ruleText } from './rule-options';
import { TargetPhaseChoice } from './target-phase-choice';

const KIND_OPTIONS = [
  { value: 'ideal', label: 'Ideal' },
  { value: 'edition', label: 'Library edition' },
  { value: 'inline', label: 'What-if table' },
  { value: 'resonant', label: 'Resonant' },
  { value: 'modulated', label: 'Time-modulated' },
] as const;
const INLINE_COLUMNS: readonly DesignColumn[] = [
  { key: 'phaseDeg', label: 'Phase', dimension: 'angle', unit: '°' },
  { key: 'magnitude', label: 'Magnitude', dimension: 'number', unit: '' },
];
const FIRST_TABLE: Cells = {
  kind: 'inline',
  cells: [0, 90, 180, 270].map((phaseDeg) => ({ phaseDeg, magnitude: 1 })),
};

/** Harmonics are those of one response to a cell, so time-modulated cells take the scalar model. */
function withCells(design: DesignDocument, cells: Cells): DesignDocument {
  const { prediction } = design;
  return cells.kind === 'modulated' && prediction.model === 'vector' ? { ...design, cells, prediction: { ...prediction, model: 'scalar' } } : { ...design, cells };
}

/** What each kind starts from; an edition is chosen from the table. */
const FIRST_CELLS: Readonly<Record<Cells['kind'], Cells | null>> = {
  ideal: { kind: 'ideal', levels: null },
  inline: FIRST_TABLE,
  resonant: { kind: 'resonant', rule: 'projection', states: null },
  modulated: { kind: 'modulated', states: [0, 90, 180, 270].map((phaseDeg) => ({ phaseDeg, magnitude: 1 })), modulationMHz: 1, harmonic: 1 },
  edition: null,
};

/** Which cells stand on the panel: ideal ones, an edition of the library, or a what-if table; and what the choice costs. */
@Component({
  selector: 'slant-cells-sheet',
  imports: [AssignmentFields, ChoiceRow, DesignField, HowNote, DesignTable, EditionCells, EditionChooser, LinePlot, ModulatedFields, RemarkList, ResonantFields, SheetNotes, TargetPhaseChoice, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './cells-sheet.html',
  styleUrl: '../fields/sheet.scss',
})
export class CellsSheet {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  /** What each kind held when it was left, so that looking at another kind loses nothing. */
  private readonly left = new Map<Cells['kind'], Cells>();

  /** Resonant cells stand on a guided wave, those of an edition are measured under waves from outside. */
  protected readonly kindOptions = computed(() => {
    const barred = this.state.design().illumination.kind === 'guided-wave' ? 'edition' : 'resonant';
    return KIND_OPTIONS.filter(({ value }) => value !== barred || value === this.cells().kind);
  });
  protected readonly inlineColumns = INLINE_COLUMNS;
  protected readonly levelOptions = [
    { value: 'continuous', label: 'Continuous' },
    { value: 'levels', label: 'Levels' },
  ];
  protected readonly referenceOptions = [
    { value: 'number', label: 'Given' },
    { value: 'search', label: 'Searched' },
  ];
  /** A library edition is wanted, and none has been chosen from the table yet. */
  protected readonly wantsEdition = signal(false);
  protected readonly canEdit = this.state.canEdit;
  protected readonly assignmentHow = HOW_LAWS_COMPUTED.assignment;
  protected readonly cells = computed(() => this.state.design().cells);
  protected readonly levels = computed(() => {
    const cells = this.cells();
    return cells.kind === 'ideal' ? cells.levels : null;
  });
  protected readonly edition = this.state.edition;
  protected readonly editionFailure = computed(() => this.state.editionFailure?.() ?? null);
  protected readonly editionId = computed(() => {
    const cells = this.cells();
    return cells.kind === 'edition' ? cells.editionId : null;
  });
  protected readonly searches = computed(() => this.state.design().referencePhaseDeg === 'search');
  protected readonly stale = computed(() => this.state.failure() !== null);
  protected readonly costs = computed(() => {
    const prediction = this.state.prediction();
    return prediction ? cellCosts(prediction) : [];
  });
  protected readonly use = computed(() => {
    const prediction = this.state.prediction();
    const ofThisKind = prediction?.of.cells.kind === 'edition';
    return cellUse(ofThisKind ? prediction.cells.cellIndex : [], this.edition()?.cells.length ?? 0);
  });
  private readonly prepared = computed(() => {
    const edition = this.edition();
    return edition ? prepareEdition(edition) : null;
  });
  protected readonly curve = computed(() => {
    const prepared = this.prepared();
    if (!prepared) return null;
    const design = this.state.design();
    const steepest = derivedValues(design).maxIncidenceDeg;
    return editionCurve(prepared, {
      frequencyGHz: design.requirement.designFrequencyGHz,
      steepestDeg: typeof steepest === 'number' ? steepest : 0,
      polarisation: design.illumination.polarisation === 'y' ? 'y' : 'x',
      use: this.use(),
    });
  });
  /** Range and largest gap of the cells in use, in words. */
  protected readonly coverage = computed(() => {
    const cells = this.cells();
    const coverage = cells.kind === 'inline' ? phaseCoverage(cells.cells.map(({ phaseDeg }) => phaseDeg)) : cells.kind === 'edition' ? (this.curve()?.coverage ?? null) : null;
    if (!coverage) return null;
    return `The phases span ${figureText(coverage.rangeDeg, 1)}°; the largest gap round the circle is ${figureText(coverage.largestGapDeg, 1)}°, so a cell may be off by ${figureText(coverage.largestGapDeg / 2, 1)}°.`;
  });
  protected readonly nextInline = (rows: readonly (readonly number[])[]): readonly number[] => [((rows.at(-1)?.[0] ?? -90) + 90) % 360, 1];

  constructor() {
    const header = inject(SheetHeader);
    effect(() => header.show({ number: 4, title: 'Cells', subtitle: this.subtitle() }));
  }

  private subtitle(): string {
    const cells = this.cells();
    if (cells.kind === 'ideal') return cells.levels === null ? 'ideal, continuous phase' : `ideal, ${cells.levels} levels ${figureText(360 / cells.levels, 2)}° apart`;
    if (cells.kind === 'inline') return `what-if table of ${cells.cells.length} cells`;
    if (cells.kind === 'modulated') return `${cells.states.length} states switched in time, harmonic ${cells.harmonic} steered`;
    if (cells.kind === 'resonant') return `resonant, ${cells.states === null ? 'continuous tuning' : `${cells.states} states`}`;
    const edition = this.edition();
    const name = edition ? `edition ${edition.number ?? 'unpublished'} of ${edition.familyName}` : 'an edition of the library';
    return `${name}, ${ruleText(cells.rule)}`;
  }

  protected chooseKind(kind: string): void {
    const option = KIND_OPTIONS.find(({ value }) => value === kind);
    this.wantsEdition.set(false);
    if (!option || option.value === this.cells().kind) return;
    this.left.set(this.cells().kind, this.cells());
    const next = this.left.get(option.value) ?? FIRST_CELLS[option.value];
    if (next) this.putCells(next, `Cells: ${option.label}`);
    else this.wantsEdition.set(true);
  }

  protected useEdition(editionId: string): void {
    const cells = this.cells();
    const rule = cells.kind === 'edition' ? cells.rule : 'nearest-phase';
    this.left.set(cells.kind, cells);
    this.wantsEdition.set(false);
    this.put('/cells', { kind: 'edition', editionId, rule, excludedCells: [] }, 'Use edition');
  }

  protected chooseLevels(kind: string): void {
    this.put('/cells/levels', kind === 'levels' ? 4 : null, kind === 'levels' ? 'Cells: levels' : 'Cells: continuous');
  }

  protected chooseReference(kind: string): void {
    const found = this.state.prediction()?.head.figures.referencePhaseDeg ?? 0;
    // Giving the phase that the search found keeps the result.
    this.put('/referencePhaseDeg', kind === 'search' ? 'search' : found, kind === 'search' ? 'Search reference phase' : 'Give reference phase');
  }

  private putCells(cells: Cells, name: string): void {
    const edit = editValue(this.state.design(), '', withCells(this.state.design(), cells));
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow('/cells');
    this.state.change(name, () => edit.design);
  }

  private put(pointer: string, value: unknown, name: string): void {
    const edit = editValue(this.state.design(), pointer, value);
    if (edit.kind !== 'changed') return;
    this.pending.dropBelow(pointer);
    this.state.change(name, () => edit.design);
  }
}
