import * as fc from 'fast-check';
import type { CellEdition, FamilyDescription, QualityFinding, QualityReport } from '../model/cell-family';
import { radFromDeg } from '../units/angles';
import { CELL_CHECKS, judgeEdition, worstVerdict } from './cell-quality';
import { largestGapDeg, outsideNeighboursRad } from './cell-quality-parameter';
import { largestSingularValue } from './cell-quality-passivity';
import { gridReflection } from './grid-model';

const SIZES_MM = [0.3, 0.5, 0.7, 0.9, 1.1, 1.3, 1.5, 1.6, 1.7, 1.75, 1.8, 1.85, 1.9, 1.95, 1.97];
const FREQUENCIES_HZ = Float64Array.from({ length: 41 }, (_, i) => 8e9 + i * 0.2e9);

const description: FamilyDescription = {
  name: 'Analytic patch grid',
  kind: 'square patch',
  summary: '',
  operation: 'reflect',
  periodXMm: 2,
  periodYMm: 2,
  substrate: { material: 'slab', relativePermittivity: 10.2, lossTangent: 0.002, thicknessMm: 1 },
  metal: '',
  parameters: [{ id: 'patchSide', label: 'Patch side', unit: 'mm' }],
  shapes: [],
  designFrequencyGHz: 12,
  ports: 'either',
  referencePlane: 'patch plane',
  timeConvention: 'exp(+jwt)',
  provenance: 'analytic',
  instrument: 'grid model',
  date: '2026-12-01',
  limits: '',
  excludedRegions: [],
};

interface SampleChange {
  readonly description?: Partial<FamilyDescription>;
  readonly sizesMm?: readonly number[];
  readonly thetasDeg?: readonly number[];
}

/** A family from the analytic grid model; a two-mode family carries TE in S11 and TM in S22. */
function sample(change: SampleChange = {}): CellEdition {
  const { sizesMm = SIZES_MM, thetasDeg = [0] } = change;
  const points = sizesMm.length * thetasDeg.length * FREQUENCIES_HZ.length;
  const values = new Float64Array(8 * points);
  let point = 0;
  for (const sizeMm of sizesMm)
    for (const thetaDeg of thetasDeg)
      for (const frequencyHz of FREQUENCIES_HZ) {
        const grid = { periodM: 2e-3, gapM: (2 - sizeMm) / 1e3, thicknessM: 1e-3, relativePermittivity: 10.2, lossTangent: 0.002 };
        const [te, tm] = (['te', 'tm'] as const).map((polarisation) => gridReflection(grid, { frequencyHz, thetaRad: radFromDeg(thetaDeg), polarisation }));
        values.set([te.re, te.im, 0, 0, 0, 0, tm.re, tm.im], 8 * point);
        point += 1;
      }
  return {
    description: { ...description, ...change.description },
    cells: sizesMm.map((value, i) => ({ id: `cell-${i}`, parametersMm: [value], fileHashes: [] })),
    responses: {
      cellCount: sizesMm.length,
      frequenciesHz: FREQUENCIES_HZ,
      thetasRad: Float64Array.from(thetasDeg, radFromDeg),
      phisRad: Float64Array.of(0),
      values,
      present: new Uint8Array(points).fill(1),
    },
  };
}

const CELL = 7;

/** Turns and scales every term of one cell from a frequency index up. */
function damage(edition: CellEdition, cell: number, effect: { readonly from?: number; readonly to?: number; readonly turnDeg?: number; readonly gain?: number }): CellEdition {
  const values = edition.responses.values.slice();
  const { from = 0, to = FREQUENCIES_HZ.length, turnDeg = 0, gain = 1 } = effect;
  const [cos, sin] = [gain * Math.cos(radFromDeg(turnDeg)), gain * Math.sin(radFromDeg(turnDeg))];
  for (let i = from; i < to; i++)
    for (let at = 8 * (cell * FREQUENCIES_HZ.length + i), end = at + 8; at < end; at += 2)
      values.set([values[at] * cos - values[at + 1] * sin, values[at] * sin + values[at + 1] * cos], at);
  return { ...edition, responses: { ...edition.responses, values } };
}

function conjugated(edition: CellEdition): CellEdition {
  return { ...edition, responses: { ...edition.responses, values: edition.responses.values.map((value, i) => (i % 2 === 1 ? -value : value)) } };
}

