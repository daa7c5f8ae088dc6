import type { ParamMap, Params } from '@angular/router';
import type { MapZoom } from '../../ui/plots/map-view';
import type { LivePrediction } from '../live-prediction-data';
import { isPhaseView } from './phase-views';
import type { PhaseView } from './phase-views';

/** What the address of the sheet says of the view, so that a link shows the same. */
export interface PhaseLink {
  readonly view: PhaseView;
  /** Column and row of the chosen cell: they survive a change of the outline. */
  readonly cell: { readonly column: number; readonly row: number } | null;
  readonly zoom: MapZoom | null;
}

export function readPhaseLink(query: ParamMap): PhaseLink {
  const view = query.get('view');
  const place = /^c(-?\d{1,6})r(-?\d{1,6})$/.exec(query.get('cell') ?? '');
  return {
    view: isPhaseView(view) ? view : 'target',
    cell: place ? { column: Number(place[1]), row: Number(place[2]) } : null,
    zoom: readZoom(query.get('zoom')),
  };
}

function readZoom(text: string | null): MapZoom | null {
  const [centreXMm, centreYMm, factor] = (text ?? '').split('_').map(Number);
  return [centreXMm, centreYMm, factor].every(Number.isFinite) && factor > 1 ? { centreXMm, centreYMm, factor } : null;
}

/** Inverse of {@link readPhaseLink}; null takes a part out of the address. */
export function writePhaseLink({ view, cell, zoom }: PhaseLink): Params {
  const short = (value: number): string => String(Number(value.toPrecision(6)));
  return {
    view: view === 'target' ? null : view,
    cell: cell ? `c${cell.column}r${cell.row}` : null,
    zoom: zoom && zoom.factor > 1 ? [zoom.centreXMm, zoom.centreYMm, zoom.factor].map(short).join('_') : null,
  };
}

/** The cell at a column and row, or null when there is none. */
export function cellOfPlace({ cells }: LivePrediction, place: PhaseLink['cell']): number | null {
  if (!place) return null;
  for (let i = 0; i < cells.row.length; i++) if (cells.row[i] === place.row && cells.column[i] === place.column) return i;
  return null;
}
