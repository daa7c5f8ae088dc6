import { wrapDeg } from '../../../../shared/units/angles';
import type { MapLayer } from '../../ui/plots/paint-panel-map';
import { niceStep } from '../../ui/plots/axis-ticks';
import { amplitudeLayer, incidenceLayer } from '../illumination/illumination-layers';
import type { LivePrediction } from '../live-prediction-data';
import type { EditionInUse } from '../workspace-state';
import { editionOf } from './cell-name';
import { countEmpty, emptyPlaces, withoutEmpty } from './empty-places';

export const PHASE_VIEWS = [
  { id: 'target', label: 'Target phase' },
  { id: 'error', label: 'Phase error' },
  { id: 'cell', label: 'Cell' },
  { id: 'amplitude', label: 'Amplitude' },
  { id: 'incidence', label: 'Incidence' },
  { id: 'changed', label: 'What changed' },
] as const;

export type PhaseView = (typeof PHASE_VIEWS)[number]['id'];

export function isPhaseView(text: string | null): text is PhaseView {
  return PHASE_VIEWS.some(({ id }) => id === text);
}

export interface PhaseViewSource {
  readonly prediction: LivePrediction;
  readonly parent: LivePrediction | null;
  readonly parentNumber: number | null;
  readonly edition: EditionInUse | null;
}

/** The map of a view, or why there is none. */
export type PhaseLayer = { readonly kind: 'layer'; readonly layer: MapLayer; readonly note: string } | { readonly kind: 'none'; readonly reason: string };

export function phaseLayer(view: PhaseView, source: PhaseViewSource): PhaseLayer {
  const found = LAYERS[view](source);
  const isBareWhereEmpty = view === 'error' || view === 'cell' || view === 'changed';
  if (found.kind === 'none' || !isBareWhereEmpty || countEmpty(source.prediction) === 0) return found;
  return { ...found, layer: { ...found.layer, isHatched: emptyPlaces(source.prediction) } };
}

const LAYERS: Readonly<Record<PhaseView, (source: PhaseViewSource) => PhaseLayer>> = {
  target: ({ prediction }) => drawn({ title: 'Target phase', unit: '°', digits: 1, values: prediction.cells.targetPhaseDeg, scale: { map: 'cyclic', from: -180, to: 180 } }),
  error: ({ prediction }) => drawn(errorLayer(prediction), 'achieved minus target'),
  cell: cellLayer,
  amplitude: ({ prediction }) => drawn(amplitudeLayer(prediction)),
  incidence: ({ prediction }) => drawn(incidenceLayer(prediction)),
  changed: changedLayer,
};

function drawn(layer: MapLayer, note = ''): PhaseLayer {
  return { kind: 'layer', layer, note };
}

/** The error on a scale centred on zero that just holds the largest one. */
export function errorLayer(prediction: LivePrediction): MapLayer {
  // A place without a cell achieves no phase that could be in error.
  const values = withoutEmpty(prediction, prediction.cells.errorDeg);
  let largest = 0;
  for (let i = 0; i < values.length; i++) if (Math.abs(values[i]) > largest) largest = Math.abs(values[i]);
  const limit = roundLimit(largest, 180);
  return { title: 'Phase error', unit: '°', digits: 2, values, scale: { map: 'diverging', from: -limit, to: limit } };
}

/** The next round number, at least one and at most the whole. */
function roundLimit(largest: number, most: number): number {
  if (largest <= 1) return 1;
  const step = niceStep(largest, 3);
  return Math.min(most, Math.ceil(largest / step) * step);
}

function cellLayer({ prediction, edition }: PhaseViewSource): PhaseLayer {
  const { cells, of } = prediction;
  if (of.cells.kind === 'modulated') return { kind: 'none', reason: 'All cells run through the same states, each with its own delay.' };
  if (of.cells.kind === 'resonant' && of.cells.states === null) return { kind: 'none', reason: 'A continuous tuning has no states to tell apart.' };
  if (of.cells.kind === 'ideal' && of.cells.levels === null) return { kind: 'none', reason: 'A continuous ideal phase has no cells to tell apart. Choose cells on the Cells sheet.' };
  const own = editionOf(of, edition);
  const parameter = own?.description.parameters[0];
  const valueOf = (index: number): number => (index < 0 ? Number.NaN : own ? (own.cells[index]?.parametersMm[0] ?? Number.NaN) : index + 1);
  const values = Float64Array.from(cells.cellIndex, valueOf);
  const [low, high] = rangeOf(own ? own.cells.map(({ parametersMm }) => parametersMm[0]) : values);
  // The paper is kept for places without a cell, so the smallest cell is a little above the floor of the map.
  const room = high > low ? (high - low) * 0.08 : 1;
  const scale = { map: 'sequential', from: low - room, to: high } as const;
  const title = parameter ? parameter.label : of.cells.kind === 'ideal' ? 'Level' : of.cells.kind === 'resonant' ? 'State' : 'Entry of the table';
  return drawn({ title, unit: parameter ? 'mm' : '', digits: parameter ? 2 : 0, values, scale });
}

function rangeOf(values: ArrayLike<number>): readonly [number, number] {
  let [low, high] = [Infinity, -Infinity];
  for (let i = 0; i < values.length; i++) {
    if (Number.isNaN(values[i])) continue;
    low = Math.min(low, values[i]);
    high = Math.max(high, values[i]);
  }
  return low <= high ? [low, high] : [0, 1];
}

/** The change of the achieved phase at each cell against the parent; unchanged cells stay bare. */
function changedLayer({ prediction, parent, parentNumber }: PhaseViewSource): PhaseLayer {
  if (parentNumber === null) return { kind: 'none', reason: 'There is no revision yet to compare with. Freeze one on the Revisions sheet.' };
  if (!parent) return { kind: 'none', reason: `Revision ${parentNumber} is still being predicted.` };
  const [now, before] = [prediction.cells, parent.cells];
  if (!sameLattice(now, before)) return { kind: 'none', reason: `Revision ${parentNumber} stands on another lattice or outline, so cells cannot be matched one to one.` };
  // Single precision keeps phases to about 2e-5 degrees.
  const [isEmpty, wasEmpty] = [emptyPlaces(prediction), emptyPlaces(parent)];
  const values = Float64Array.from(now.phaseDeg, (phase, i) => {
    if (isEmpty(i) || wasEmpty(i)) return Number.NaN;
    const change = wrapDeg(phase - before.phaseDeg[i]);
    return Math.abs(change) < 1e-3 ? Number.NaN : change;
  });
  let changed = 0;
  let largest = 0;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    changed++;
    largest = Math.max(largest, Math.abs(value));
  }
  const limit = roundLimit(largest, 180);
  const note = changed === 0 ? `no cell differs from revision ${parentNumber}` : `${changed} of ${values.length} cells differ from revision ${parentNumber}; the others are bare`;
  return drawn({ title: 'Change of cell phase', unit: '°', digits: 1, values, scale: { map: 'diverging', from: -limit, to: limit } }, note);
}

function sameLattice(now: LivePrediction['cells'], before: LivePrediction['cells']): boolean {
  const last = now.xMm.length - 1;
  if (last + 1 !== before.xMm.length) return false;
  return [0, last >> 1, last].every((i) => i < 0 || (Math.abs(now.xMm[i] - before.xMm[i]) < 1e-6 && Math.abs(now.yMm[i] - before.yMm[i]) < 1e-6));
}
