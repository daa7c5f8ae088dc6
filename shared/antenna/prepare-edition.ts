import type { CellEdition } from '../model/cell-family';

export interface PreparedEdition {
  readonly edition: CellEdition;
}
export function prepareEdition(edition: CellEdition): PreparedEdition {
  return { edition };
}
