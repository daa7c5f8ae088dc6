import type { ApertureField } from './aperture-field';
import { newFarFieldSample, type FarField, type FarFieldSample } from './far-field';
import type { FieldValue } from './interpolated-far-field';
import { rowShiftM } from './panel-lattice';

/** Exact sums over the cells, row by row with the powers of exp(j k stepX u) shared by all rows. */
export function exactFarField(field: ApertureField, wavenumber: number): FarField {
  const { grid } = field;
  const { columnCount, rowCount } = grid;
  const cosines = new Float64Array(columnCount);
  const sines = new Float64Array(columnCount);
  const rowRe = new Float64Array(rowCount);
  const rowIm = new Float64Array(rowCount);
  // Origin of x in the middle of the columns: phases of far terms stay small, and the derivatives well scaled.
  const middle = (columnCount - 1) / 2;
  const centreXM = grid.firstXM + middle * grid.stepXM;

  const fillPowers = (u: number): void => {
    const step = wavenumber * grid.stepXM * u;
    const start = -middle * step;
    // A product per column drifts by about 1e-16 each; starting afresh every 64 keeps large panels exact too.
    for (let c = 0; c < columnCount; c += 64) {
      let cosine = Math.cos(start + c * step);
      let sine = Math.sin(start + c * step);
      const stepCos = Math.cos(step);
      const stepSin = Math.sin(step);
      const end = Math.min(columnCount, c + 64);
      for (let i = c; i < end; i++) {
        cosines[i] = cosine;
        sines[i] = sine;
        [cosine, sine] = [cosine * stepCos - sine * stepSin, cosine * stepSin + sine * stepCos];
      }
    }
  };

  const fillRowSums = (u: number): void => {
    fillPowers(u);
    const { re, im } = field;
    for (let r = 0; r < rowCount; r++) {
      let sumRe = 0;
      let sumIm = 0;
      const from = r * columnCount;
      for (let c = 0; c < columnCount; c++) {
        const a = re[from + c];
        const b = im[from + c];
        sumRe += a * cosines[c] - b * sines[c];
        sumIm += a * sines[c] + b * cosines[c];
      }
      const shift = wavenumber * u * (centreXM + rowShiftM(grid, r));
      const shiftCos = Math.cos(shift);
      const shiftSin = Math.sin(shift);
      rowRe[r] = sumRe * shiftCos - sumIm * shiftSin;
      rowIm[r] = sumRe * shiftSin + sumIm * shiftCos;
    }
  };

  const value: FieldValue = { re: 0, im: 0 };
  const alongLine = (v: number): FieldValue =>
    columnSum({ re: rowRe, im: rowIm }, { startRad: wavenumber * grid.firstYM * v, stepRad: wavenumber * grid.stepYM * v }, value);
  const lineAt = (u: number): ((v: number) => FieldValue) => {
    fillRowSums(u);
    return alongLine;
  };
  const fieldAt = (u: number, v: number): FieldValue => lineAt(u)(v);
  const powerAt = (u: number, v: number): number => {
    const { re, im } = fieldAt(u, v);
    return re * re + im * im;
  };

  const derivatives = derivativeSums(field, wavenumber, { cosines, sines, fillPowers, middle });
  return { powerAt, fieldAt, lineAt, derivativesAt: derivatives };
}

/** Sum over rows of G_r exp(j (start + r step)), written into `out`. */
function columnSum(rows: { re: Float64Array; im: Float64Array }, { startRad, stepRad }: { startRad: number; stepRad: number }, out: FieldValue): FieldValue {
  let sumRe = 0;
  let sumIm = 0;
  let cosine = Math.cos(startRad);
  let sine = Math.sin(startRad);
  const stepCos = Math.cos(stepRad);
  const stepSin = Math.sin(stepRad);
  for (let r = 0; r < rows.re.length; r++) {
    sumRe += rows.re[r] * cosine - rows.im[r] * sine;
    sumIm += rows.re[r] * sine + rows.im[r] * cosine;
    const turned = cosine * stepCos - sine * stepSin;
    sine = cosine * stepSin + sine * stepCos;
    cosine = turned;
  }
  out.re = sumRe;
  out.im = sumIm;
  return out;
}

interface PowerTable {
  readonly cosines: Float64Array;
  readonly sines: Float64Array;
  readonly middle: number;
  fillPowers(u: number): void;
}

/**
 * Sums weighted by j k x and j k y and their products. The aperture's own centre is the origin: the derivatives then
 * belong to the field less a phase that |F| does not see.
 */
function derivativeSums(field: ApertureField, wavenumber: number, table: PowerTable): (u: number, v: number) => FarFieldSample {
  const { grid, re, im } = field;
  const { columnCount, rowCount } = grid;
  const { cosines, sines, middle } = table;
  const middleRow = (rowCount - 1) / 2;
  const sample = newFarFieldSample();
  return (u, v) => {
    table.fillPowers(u);
    for (const key of Object.keys(sample) as (keyof FarFieldSample)[]) sample[key] = 0;
    for (let r = 0; r < rowCount; r++) {
      let [re0, im0, re1, im1, re2, im2] = [0, 0, 0, 0, 0, 0];
      const shiftM = rowShiftM(grid, r);
      for (let c = 0; c < columnCount; c++) {
        const at = r * columnCount + c;
        const termRe = re[at] * cosines[c] - im[at] * sines[c];
        const termIm = re[at] * sines[c] + im[at] * cosines[c];
        const kx = wavenumber * ((c - middle) * grid.stepXM + shiftM);
        re0 += termRe;
        im0 += termIm;
        re1 += kx * termRe;
        im1 += kx * termIm;
        re2 += kx * kx * termRe;
        im2 += kx * kx * termIm;
      }
      const ky = wavenumber * (r - middleRow) * grid.stepYM;
      const phase = ky * v + wavenumber * shiftM * u;
      const cosine = Math.cos(phase);
      const sine = Math.sin(phase);
      addRow(sample, { cosine, sine, ky }, [re0, im0, re1, im1, re2, im2]);
    }
    return sample;
  };
}

function addRow(
  sample: FarFieldSample,
  { cosine, sine, ky }: { cosine: number; sine: number; ky: number },
  [re0, im0, re1, im1, re2, im2]: readonly [number, number, number, number, number, number],
): void {
  const fRe = re0 * cosine - im0 * sine;
  const fIm = re0 * sine + im0 * cosine;
  const xRe = re1 * cosine - im1 * sine;
  const xIm = re1 * sine + im1 * cosine;
  sample.re += fRe;
  sample.im += fIm;
  // Each derivative brings a factor j k x or j k y: j (a + j b) = -b + j a, and j^2 = -1.
  sample.uRe -= xIm;
  sample.uIm += xRe;
  sample.vRe -= ky * fIm;
  sample.vIm += ky * fRe;
  sample.uuRe -= re2 * cosine - im2 * sine;
  sample.uuIm -= re2 * sine + im2 * cosine;
  sample.uvRe -= ky * xRe;
  sample.uvIm -= ky * xIm;
  sample.vvRe -= ky * ky * fRe;
  sample.vvIm -= ky * ky * fIm;
}
