import type { Cells } from '../model/design-document';
import type { CellStock, StockSite } from './cell-stock';
import { InvalidDesign } from './invalid-design';

export function editionStock(_cells: Extract<Cells, { kind: 'edition' }>, _site: StockSite): CellStock {
  throw new InvalidDesign([{ pointer: '#/cells/editionId', detail: 'the engine predicts ideal and inline cells only' }]);
}