function findings(report: QualityReport, check: string): QualityFinding[] {
  return [...report.family, ...report.cells.flatMap((cell) => cell.findings)].filter((finding) => finding.check === check);
}

function troubled(report: QualityReport, verdict: 'warn' | 'fail'): string[] {
  return [...report.family, ...report.cells.flatMap((cell) => cell.findings)].filter((finding) => finding.verdict === verdict).map(({ check, cellId }) => `${cellId ?? 'family'} ${check}`);
}

describe('judging a clean edition', () => {
  it('passes every check that applies', () => {
    const report = judgeEdition(sample());
    expect(troubled(report, 'fail')).toEqual([]);
    expect(report.cells.every(({ verdict }) => verdict === 'pass')).toBe(true);
  });

  it('lists every check it runs under a name of the report', () => {
    const report = judgeEdition(sample({ description: { provenance: 'measured', excludedRegions: [{ reason: 'edge', fromGHz: 15 }] } }));
    const names = new Set([...report.family, ...report.cells.flatMap((cell) => cell.findings)].map(({ check }) => check));
    expect([...names].sort()).toEqual(CELL_CHECKS.flatMap(({ finds }) => finds).sort());
  });

  it('judges both modes at every angle', () => {
    const report = judgeEdition(sample({ thetasDeg: [0, 30], description: { ports: 'te-and-tm' } }));
    expect(troubled(report, 'fail')).toEqual([]);
    expect(findings(report, 'phase-slope').find(({ cellId }) => cellId === undefined)?.detail).toBe('The phase rises with frequency on 0 of 60 curves');
    expect(findings(report, 'coverage')[0].detail).toMatch(/2 x 1 incidences up to θ 30°, φ 0°/);
  });
});

describe('findings and the files they speak of', () => {
  const perCell = FREQUENCIES_HZ.length;
  const origin = {
    fileOfCurve: SIZES_MM.map((_, cell) => (cell === 3 ? null : `cell-${cell}.s1p`)),
    // The first record of every file stands on line 5.
    lineOfPoint: Int32Array.from({ length: SIZES_MM.length * perCell }, (_, point) => 5 + (point % perCell)),
    repeats: [],
  };
  const placeOf = (report: QualityReport, check: string, cell: number) => findings(report, check).filter(({ cellId }) => cellId === `cell-${cell}`).map(({ file, line }) => [file, line]);

  it('have file and line where they speak of one point', () => {
    const loud = damage(sample(), CELL, { from: 20, to: 21, gain: 1.5 });
    expect(placeOf(judgeEdition(loud, origin), 'passivity', CELL)).toEqual([['cell-7.s1p', 25]]);
    const stepped = damage(sample(), CELL, { from: 22, turnDeg: -47 });
    expect(placeOf(judgeEdition(stepped, origin), 'phase-jump', CELL)).toEqual([['cell-7.s1p', 27]]);
  });

  it('have the file alone where they speak of a whole curve or cell', () => {
    const turned = judgeEdition(damage(sample(), CELL, { turnDeg: 90 }), origin);
    expect(placeOf(turned, 'outlier', CELL)).toEqual([['cell-7.s1p', undefined]]);
    expect(placeOf(turned, 'noise', CELL)).toEqual([['cell-7.s1p', undefined]]);
    const present = sample().responses.present.map((flag, point) => (point === CELL * perCell + 3 ? 0 : flag));
    const gap = judgeEdition({ ...sample(), responses: { ...sample().responses, present } }, origin);
    expect(placeOf(gap, 'missing-points', CELL)).toEqual([['cell-7.s1p', undefined]]);
  });

  it('have none where no file gave the curve, or where the origin is not known', () => {
    expect(placeOf(judgeEdition(sample(), origin), 'passivity', 3)).toEqual([[undefined, undefined]]);
    expect(placeOf(judgeEdition(sample()), 'passivity', CELL)).toEqual([[undefined, undefined]]);
    expect(judgeEdition(sample(), origin).family.every(({ file }) => file === undefined || file === 'cell-0.s1p')).toBe(true);
  });
});

