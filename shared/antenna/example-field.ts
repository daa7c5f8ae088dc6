import type { ApertureField } from './aperture-field';
import type { LatticeGrid } from './panel-lattice';

/** An aperture with made-up amplitudes and phases on a grid of any shape; every seventh place is empty. Invented, for checks. */
export function exampleField(grid: Partial<LatticeGrid> = {}, seed = 1): ApertureField {
  const full: LatticeGrid = { columnCount: 7, rowCount: 5, firstXM: -0.04, firstYM: -0.025, stepXM: 0.013, stepYM: 0.011, stagger: 'none', ...grid };
  const re = new Float64Array(full.columnCount * full.rowCount);
  const im = new Float64Array(re.length);
  for (let i = 0; i < re.length; i++) {
    if (i % 7 === 6) continue;
    const size = 1 + 0.5 * Math.sin(seed + 3 * i);
    const phase = 0.4 * i + Math.sin(seed * 2 + i * i);
    re[i] = size * Math.cos(phase);
    im[i] = size * Math.sin(phase);
  }
  return { grid: full, re, im };
}

/** F(u, v) as a plain double sum over the places of the grid: slow and obvious. */
export function plainSum(field: ApertureField, wavenumber: number, u: number, v: number): { re: number; im: number } {
  const { grid } = field;
  let re = 0;
  let im = 0;
  field.re.forEach((a, i) => {
    const row = Math.floor(i / grid.columnCount);
    const shifted = grid.stagger !== 'none' && (row % 2 === 0) === (grid.stagger === 'even');
    const x = grid.firstXM + ((i % grid.columnCount) + (shifted ? 0.5 : 0)) * grid.stepXM;
    const y = grid.firstYM + row * grid.stepYM;
    const phase = wavenumber * (x * u + y * v);
    re += a * Math.cos(phase) - field.im[i] * Math.sin(phase);
    im += a * Math.sin(phase) + field.im[i] * Math.cos(phase);
  });
  return { re, im };
}
