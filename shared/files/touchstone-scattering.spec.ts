import { encodeAscii } from './file-text';
import { readTouchstone } from './touchstone-reader';
import { toScattering } from './touchstone-scattering';

function scattering(text: string, fileName: string): number[] | string {
  const result = readTouchstone(encodeAscii(text), fileName);
  if (result.kind === 'refused') throw new Error(JSON.stringify(result.messages));
  const converted = toScattering(result.data);
  return converted.kind === 'scattering' ? Array.from(converted.values) : converted.reason;
}

function expectClose(got: number[] | string, expected: readonly number[]): void {
  if (typeof got === 'string') throw new Error(got);
  expect(got.length).toBe(expected.length);
  got.forEach((value, i) => expect(value).toBeCloseTo(expected[i], 12));
}

describe('toScattering', () => {
  it('leaves S as it is', () => {
    expect(scattering('# GHz S RI R 50\n1 0.25 -0.5\n', 'a.s1p')).toEqual([0.25, -0.5]);
  });

  it('gives an open of 100 ohm on 50 ohm as 1/3', () => {
    expectClose(scattering('# GHz Z RI R 50\n1 2 0\n', 'a.s1p'), [1 / 3, 0]);
    expectClose(scattering('# GHz Y RI R 50\n1 0.5 0\n', 'a.s1p'), [1 / 3, 0]);
  });

  it('gives a series resistance of 50 ohm between 50 ohm ports as 1/3 and 2/3', () => {
    // Y of a series element 1/R: [[1, -1], [-1, 1]] / R; textbook S11 = R / (R + 2 R0), S21 = 2 R0 / (R + 2 R0).
    expectClose(scattering('# GHz Y RI R 50\n1 1 0 -1 0 -1 0 1 0\n', 'a.s2p'), [1 / 3, 0, 2 / 3, 0, 2 / 3, 0, 1 / 3, 0]);
  });

  it('gives a shunt reactance its textbook S between unequal ports', () => {
    // Z of a shunt element Zs: all four terms Zs. S11 = (Zs || R2 - R1) / (Zs || R2 + R1).
    const parallel = { re: 0.5 * 75, im: 0.5 * 75 }; // j75 || 75
    const denominator = (parallel.re + 50) ** 2 + parallel.im ** 2;
    const s11 = [((parallel.re - 50) * (parallel.re + 50) + parallel.im ** 2) / denominator, (parallel.im * (parallel.re + 50) - (parallel.re - 50) * parallel.im) / denominator];
    const text = '[Version] 2.0\n# GHz Z RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n[Reference] 50 75\n[Network Data]\n1 0 75 0 75 0 75 0 75\n[End]\n';
    const got = scattering(text, 'a.ts');
    expectClose(typeof got === 'string' ? got : got.slice(0, 2), s11);
  });

  it('says why hybrid terms and singular points have no S', () => {
    expect(scattering('# GHz H RI R 50\n1 1 0 0 0 0 0 1 0\n', 'a.s2p')).toMatch(/^H terms are not turned into S/);
    expect(scattering('# GHz Z RI R 50\n1 -1 0\n', 'a.s1p')).toBe('Z at 1000000000 Hz has no S-parameters');
  });
});
