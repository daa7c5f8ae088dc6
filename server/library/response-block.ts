import { readBinaryBlock, writeBinaryBlock } from '../../shared/contracts/binary-block';
import type { CellResponseTable } from '../../shared/model/cell-family';

/** The response table as bytes, in the very form in which it travels. Inverse: {@link readResponseBlock}. */
export function writeResponseBlock(editionId: string, table: CellResponseTable): Uint8Array {
  const { cellCount, frequenciesHz, thetasRad, phisRad, values, present } = table;
  return writeBinaryBlock({ editionId, cellCount }, { frequenciesHz, thetasRad, phisRad, values, present });
}

export function readResponseBlock(bytes: Uint8Array): CellResponseTable {
  // The views need a buffer that starts at a multiple of eight.
  const { head, arrays } = readBinaryBlock(bytes.slice().buffer);
  const { cellCount } = head as { cellCount: number };
  const doubles = (name: string): Float64Array => {
    const array = arrays[name];
    if (!(array instanceof Float64Array)) throw new Error(`the stored responses lack ${name}`);
    return array;
  };
  const present = arrays['present'];
  if (!(present instanceof Uint8Array)) throw new Error('the stored responses lack present');
  return {
    cellCount,
    frequenciesHz: doubles('frequenciesHz'),
    thetasRad: doubles('thetasRad'),
    phisRad: doubles('phisRad'),
    values: doubles('values'),
    present,
  };
}