describe('finding what was damaged, by the right check', () => {
  it('fails a gain error of 1.2 dB as not passive', () => {
    const report = judgeEdition(damage(sample(), CELL, { gain: 10 ** (1.2 / 20) }));
    expect(troubled(report, 'fail')).toEqual(['cell-7 passivity']);
  });

  it('warns of a magnitude above 1 within the tolerance of a calibration', () => {
    const report = judgeEdition(damage(sample({ description: { ports: 'either' } }), CELL, { gain: 1.009 }));
    expect(troubled(report, 'fail')).toEqual([]);
    expect(troubled(report, 'warn')).toContain('cell-7 passivity');
  });

  it('fails a step of -47 degrees along frequency, and no neighbour for it', () => {
    const report = judgeEdition(damage(sample(), CELL, { from: 22, turnDeg: -47 }));
    expect(troubled(report, 'fail')).toContain('cell-7 phase-jump');
    expect(troubled(report, 'fail').every((entry) => entry.startsWith('cell-7 '))).toBe(true);
    expect(findings(report, 'phase-jump')[CELL].detail).toMatch(/at 12\.4 GHz/);
  });

  it('fails a single point turned by 60 degrees', () => {
    expect(troubled(judgeEdition(damage(sample(), CELL, { from: 20, to: 21, turnDeg: 60 })), 'fail')).toEqual(['cell-7 phase-jump']);
  });

  it('fails a cell turned as a whole as an outlier, and no neighbour for it', () => {
    expect(troubled(judgeEdition(damage(sample(), CELL, { turnDeg: 90 })), 'fail')).toEqual(['cell-7 outlier']);
  });

  it('fails the wrong time convention by the slope of the phase', () => {
    const report = judgeEdition(conjugated(sample()));
    expect(findings(report, 'phase-slope').every(({ verdict }) => verdict === 'fail')).toBe(true);
    expect(report.family.find(({ check }) => check === 'phase-slope')?.detail).toMatch(/rises with frequency on 15 of 15 curves: the time convention exp\(\+jwt\) is probably the other one/);
  });

  it('warns of missing points, and fails when the design frequency is among them', () => {
    const [apart, design] = [sample(), sample()];
    apart.responses.present[CELL * 41 + 3] = 0;
    design.responses.present[CELL * 41 + 20] = 0;
    expect(troubled(judgeEdition(apart), 'warn')).toContain('cell-7 missing-points');
    expect(findings(judgeEdition(apart), 'missing-points')[CELL].detail).toBe('1 of 41 points are missing: 8.6 GHz');
    expect(troubled(judgeEdition(design), 'fail')).toEqual(['cell-7 missing-points']);
  });

  it('warns of two cells with the same parameters', () => {
    const report = judgeEdition(sample({ sizesMm: [0.5, 0.9, 0.9, 1.3] }));
    expect(findings(report, 'duplicate-points').map(({ detail }) => detail)).toEqual(['cell-2 and cell-1 have the same parameters (0.9 mm)']);
  });

  it('fails a design frequency outside the band', () => {
    const report = judgeEdition(sample({ description: { designFrequencyGHz: 20 } }));
    expect(troubled(report, 'fail')).toEqual(['family coverage']);
    expect(findings(report, 'phase-range')[0].verdict).toBe('not-evaluated');
  });

  it('fails a family that reaches less than half a turn', () => {
    const report = judgeEdition(sample({ sizesMm: [0.3, 0.5, 0.7] }));
    expect(troubled(report, 'fail')).toEqual(expect.arrayContaining(['family phase-range', 'family largest-gap']));
  });
});

