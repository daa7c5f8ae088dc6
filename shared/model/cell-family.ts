import './zod-jitless';
import * as z from 'zod';

/** A family of unit cells as its laboratory describes it. Lengths in mm, frequencies in GHz, angles in degrees. */

const name = z.string().trim().min(1).max(120);
const prose = z.string().trim().max(4000);
const positiveMm = z.number().gt(0).max(1000);

/** A length in a shape: a number (mm) or "<factor> <parameter>" as its two parts. */
export const shapeLength = z.union([
  z.number().min(0).max(1000),
  z.strictObject({ parameter: z.string().min(1).max(40), factor: z.number().min(-10).max(10), plusMm: z.number().min(-100).max(100).optional() }),
]);

/** Copper shapes centred in the cell, drawn in order; `hole` removes copper. */
export const cellShape = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('rectangle'), widthMm: shapeLength, heightMm: shapeLength, hole: z.boolean().optional() }),
  z.strictObject({ kind: z.literal('ring'), outerMm: shapeLength, stripMm: shapeLength }),
  z.strictObject({ kind: z.literal('disc'), diameterMm: shapeLength, hole: z.boolean().optional() }),
]);

export const provenanceKind = z.enum(['measured', 'simulated', 'analytic', 'invented']);

/** What the two ports of a response mean. */
export const portMeaning = z.enum(['either', 'x', 'y', 'x-and-y', 'te-and-tm']);

export const familyDescription = z.strictObject({
  name,
  kind: z.string().trim().min(1).max(80),
  summary: prose,
  operation: z.enum(['reflect', 'transmit']),
  periodXMm: positiveMm,
  periodYMm: positiveMm,
  substrate: z.strictObject({
    material: z.string().trim().min(1).max(120),
    relativePermittivity: z.number().min(1).max(100),
    lossTangent: z.number().min(0).max(1),
    thicknessMm: positiveMm,
    note: prose.optional(),
  }),
  metal: z.string().trim().max(200),
  parameters: z
    .array(z.strictObject({ id: z.string().regex(/^[A-Za-z][A-Za-z0-9]{0,39}$/), label: name, unit: z.literal('mm') }))
    .min(1)
    .max(4),
  shapes: z.array(cellShape).max(20),
  /** Where the phase range and gaps are judged. */
  designFrequencyGHz: z.number().min(1).max(1000),
  ports: portMeaning,
  referencePlane: z.string().trim().min(1).max(400),
  timeConvention: z.enum(['exp(+jwt)', 'exp(-jwt)']),
  provenance: provenanceKind,
  instrument: z.string().trim().min(1).max(400),
  date: z.iso.date(),
  limits: prose,
  licence: prose.optional(),
  /** Regions the laboratory says not to use; the checks and the designer's warnings respect them. */
  excludedRegions: z
    .array(
      z.strictObject({
        reason: z.string().trim().min(1).max(400),
        fromGHz: z.number().optional(),
        toGHz: z.number().optional(),
        fromThetaDeg: z.number().optional(),
        toThetaDeg: z.number().optional(),
        /** Restricts the region to values of the first parameter from here up. */
        fromParameterMm: z.number().optional(),
        /** Azimuths of incidence it concerns; all when absent. */
        phisDeg: z.array(z.number()).max(64).optional(),
      }),
    )
    .max(100),
});

/** One cell of an edition: its name and the values of the family's parameters in their order. */
export const cellEntry = z.strictObject({
  id: z.string().min(1).max(200),
  parametersMm: z.array(z.number()),
  /** SHA-256 of the original files this cell was read from. */
  fileHashes: z.array(z.string()),
});

export const qualityVerdict = z.enum(['pass', 'warn', 'fail', 'not-evaluated']);

export const qualityFinding = z.strictObject({
  /** Which check speaks: passivity, phase-range, largest-gap, missing-points, duplicate-points, phase-jump, outlier, phase-slope, coverage, excluded-region, reciprocity, noise, reference-plane, repeatability. */
  check: z.string(),
  verdict: qualityVerdict,
  /** What was found, with numbers and units. */
  detail: z.string(),
  cellId: z.string().optional(),
  /** Where the numbers came from, as far as the finding speaks of one place. */
  file: z.string().optional(),
  line: z.number().int().optional(),
  value: z.number().optional(),
  limit: z.number().optional(),
});

export const cellQuality = z.strictObject({ cellId: z.string(), verdict: qualityVerdict, findings: z.array(qualityFinding) });

export const qualityReport = z.strictObject({
  verdict: qualityVerdict,
  family: z.array(qualityFinding),
  cells: z.array(cellQuality),
});

export type ShapeLength = z.infer<typeof shapeLength>;
export type CellShape = z.infer<typeof cellShape>;
export type FamilyDescription = z.infer<typeof familyDescription>;
export type CellEntry = z.infer<typeof cellEntry>;
export type QualityVerdict = z.infer<typeof qualityVerdict>;
export type QualityFinding = z.infer<typeof qualityFinding>;
export type CellQuality = z.infer<typeof cellQuality>;
export type QualityReport = z.infer<typeof qualityReport>;
export type PortMeaning = z.infer<typeof portMeaning>;

/**
 * The complex responses of an edition on a full grid, in SI and radians, exp(+j omega t).
 * `values` holds re, im pairs in the order [cell][theta][phi][frequency][S11, S21, S12, S22];
 * a one-port family repeats S11 in S22 with zero cross terms. `present` is 0 where a point was never given.
 */
export interface CellResponseTable {
  readonly cellCount: number;
  readonly frequenciesHz: Float64Array;
  readonly thetasRad: Float64Array;
  readonly phisRad: Float64Array;
  readonly values: Float64Array;
  /** One byte per [cell][theta][phi][frequency]. */
  readonly present: Uint8Array;
}

/** What the engine needs to know of an edition. */
export interface CellEdition {
  readonly description: FamilyDescription;
  readonly cells: readonly CellEntry[];
  readonly responses: CellResponseTable;
}
