import { SPEED_OF_LIGHT_M_PER_S } from './constants';

it('gives the exact speed of light: 10 GHz is 29.9792458 mm long', () => {
  expect((SPEED_OF_LIGHT_M_PER_S / 10e9) * 1e3).toBeCloseTo(29.979_245_8, 12);
});