describe('what a measurement adds', () => {
  /** Complex Gaussian noise by Box and Muller from a congruential generator of fixed seed. */
  function withNoise(edition: CellEdition, sigma: number): CellEdition {
    let state = 12345;
    const uniform = () => (state = (state * 1103515245 + 12345) % 2147483648) / 2147483648 + 1e-12;
    const values = edition.responses.values.slice();
    for (let at = 0; at < values.length; at += 8) {
      const [radius, angle] = [sigma * Math.sqrt(-Math.log(uniform())), 2 * Math.PI * uniform()];
      values[at] += radius * Math.cos(angle);
      values[at + 1] += radius * Math.sin(angle);
    }
    return { ...edition, responses: { ...edition.responses, values } };
  }

  it.each([
    [-50, 'pass'],
    [-35, 'warn'],
    [-20, 'fail'],
  ])('is noise of %d dB, told within 4 dB and judged "%s"', (db, verdict) => {
    const noise = findings(judgeEdition(withNoise(sample(), 10 ** (db / 20))), 'noise');
    // 35 residuals of seven overlapping points: one cell's figure scatters by about 1.5 dB.
    noise.forEach((finding) => expect(Math.abs((finding.value ?? 0) - db)).toBeLessThan(4));
    const middle = noise.map(({ value }) => value ?? 0).sort((a, b) => a - b)[7];
    expect(Math.abs(middle - db)).toBeLessThan(1.5);
    expect(noise[0].verdict).toBe(verdict);
  });

  it('is noise far below any instrument in computed data', () => {
    findings(judgeEdition(sample()), 'noise').forEach(({ value }) => expect(value).toBeLessThan(-80));
  });

  const shapes: FamilyDescription['shapes'] = [{ kind: 'rectangle', widthMm: { parameter: 'patchSide', factor: 1 }, heightMm: { parameter: 'patchSide', factor: 1 } }];
  const plane = (edition: CellEdition) => findings(judgeEdition(edition), 'reference-plane')[0];

  it('is a reference plane off the patches, told in mm from the smallest patch', () => {
    const clean = sample({ description: { shapes } });
    // 0.5 mm above the patches: 2 k0 times the distance is 14.41 degrees of lag at 12 GHz.
    const shifted = clean.cells.reduce((edition, _, cell) => damage(edition, cell, { turnDeg: -14.41 }), clean);
    expect(plane(clean).verdict).toBe('pass');
    expect(plane(shifted)).toMatchObject({ verdict: 'warn' });
    expect(Number(/lie ([\d.]+) mm above/.exec(plane(shifted).detail)?.[1])).toBeCloseTo(0.5 + ((plane(clean).value ?? 0) / 14.41) * 0.5, 1);
  });

  it('leaves the reference plane open without a small plain patch', () => {
    expect(plane(sample()).verdict).toBe('not-evaluated');
    expect(plane(sample({ description: { shapes }, sizesMm: [1.5, 1.8] })).detail).toMatch(/No patch is small enough/);
    expect(plane(sample({ description: { shapes }, thetasDeg: [30] })).detail).toMatch(/No response at normal incidence/);
  });
});

describe('reciprocity', () => {
  function withCross(forward: readonly [number, number], backward: readonly [number, number]): QualityReport {
    const edition = sample({ description: { ports: 'te-and-tm' } });
    for (let point = 0; point < edition.responses.present.length; point++) {
      // Cross terms take their power from the co-polar ones, so that the cell stays passive.
      for (const at of [0, 1, 6, 7]) edition.responses.values[8 * point + at] *= 0.7;
      edition.responses.values.set([...forward, ...backward], 8 * point + 2);
    }
    return judgeEdition(edition);
  }

  it('passes equal cross terms', () => {
    expect(findings(withCross([0.2, 0.1], [0.2, 0.1]), 'reciprocity').every(({ verdict }) => verdict === 'pass')).toBe(true);
  });

  it('fails unequal ones, and names a turned axis when only the sign differs', () => {
    const unequal = findings(withCross([0.2, 0.1], [0.1, 0.2]), 'reciprocity')[0];
    const turned = findings(withCross([0.2, 0.1], [-0.2, -0.1]), 'reciprocity')[0];
    expect([unequal.verdict, turned.verdict]).toEqual(['fail', 'fail']);
    expect(unequal.detail).not.toMatch(/turned round/);
    expect(turned.detail).toMatch(/one axis is turned round/);
  });

  it('does not judge a one-port', () => {
    expect(findings(judgeEdition(sample()), 'reciprocity')).toEqual([{ check: 'reciprocity', verdict: 'not-evaluated', detail: 'A one-port has no second direction' }]);
  });
});

