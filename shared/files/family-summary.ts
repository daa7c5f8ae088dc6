import type { FamilyDescription, PortMeaning } from '../model/cell-family';
import type { FamilySurroundings } from './family-facts';
import type { DetectedFamily, FamilyCurve, InspectedFile } from './family-inspection';
import type { FileFaults } from './file-faults';

/** The provenance in a file's own words. Invented data are never called simulated, however they were derived. */
export function provenanceIn(text: string): FamilyDescription['provenance'] | null {
  if (/invented|synthetic|fictional/i.test(text)) return 'invented';
  if (/simulat|full.?wave|fdtd|method of moments/i.test(text)) return 'simulated';
  if (/analytic|closed.form/i.test(text)) return 'analytic';
  return /measured|measurement/i.test(text) && !/not a measurement/i.test(text) ? 'measured' : null;
}

/** What the words about ports mean, as far as they are clear. */
export function portsIn(text: string): PortMeaning | null {
  if (/\bTE\b/.test(text) && /\bTM\b/.test(text)) return 'te-and-tm';
  if (/port\s?1\s?=\s?x/i.test(text) && /port\s?2\s?=\s?y/i.test(text)) return 'x-and-y';
  if (/^either\b/i.test(text)) return 'either';
  if (/^x\b/i.test(text)) return 'x';
  return /^y\b/i.test(text) ? 'y' : null;
}

export interface SummaryInput {
  readonly files: readonly InspectedFile[];
  readonly curves: readonly FamilyCurve[];
  readonly surroundings: readonly FamilySurroundings[];
  readonly description: Partial<FamilyDescription>;
  readonly parameterNames?: readonly string[];
  readonly timeConvention?: FamilyDescription['timeConvention'];
}

/** Joins what the files say one by one into what they say of the family, and reports where they disagree. */
export function summariseFamily(input: SummaryInput, faults: FileFaults): DetectedFamily {
  const { files, curves, description } = input;
  const parameterNames = input.parameterNames ?? varyingParameters(curves);
  const frequenciesHz = distinct(curves.flatMap((curve) => Array.from(curve.frequenciesHz)));
  const timeConventionHint = input.timeConvention ?? onlyOne(files.flatMap((file) => file.timeConvention ?? []), 'time conventions', faults) ?? description.timeConvention ?? null;
  const portsHint = onlyOne(files.flatMap((file) => portsIn(file.polarisation ?? '') ?? []), 'meanings of the ports', faults) ?? description.ports ?? null;
  const provenanceHint = provenanceOf(files) ?? description.provenance ?? null;
  const range = frequenciesHz.length === 0 ? null : { from: frequenciesHz[0] / 1e9, to: frequenciesHz[frequenciesHz.length - 1] / 1e9 };
  return {
    portCount: Math.max(0, ...new Set(curves.map((curve) => curve.portCount))),
    parameterNames,
    thetasDeg: distinct(curves.map((curve) => curve.thetaDeg)),
    phisDeg: distinct(curves.map((curve) => curve.phiDeg)),
    frequencyRangeGHz: range,
    frequencyCount: frequenciesHz.length,
    cellCount: new Set(curves.map((curve) => curve.cellId)).size,
    portsHint,
    provenanceHint,
    timeConventionHint,
    descriptionHint: {
      ...surroundingsHint(input.surroundings, faults),
      ...(parameterNames.length > 0 && parameterNames.length <= 4 ? { parameters: parameterNames.map((id) => ({ id, label: wordsOf(id), unit: 'mm' as const })) } : {}),
      ...(range === null ? {} : middleFrequency(input.surroundings, range)),
      ...(portsHint === null ? {} : { ports: portsHint }),
      ...(provenanceHint === null ? {} : { provenance: provenanceHint }),
      ...(timeConventionHint === null ? {} : { timeConvention: timeConventionHint }),
      ...description,
    },
  };
}

/** Invented data among simulated ones make the whole invented: the weaker word holds. */
function provenanceOf(files: readonly InspectedFile[]): FamilyDescription['provenance'] | null {
  const found = files.flatMap((file) => (file.provenance === undefined ? [] : (provenanceIn(file.provenance) ?? [])));
  const order = ['invented', 'analytic', 'simulated', 'measured'] as const;
  return order.find((kind) => found.includes(kind)) ?? null;
}

/** Parameters whose value differs between cells; all of them when there is one cell only. */
function varyingParameters(curves: readonly FamilyCurve[]): string[] {
  const valuesOf = new Map<string, Set<number>>();
  for (const { parametersMm } of curves)
    for (const { name, value } of parametersMm) valuesOf.set(name, (valuesOf.get(name) ?? new Set()).add(value));
  const names = [...valuesOf.keys()];
  const varying = names.filter((name) => (valuesOf.get(name)?.size ?? 0) > 1);
  const kept = varying.length > 0 ? varying : names;
  return kept.filter((name, i) => !kept.slice(0, i).some((earlier) => isMultiple(curves, earlier, name)));
}

/** A length that is a fixed fraction of another one is drawn from it and is no parameter of its own. */
function isMultiple(curves: readonly FamilyCurve[], earlier: string, name: string): boolean {
  const pairs = curves.flatMap(({ parametersMm }) => {
    const a = parametersMm.find((parameter) => parameter.name === earlier)?.value;
    const b = parametersMm.find((parameter) => parameter.name === name)?.value;
    return a === undefined || b === undefined || a === 0 ? [] : [b / a];
  });
  // Files print a few decimals, so the ratio is only as constant as their rounding.
  return new Set(pairs).size > 0 && curves.length > 2 && Math.max(...pairs) - Math.min(...pairs) < 1e-3 * Math.abs(pairs[0]);
}

function wordsOf(id: string): string {
  const words = id.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase();
  return words[0].toUpperCase() + words.slice(1);
}

function surroundingsHint(all: readonly FamilySurroundings[], faults: FileFaults): Partial<FamilyDescription> {
  const period = onlyOne(all.flatMap((one) => one.periodMm ?? []), 'periods', faults);
  const thickness = onlyOne(all.flatMap((one) => one.thicknessMm ?? []), 'thicknesses', faults);
  const permittivity = onlyOne(all.flatMap((one) => one.relativePermittivity ?? []), 'permittivities', faults);
  const loss = onlyOne(all.flatMap((one) => one.lossTangent ?? []), 'loss tangents', faults);
  const material = onlyOne(all.flatMap((one) => one.material ?? []), 'materials', faults) ?? 'not named in the files';
  const hasSubstrate = thickness !== null && permittivity !== null && loss !== null;
  return {
    ...(period === null ? {} : { periodXMm: period, periodYMm: period }),
    ...(hasSubstrate ? { substrate: { material, relativePermittivity: permittivity, lossTangent: loss, thicknessMm: thickness } } : {}),
  };
}

function middleFrequency(all: readonly FamilySurroundings[], range: { readonly from: number; readonly to: number }): Partial<FamilyDescription> {
  const stated = new Set(all.flatMap((one) => one.designFrequencyGHz ?? []));
  return { designFrequencyGHz: stated.size === 1 ? [...stated][0] : Number(((range.from + range.to) / 2).toPrecision(12)) };
}

function onlyOne<T extends string | number>(found: readonly T[], what: string, faults: FileFaults): T | null {
  const values = [...new Set(found)];
  if (values.length > 1) faults.warn(0, `The files name different ${what}: ${values.slice(0, 5).join(', ')}`, 'Say which holds');
  return values.length === 1 ? values[0] : null;
}

function distinct(values: readonly number[]): number[] {
  return [...new Set(values)].sort((a, b) => a - b);
}
