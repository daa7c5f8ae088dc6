import type { Warning } from '../model/figures';
import { degFromRad } from '../units/angles';
import { degreesText } from './angle-text';
import type { CellAssignment } from './cell-stock';
import type { EditionSite } from './edition-stock';
import { permittedNodes, type PermittedNodes } from './excluded-nodes';
import { nearestAzimuth, regionFilter } from './excluded-regions';

/** Angles this little beyond the data are rounding, not a gap. */
const SLACK_RAD = 1e-6;

/** Everything that the data of an edition do not say about its use in this design. */
export function editionWarnings(site: EditionSite, assignment: CellAssignment, frequencyHz: number): Warning[] {
  return [
    ...frequencyWarning(site, frequencyHz),
    ...incidenceWarning(site),
    ...azimuthWarning(site),
    ...regionWarning(site, assignment, frequencyHz),
    ...periodWarning(site),
    ...provenanceWarnings(site),
  ];
}

function frequencyWarning(site: EditionSite, frequencyHz: number): Warning[] {
  const { frequenciesHz } = site.edition.edition.responses;
  const at = site.edition.atFrequency(frequencyHz);
  const fromGHz = frequenciesHz[0] / 1e9;
  const toGHz = frequenciesHz[frequenciesHz.length - 1] / 1e9;
  const frequencyGHz = frequencyHz / 1e9;
  const missing = at.usable.reduce((count, usable) => count + (usable ? 0 : 1), 0);
  const isDesign = frequencyHz === site.designFrequencyHz;
  const pointer = isDesign ? '#/requirement/designFrequencyGHz' : '#/requirement/bandGHz';
  const numbers = { frequencyGHz, fromGHz, toGHz };
  if (at.outside !== 0) {
    const message = `The cells are described from ${fromGHz} to ${toGHz} GHz; at ${frequencyGHz} GHz their responses at the edge of that band stand in.`;
    return [{ code: 'frequency-not-covered', pointer, severity: isDesign ? 'serious' : 'warn', message, numbers }];
  }
  if (missing === 0) return [];
  const message = `${missing} cells have no points on both sides of ${frequencyGHz} GHz and ${isDesign ? 'are not used' : 'take the nearest point given'}.`;
  return [{ code: 'frequency-not-covered', pointer, severity: isDesign ? 'note' : 'warn', message, numbers: { ...numbers, cells: missing } }];
}

function incidenceWarning({ edition, light }: EditionSite): Warning[] {
  const { smallestThetaRad, largestThetaRad } = edition;
  let beyond = 0;
  let largest = 0;
  for (const incidence of light.incidenceRad) {
    if (incidence > largestThetaRad + SLACK_RAD || incidence < smallestThetaRad - SLACK_RAD) beyond += 1;
    largest = Math.max(largest, incidence);
  }
  if (beyond === 0) return [];
  const coveredDeg = degFromRad(largestThetaRad);
  const fromDeg = degFromRad(smallestThetaRad);
  const largestDeg = degFromRad(largest);
  const covered = largestThetaRad === smallestThetaRad ? `at ${degreesText(coveredDeg)} only` : `from ${degreesText(fromDeg)} to ${degreesText(coveredDeg)}`;
  return [
    {
      code: 'incidence-not-covered',
      pointer: '#/illumination',
      severity: largestDeg - coveredDeg > 20 ? 'serious' : 'warn',
      message:
        `The cells are described ${covered}, but used up to ${degreesText(largestDeg)} of incidence: ` +
        `at ${beyond} of ${light.incidenceRad.length} cells the response of the nearest angle stands in.`,
      numbers: { cells: beyond, largestDeg, coveredDeg, coveredFromDeg: fromDeg },
    },
  ];
}

function azimuthWarning({ edition, light }: EditionSite): Warning[] {
  const { cosines, fold } = edition.azimuths;
  // At normal incidence there is no plane of incidence, so nothing to cover.
  if (edition.largestThetaRad === 0) return [];
  const low = cosines[0] - 1e-9;
  const high = cosines[cosines.length - 1] + 1e-9;
  let beyond = 0;
  light.azimuthRad.forEach((azimuth, n) => {
    const cosine = Math.cos(fold * azimuth);
    if (light.incidenceRad[n] > SLACK_RAD && (cosine < low || cosine > high)) beyond += 1;
  });
  if (beyond === 0) return [];
  return [
    {
      code: 'azimuth-not-covered',
      pointer: '#/illumination',
      severity: 'note',
      message: `At ${beyond} of ${light.azimuthRad.length} cells the plane of incidence lies outside the azimuths described; the nearest one stands in.`,
      numbers: { cells: beyond, azimuths: cosines.length },
    },
  ];
}

