import { loadChecks } from './published-check';
import { vectorPanelChecks } from './tables/vector-panel-checks';

describe('published checks of whole panels in the vector model', () => {
  for (const check of loadChecks().filter(({ id }) => id in vectorPanelChecks)) {
    it(`${check.id}: ${check.what} [${check.source}]`, () => vectorPanelChecks[check.id](check));
  }
});
