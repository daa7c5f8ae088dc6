import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import type { PredictedCells } from '../live-prediction-data';
import { SAMPLE_HEAD } from '../sample-prediction';
import { cellCosts } from './cell-costs';

describe('cellCosts', () => {
  it('lists losses and the worst of the errors', () => {
    const cells = { errorDeg: Float64Array.of(-18.5, 3, 16) } as unknown as PredictedCells;
    const costs = cellCosts({ head: SAMPLE_HEAD, cells, cuts: [], uv: null, of: STARTING_DESIGN });
    expect(Object.fromEntries(costs.map(({ name, value }) => [name, value]))).toEqual({
      'RMS phase error': '4.48°',
      'Largest phase error': '18.50°',
      'Cells off by more than 15°': '2 of 1\u00a0600',
      'Phase loss': '−0.030 dB',
      'Cell loss': '−0.210 dB',
      'Reference phase in use': '0.0°',
    });
  });
});
