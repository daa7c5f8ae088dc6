import type { EditionHeader, FamilySummary } from '../../../shared/contracts/library';

const list = (values: readonly number[]): string => values.map((value) => String(value)).join(', ');

/** "24 to 32 GHz". */
export const bandText = ({ fromGHz, toGHz }: Pick<EditionHeader, 'fromGHz' | 'toGHz'>): string => `${rounded(fromGHz)} to ${rounded(toGHz)} GHz`;

/** What angles of incidence an edition covers, in words that do not promise more. */
export function angleText({ thetasDeg, phisDeg }: Pick<EditionHeader, 'thetasDeg' | 'phisDeg'>): string {
  if (thetasDeg.length === 1 && thetasDeg[0] === 0) return 'normal incidence only';
  const azimuths = phisDeg.length > 1 ? `, φ ${list(phisDeg)}°` : '';
  return `θ ${list(thetasDeg)}°${azimuths}`;
}

export const periodText = ({ periodXMm, periodYMm }: Pick<FamilySummary, 'periodXMm' | 'periodYMm'>): string =>
  periodXMm === periodYMm ? `${periodXMm} mm` : `${periodXMm} × ${periodYMm} mm`;

export const editionText = ({ number }: Pick<EditionHeader, 'number'>): string => (number === null ? 'accepted, not published' : `edition ${number}`);

const rounded = (value: number): string => String(Number(value.toPrecision(5)));
