import { illuminateCells } from '../../../../shared/antenna/illumination';
import { siDesign } from '../../../../shared/antenna/si-design';
import { degFromRad, wrapDeg } from '../../../../shared/units/angles';
import { wavenumberRadPerM } from '../../../../shared/waves/conventions';
import type { MapPlaces } from '../../ui/plots/map-places';
import type { MapLayer } from '../../ui/plots/paint-panel-map';
import type { LivePrediction } from '../live-prediction-data';

/** Cells fainter than this below the brightest one lie on the floor of the map. */
const DEEPEST_DB = -40;

export function cellPlaces({ cells, of }: LivePrediction): MapPlaces {
  const { lattice } = of.panel;
  return {
    xMm: cells.xMm,
    yMm: cells.yMm,
    pitchXMm: lattice.periodXMm,
    pitchYMm: lattice.kind === 'rectangular' ? lattice.periodYMm : lattice.rowSpacingMm,
  };
}

/** Illumination of each cell below the brightest one, in dB; a dark cell lies on the floor. */
export function amplitudeLayer({ cells }: LivePrediction): MapLayer {
  const brightest = largest(cells.amplitude);
  const values = Float32Array.from(cells.amplitude, (amplitude) => (brightest > 0 && amplitude > 0 ? Math.max(DEEPEST_DB, 20 * Math.log10(amplitude / brightest)) : DEEPEST_DB));
  const faintest = values.reduce((least, level) => Math.min(least, level), 0);
  const floor = Math.max(DEEPEST_DB, Math.min(-5, Math.floor(faintest / 5) * 5));
  return { title: 'Illumination below the brightest cell', unit: 'dB', digits: 2, values, scale: { map: 'sequential', from: floor, to: 0 } };
}

export function incidenceLayer({ cells }: LivePrediction): MapLayer {
  const steepest = largest(cells.incidenceDeg);
  const to = Math.max(10, Math.ceil(steepest / 10) * 10);
  return { title: 'Angle of incidence', unit: '°', digits: 1, values: cells.incidenceDeg, scale: { map: 'sequential', from: 0, to } };
}

/** Phase with which the wave arrives at each cell, at the design frequency: -k times the path, a guided wave by its own index. */
export function incidentPhaseLayer({ cells, of }: LivePrediction): MapLayer {
  const si = siDesign(of);
  const wavenumber = wavenumberRadPerM(si.designFrequencyHz);
  const xM = Float64Array.from(cells.xMm, (x) => x / 1000);
  const yM = Float64Array.from(cells.yMm, (y) => y / 1000);
  const { pathM } = illuminateCells(si.illumination, { count: xM.length, xM, yM }, si.receiveExponent);
  const values = Float32Array.from(pathM, (path) => wrapDeg(degFromRad(-wavenumber * path)));
  return { title: 'Phase of the incident wave', unit: '°', digits: 1, values, scale: { map: 'cyclic', from: -180, to: 180 } };
}

/** Of values that are never negative. */
function largest(values: ArrayLike<number>): number {
  let most = 0;
  for (let i = 0; i < values.length; i += 1) most = Math.max(most, values[i]);
  return most;
}