describe('excluded regions', () => {
  const region = { reason: 'resonance', fromGHz: 12.4, fromParameterMm: 1.6 };

  it('are counted and not judged', () => {
    const damaged = damage(sample({ description: { excludedRegions: [region] } }), CELL, { from: 22, turnDeg: -47, gain: 2 });
    const report = judgeEdition(damaged);
    expect(troubled(report, 'fail')).toEqual([]);
    // 8 sizes from 1.6 mm up, 19 frequencies from 12.4 GHz up, of 15 x 41.
    expect(findings(report, 'excluded-region')[0]).toMatchObject({ verdict: 'not-evaluated', value: 152, detail: '152 of 615 points lie in regions the laboratory excludes; they were not judged' });
  });

  it('are told when they hold no point', () => {
    const report = judgeEdition(sample({ description: { excludedRegions: [{ ...region, phisDeg: [45] }] } }));
    expect(findings(report, 'excluded-region').map(({ verdict }) => verdict)).toEqual(['not-evaluated', 'warn']);
  });

  it('hide missing points', () => {
    const edition = sample({ description: { excludedRegions: [region] } });
    edition.responses.present[CELL * 41 + 30] = 0;
    expect(findings(judgeEdition(edition), 'missing-points')[CELL].verdict).toBe('pass');
  });
});

describe('largestSingularValue', () => {
  it('is the larger magnitude of a diagonal matrix', () => {
    expect(largestSingularValue(Float64Array.of(0.3, 0.4, 0, 0, 0, 0, 0, 0.9), 0)).toBeCloseTo(0.9, 14);
  });

  it('is 1 for a lossless rotation of polarisation', () => {
    const [c, s] = [Math.cos(0.4), Math.sin(0.4)];
    expect(largestSingularValue(Float64Array.of(c, 0, s, 0, -s, 0, c, 0), 0)).toBeCloseTo(1, 14);
  });

  it('bounds the amplification of every input', () => {
    const part = fc.double({ min: -2, max: 2, noNaN: true });
    fc.assert(
      fc.property(fc.array(part, { minLength: 8, maxLength: 8 }), fc.tuple(part, part, part, part), (s, [aRe, aIm, bRe, bIm]) => {
        const [s11, s21, s12, s22] = [0, 2, 4, 6].map((i) => [s[i], s[i + 1]]);
        const times = ([xRe, xIm]: number[], re: number, im: number) => [xRe * re - xIm * im, xRe * im + xIm * re];
        const out = [times(s11, aRe, aIm), times(s12, bRe, bIm), times(s21, aRe, aIm), times(s22, bRe, bIm)];
        const power = (out[0][0] + out[1][0]) ** 2 + (out[0][1] + out[1][1]) ** 2 + (out[2][0] + out[3][0]) ** 2 + (out[2][1] + out[3][1]) ** 2;
        const incoming = aRe ** 2 + aIm ** 2 + bRe ** 2 + bIm ** 2;
        expect(Math.sqrt(power)).toBeLessThanOrEqual(largestSingularValue(Float64Array.from(s), 0) * Math.sqrt(incoming) * (1 + 1e-9) + 1e-9);
      }),
      { seed: 101 },
    );
  });
});

describe('phases on a circle', () => {
  it.each([
    [[0, 90, 180, 270], 90],
    [[350, 10], 340],
    [[-170, 170], 340],
    [[45], 360],
  ])('leave with %j a largest gap of %d degrees', (phasesDeg, gapDeg) => {
    expect(largestGapDeg(phasesDeg)).toBeCloseTo(gapDeg, 12);
  });

  it('accept a phase between its neighbours across the wrap', () => {
    expect(outsideNeighboursRad([radFromDeg(170), radFromDeg(-175), radFromDeg(-160)], 1)).toBe(0);
  });

  it('ask the neighbours beyond a bad one', () => {
    const phases = [100, 80, 60, -60, 20, 0, -20].map(radFromDeg);
    expect(outsideNeighboursRad(phases, 4)).toBe(0);
    expect(outsideNeighboursRad(phases, 3)).toBeCloseTo(radFromDeg(60), 12);
    expect(outsideNeighboursRad(phases, 0)).toBe(-1);
  });
});

describe('worstVerdict', () => {
  it('puts fail before warn before pass, and knows when nothing was judged', () => {
    const of = (...verdicts: QualityFinding['verdict'][]) => worstVerdict(verdicts.map((verdict) => ({ verdict })));
    expect([of('pass', 'fail', 'warn'), of('pass', 'warn'), of('pass', 'not-evaluated'), of('not-evaluated'), of()]).toEqual(['fail', 'warn', 'pass', 'not-evaluated', 'not-evaluated']);
  });
});