function regionWarning(site: EditionSite, { cellIndex }: CellAssignment, frequencyHz: number): Warning[] {
  const { edition, light } = site;
  const filter = frequencyHz === site.designFrequencyHz ? site.regions : regionFilter(edition.edition, edition.azimuths, frequencyHz);
  if (filter.isEmpty && site.regions.isEmpty) return [];
  const permitted = filter === site.regions ? site.permitted : permittedNodes(edition, filter, edition.atFrequency(frequencyHz));
  const barred = new Uint8Array(edition.edition.cells.length);
  let [narrowed, used, empty, carried, carriedRad] = [0, 0, 0, 0, 0];
  for (let n = 0; n < cellIndex.length; n++) {
    barred.fill(0);
    if (filter.mark(light.incidenceRad[n], light.azimuthRad[n], barred)) narrowed += 1;
    if (cellIndex[n] < 0) empty += 1;
    else if (barred[cellIndex[n]]) used += 1;
    else {
      const beyondRad = beyondPermittedRad(site, permitted, { cell: cellIndex[n], incidenceRad: light.incidenceRad[n], azimuthRad: light.azimuthRad[n] });
      carriedRad = Math.max(carriedRad, beyondRad);
      if (beyondRad > SLACK_RAD) carried += 1;
    }
  }
  if (narrowed === 0 && empty === 0 && carried === 0) return [];
  const left = empty > 0 ? ` At ${empty} positions no cell is left; they return nothing.` : '';
  const spent = used > 0 ? ` ${used} placed cells are used inside such a region at ${frequencyHz / 1e9} GHz.` : '';
  const onward = carried > 0 ? ` At ${carried} positions the response is carried on from the angles described, by up to ${degreesText(degFromRad(carriedRad))}, because the next one is excluded.` : '';
  return [
    {
      code: 'region-excluded',
      pointer: '#/cells',
      severity: empty > 0 ? 'serious' : used > 0 ? 'warn' : 'note',
      message: `At ${narrowed} of ${cellIndex.length} positions the laboratory excludes some of the cells, and they were not chosen there.${left}${spent}${onward}`,
      numbers: { positions: narrowed, usedCells: used, emptyPositions: empty, carriedPositions: carried, carriedDeg: degFromRad(carriedRad) },
    },
  ];
}

/** How far an angle lies beyond the angles of a cell that are described and not excluded, at the azimuth nearest to it. */
function beyondPermittedRad({ edition }: EditionSite, permitted: PermittedNodes, at: { cell: number; incidenceRad: number; azimuthRad: number }): number {
  const { azimuths, smallestThetaRad, largestThetaRad } = edition;
  const range = at.cell * azimuths.cosines.length + nearestAzimuth(azimuths, at.azimuthRad);
  // Beyond all data the nearest angle stands in, which `incidenceWarning` counts.
  const incidenceRad = Math.min(largestThetaRad, Math.max(smallestThetaRad, at.incidenceRad));
  const beyondRad = Math.max(permitted.lowestRad[range] - incidenceRad, incidenceRad - permitted.highestRad[range], 0);
  return Number.isFinite(beyondRad) ? beyondRad : 0;
}

function periodWarning({ edition, si }: EditionSite): Warning[] {
  const { periodXMm, periodYMm, name } = edition.edition.description;
  const { lattice } = si.panel;
  const stepXMm = lattice.periodXM * 1000;
  const stepYMm = (lattice.kind === 'rectangular' ? lattice.periodYM : lattice.rowSpacingM) * 1000;
  const differs = Math.abs(stepXMm - periodXMm) > 1e-6 * periodXMm || Math.abs(stepYMm - periodYMm) > 1e-6 * periodYMm;
  if (!differs) return [];
  return [
    {
      code: 'period-differs',
      pointer: '#/panel/lattice',
      severity: 'warn',
      message: `${name} is described on a lattice of ${periodXMm} x ${periodYMm} mm; the panel's is ${stepXMm.toFixed(3)} x ${stepYMm.toFixed(3)} mm, so its cells see other neighbours.`,
      numbers: { periodXMm, periodYMm, stepXMm, stepYMm },
    },
  ];
}

function provenanceWarnings({ edition, si }: EditionSite): Warning[] {
  const { provenance, name, instrument, ports } = edition.edition.description;
  const warnings: Warning[] = [];
  if (provenance !== 'measured') {
    const message = `The cells of ${name} are ${provenance}, not measured (${instrument}).`;
    warnings.push({ code: 'provenance', pointer: '#/cells/editionId', severity: 'note', message, numbers: {} });
  }
  const { polarisation } = si.illumination;
  if ((ports === 'x' || ports === 'y') && polarisation !== ports) {
    const message = `${name} is described for ${ports} polarisation only; the panel is lit with ${polarisation}.`;
    warnings.push({ code: 'provenance', pointer: '#/illumination/polarisation', severity: 'warn', message, numbers: {} });
  }
  return warnings;
}
