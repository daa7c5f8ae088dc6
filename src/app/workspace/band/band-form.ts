import type { BandParameters } from '../../../../shared/model/band-run';
import type { DesignDocument } from '../../../../shared/model/design-document';

/** What is asked of the next band run, as it stands in the boxes of the sheet. Null is "as in the requirement", or "not moved". */
export interface BandForm {
  readonly fromGHz: number | null;
  readonly toGHz: number | null;
  readonly frequencyCount: number;
  readonly spatialPart: boolean;
  /** Offset of the phase centre towards the aim at the edges of the band. */
  readonly lowerOffsetMm: number | null;
  readonly upperOffsetMm: number | null;
}

export const FEWEST_FREQUENCIES = 3;
export const MOST_FREQUENCIES = 401;
export const FIRST_FORM: BandForm = { fromGHz: null, toGHz: null, frequencyCount: 21, spatialPart: true, lowerOffsetMm: null, upperOffsetMm: null };

/** The band that would be computed: each edge from its box, else from the requirement; null where there is none. */
export function bandOf(form: BandForm, design: DesignDocument): { readonly fromGHz: number; readonly toGHz: number } | null {
  const given = design.requirement.bandGHz;
  const fromGHz = form.fromGHz ?? given?.[0];
  const toGHz = form.toGHz ?? given?.[1];
  return fromGHz === undefined || toGHz === undefined ? null : { fromGHz, toGHz };
}

/** The form that asks what a run was asked. Phase centres that are not the two edges stand in no box. */
export function formOf({ bandGHz, frequencyCount, spatialPart, phaseCentre }: BandParameters): BandForm {
  return {
    fromGHz: bandGHz?.[0] ?? null,
    toGHz: bandGHz?.[1] ?? null,
    frequencyCount,
    spatialPart: spatialPart === true,
    lowerOffsetMm: phaseCentre?.[0][1] ?? null,
    upperOffsetMm: phaseCentre?.[phaseCentre.length - 1][1] ?? null,
  };
}

/** Why this cannot be started, in words for the button; null when it can. */
export function formFault(form: BandForm, design: DesignDocument): string | null {
  const band = bandOf(form, design);
  if (band === null) return 'Say the band here, or in the requirement';
  return band.fromGHz < band.toGHz ? null : `The band must rise; it goes from ${band.fromGHz} to ${band.toGHz} GHz`;
}

/** The parameters of the run. What is as in the requirement is left to it, so that equal questions have equal words. */
export function bandParametersOf(form: BandForm, design: DesignDocument): BandParameters {
  const band = bandOf(form, design);
  const isOwn = form.fromGHz !== null || form.toGHz !== null;
  const moves = design.illumination.kind === 'horn' && (form.lowerOffsetMm !== null || form.upperOffsetMm !== null);
  return {
    frequencyCount: form.frequencyCount,
    ...(isOwn && band !== null ? { bandGHz: [band.fromGHz, band.toGHz] as [number, number] } : {}),
    ...(form.spatialPart ? { spatialPart: true } : {}),
    ...(moves && band !== null ? { phaseCentre: [[band.fromGHz, form.lowerOffsetMm ?? 0], [band.toGHz, form.upperOffsetMm ?? 0]] as [number, number][] } : {}),
  };
}
