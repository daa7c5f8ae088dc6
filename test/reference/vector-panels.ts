import { placeCells, type PlacedDesign } from '../../shared/antenna/place-cells';
import { prepareEdition, type PreparedEdition } from '../../shared/antenna/prepare-edition';
import { EXAMPLE_EDITION_ID } from '../../shared/antenna/example-edition';
import type { ExactFieldQuery } from '../../shared/antenna/vector/exact-vector-field';
import type { VectorForm } from '../../shared/antenna/vector/vector-pattern';
import type { SiHorn } from '../../shared/antenna/si-design';
import { siDesign } from '../../shared/antenna/si-design';
import { assembleEdition } from '../../shared/files/edition-assembly';
import { inspectFamilyFiles } from '../../shared/files/family-import';
import type { DesignDocument } from '../../shared/model/design-document';
import { wavenumberRadPerM } from '../../shared/waves/conventions';
import { cellFilesOf, descriptionOf } from '../support/cell-files';
import { numberIn, numbersIn } from './published-check';
import { testDesign } from './test-designs';

type Fields = Readonly<Record<string, unknown>>;

let prepared: PreparedEdition | undefined;

/** The oblique square patches of period 5 mm, read once from the project's own library. */
export function obliquePatches(): PreparedEdition {
  if (prepared) return prepared;
  const folder = 'square-patch-5-oblique';
  const assembled = assembleEdition(inspectFamilyFiles(cellFilesOf(folder)), descriptionOf(folder));
  if (assembled.kind !== 'edition') throw new Error(JSON.stringify(assembled.messages));
  prepared = prepareEdition(assembled.edition);
  return prepared;
}

export function fieldsIn(record: Fields, name: string): Fields {
  return record[name] as Fields;
}

export function hornIn(record: Fields): Extract<DesignDocument['illumination'], { kind: 'horn' }> {
  const [x, y, z] = numbersIn(record, 'pos_mm');
  const [ax, ay, az] = numbersIn(record, 'aim_mm');
  const polarisation = record['pol'] as DesignDocument['illumination']['polarisation'];
  return { kind: 'horn', positionMm: [x, y, z], aimMm: [ax, ay, az], exponentE: numberIn(record, 'qE'), exponentH: numberIn(record, 'qH'), polarisation };
}

export function siHornIn(record: Fields): SiHorn {
  const { illumination } = siDesign(testDesign({ frequencyGHz: 28, periodMm: 5, columns: 2, rows: 2, illumination: hornIn(record) }));
  if (illumination.kind !== 'horn') throw new Error('no horn');
  return illumination;
}

export type VectorOptions = Pick<DesignDocument['prediction'], 'reradiation' | 'cellFactor'>;

/** The design of a panel check, to be predicted by the vector model. The wanted polarisation is the horn's unless the beam names one. */
export function vectorDesign(inputs: Fields, options: VectorOptions, more: Partial<Fields> = {}): DesignDocument {
  const all = { ...inputs, ...more };
  const horn = hornIn(fieldsIn(all, 'horn'));
  const beam = fieldsIn(all, 'beam');
  const design = testDesign({
    frequencyGHz: numberIn(all, 'f0_GHz'),
    periodMm: numberIn(all, 'period_mm'),
    columns: numberIn(all, 'nx'),
    rows: numberIn(all, 'ny'),
    beams: [{ thetaDeg: numberIn(beam, 'theta'), phiDeg: numberIn(beam, 'phi') }],
    illumination: horn,
    cells: all['cells'] === 'k5' ? { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [] } : { kind: 'ideal', levels: null },
  });
  const polarisation = (beam['pol'] ?? horn.polarisation) as DesignDocument['requirement']['polarisation'];
  return {
    ...design,
    requirement: { ...design.requirement, polarisation },
    panel: { ...design.panel, operation: horn.positionMm[2] > 0 ? 'reflect' : 'transmit' },
    prediction: { ...design.prediction, model: 'vector', ...options },
  };
}

export function placeVector(design: DesignDocument): PlacedDesign & { readonly vector: NonNullable<PlacedDesign['vector']> } {
  const placed = placeCells(design, design.cells.kind === 'edition' ? obliquePatches() : undefined);
  if (!placed.vector) throw new Error('the design is not predicted by the vector model');
  return { ...placed, vector: placed.vector };
}

/** The placed cells in another form of re-radiation. */
export function inForm<P extends ReturnType<typeof placeVector>>(placed: P, form: Partial<VectorForm>): P {
  return { ...placed, vector: { ...placed.vector, form: { ...placed.vector.form, ...form } } };
}

/** The exact sum over the cells of a placed design. */
export function exactQuery(placed: ReturnType<typeof placeVector>, options: Pick<ExactFieldQuery, 'reradiation' | 'cellFactor'>): ExactFieldQuery {
  const { lattice, light, vector, si, assignment } = placed;
  return {
    lattice,
    sideXM: lattice.grid.stepXM,
    sideYM: lattice.grid.stepYM,
    light: vector.waves,
    pathM: light.pathM,
    leaving: vector.stock.leaving(assignment, si.designFrequencyHz),
    wavenumber: wavenumberRadPerM(si.designFrequencyHz),
    beam: si.beams[0].direction,
    ...options,
  };
}

/** Product index of a cell counted with x outer, as the reference programs count. */
export function rowByRow(index: number, columns: number, rows: number): number {
  return (index % rows) * columns + Math.floor(index / rows);
}
