import { besselJ, besselRatio, gamma } from './bessel';

/** Values of scipy.special.jv 1.17.1, a general-purpose numerical library. */
const Z = [0.1, 3, 7, 12, 20, 26, 60, 400.5];
const VALUES: [number, number[]][] = [
  [0, [0.9975015620660401, -0.2600519549019334, 0.30007927051955563, 0.04768931079683349, 0.16702466434058322, 0.1559993155224211, -0.09147180408906189, -0.029655743148837885]],
  [0.5, [0.2518929403260012, 0.06500818287737592, 0.198128774076346, -0.12358853595594424, 0.16288076385503125, 0.1193236489339746, -0.03139746118252042, -0.03981320030513265]],
  [1, [0.049937526036242005, 0.33905895852593626, -0.0046828234823457346, -0.22344710449062757, 0.06683312417584993, 0.015045730586915808, 0.04659838375816632, -0.02668471074872311]],
  [1.5, [0.008402034301500154, 0.4777182150870922, -0.19905171329249458, -0.20466344849653376, -0.06466286659231113, -0.0966392941227153, 0.09758139271532926, 0.002015197437458894]],
  [2.3, [0.00037897495018145714, 0.4483175812236765, -0.30454084161561684, 0.00983591689774125, -0.17894170175288127, -0.1501132326561466, 0.06365611179190139, 0.038452835191048654]],
  [6, [2.169363960375998e-11, 0.011393932332213062, 0.3391966049831796, -0.24372476722886657, -0.0550860495636659, -0.11366042820876646, 0.10164054540455696, 0.028430127959747628]],
  [10.5, [1.8346985880035584e-21, 4.872854864420824e-06, 0.014204915635445216, 0.29469968409769026, 0.14161199228473198, -0.021323336922426522, 0.09779053292411871, 0.03973464250393505]],
];

describe('Bessel functions of real order', () => {
  it.each(VALUES)('equals the library values for order %d in all three ranges', (order, expected) => {
    Z.forEach((z, i) => {
      const error = Math.abs(besselJ(order, z) - expected[i]);
      expect(error).toBeLessThan(1e-13 + 1e-11 * Math.abs(expected[i]));
    });
  });

  it('is sin z / z for order one half after division by its first term', () => {
    for (const z of [1e-9, 0.5, 4.2, 11, 24.9, 25.1, 300]) expect(besselRatio(0.5, z)).toBeCloseTo(Math.sin(z) / z, 13);
  });

  it('is 1 at the origin and even', () => {
    expect(besselRatio(1.7, 0)).toBe(1);
    expect(besselRatio(1.7, -3)).toBe(besselRatio(1.7, 3));
    expect(besselJ(0, 0)).toBe(1);
    expect(besselJ(2, 0)).toBe(0);
  });

  it('joins its ranges without a step', () => {
    for (const order of [0.5, 1, 3.2]) {
      for (const edge of [Math.sqrt(12 * (order + 1)), 25]) {
        expect(besselRatio(order, edge - 1e-9)).toBeCloseTo(besselRatio(order, edge + 1e-9), 9);
      }
    }
  });

  it('gives factorials and the square root of pi from the gamma function', () => {
    expect(gamma(5)).toBeCloseTo(24, 11);
    expect(gamma(11) / 3628800).toBeCloseTo(1, 13);
    expect(gamma(0.5)).toBeCloseTo(Math.sqrt(Math.PI), 13);
    expect(gamma(0.25)).toBeCloseTo(3.625609908221908, 12);
  });
});
