import type { CellEdition } from '../../shared/model/cell-family';

/**
 * The edition with its numbers in shared memory: handing it to a thread then copies a reference, however large it is.
 * The names of original files stay behind; the engine asks for none.
 */
export function shareEdition({ description, cells, responses }: CellEdition): CellEdition {
  return {
    description,
    cells: cells.map(({ id, parametersMm }) => ({ id, parametersMm, fileHashes: [] })),
    responses: {
      cellCount: responses.cellCount,
      frequenciesHz: sharedNumbers(responses.frequenciesHz),
      thetasRad: sharedNumbers(responses.thetasRad),
      phisRad: sharedNumbers(responses.phisRad),
      values: sharedNumbers(responses.values),
      present: sharedBytes(responses.present),
    },
  };
}

/** Bytes an edition holds in memory, near enough to bound a shelf of them. */
export function editionBytes({ responses }: CellEdition): number {
  return responses.values.byteLength + responses.present.byteLength;
}

function sharedNumbers(numbers: Float64Array): Float64Array {
  const shared = new Float64Array(new SharedArrayBuffer(numbers.byteLength));
  shared.set(numbers);
  return shared;
}

function sharedBytes(bytes: Uint8Array): Uint8Array {
  const shared = new Uint8Array(new SharedArrayBuffer(bytes.byteLength));
  shared.set(bytes);
  return shared;
}
