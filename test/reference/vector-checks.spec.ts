import { loadChecks } from './published-check';
import { cellMatrixChecks } from './tables/cell-matrix-checks';
import { vectorChecks } from './tables/vector-checks';
import { vectorFormChecks } from './tables/vector-form-checks';
import { vectorSpecialChecks } from './tables/vector-special-checks';

const tables = { ...vectorChecks, ...cellMatrixChecks, ...vectorFormChecks, ...vectorSpecialChecks };

describe('published checks of the vector model', () => {
  for (const check of loadChecks().filter(({ id }) => id in tables)) {
    it(`${check.id}: ${check.what} [${check.source}]`, () => tables[check.id](check));
  }
});
