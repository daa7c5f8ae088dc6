import { designFaults } from '../design-faults';
import { planeWaveDesign } from '../example-design';
import { figures as figuresSchema } from '../../model/figures';
import { placeCells } from '../place-cells';
import { predictDesign } from '../predict-design';
import { boardPeakShare, searchBoard } from './diffuse-board';
import { diffuseBound } from './diffuse-figures';

const plain = { columns: 3, rows: 3, states: 2, blockColumns: 1, blockRows: 1, seed: 0 };

describe('the search for a diffuse board', () => {
  it('finds the lowest of all 512 boards of 3 x 3', () => {
    const found = searchBoard(plain, 16);
    const all = Array.from({ length: 512 }, (_, board) => boardPeakShare(plain, Array.from({ length: 9 }, (__, i) => (board >> i) & 1), 16));
    expect(found.peakShare).toBeCloseTo(Math.min(...all), 12);
    expect(found.equals).toBe(all.filter((share) => share < found.peakShare * (1 + 1e-9)).length);
    expect(boardPeakShare(plain, found.state, 16)).toBeCloseTo(found.peakShare, 12);
  });

  it('never lies below 1 / blocks, and the same seed finds the same', () => {
    const question = { columns: 6, rows: 5, states: 4, blockColumns: 1, blockRows: 1, seed: 3 };
    const found = searchBoard(question);
    expect(found.method).toBe('descent');
    expect(found.peakShare).toBeGreaterThanOrEqual(1 / 30);
    expect(found.peakShare).toBeLessThan(0.15);
    expect([...searchBoard(question).state]).toEqual([...found.state]);
    expect(boardPeakShare(question, found.state, found.samples)).toBeCloseTo(found.peakShare, 9);
  });

  it('weighs the board by the pattern of a block: all blocks equal have their peak at broadside', () => {
    expect(boardPeakShare({ ...plain, blockColumns: 4, blockRows: 4 }, new Int32Array(9), 16)).toBeCloseTo(1, 12);
  });
});

describe('the bound of scattering', () => {
  it('is 1 / N where the hemisphere covers the reciprocal cell, and that of energy on finer lattices', () => {
    const aperture = { count: 100, cellAreaM2: 1, wavelengthM: 1 };
    expect(diffuseBound({ kind: 'rectangular', periodXM: 1, periodYM: 1 }, aperture)).toEqual({ boundDb: expect.closeTo(-20, 9) as number, boundBy: 'parseval' });
    expect(diffuseBound({ kind: 'rectangular', periodXM: 0.5, periodYM: 0.5 }, { ...aperture, cellAreaM2: 0.25 })).toEqual({ boundDb: expect.closeTo(10 * Math.log10(1 / (50 * Math.PI)), 9) as number, boundBy: 'energy' });
  });
});

describe('a panel that scatters', () => {
  const design = planeWaveDesign({ synthesis: { kind: 'diffuse', blockColumns: 4, blockRows: 4, states: 2, seed: 1 } });

  it('keeps its peak far below a plate and above the bound', () => {
    const { figures, warnings } = predictDesign(design, { include: {} });
    expect(figuresSchema.safeParse(figures).success).toBe(true);
    const { diffuse } = figures;
    if (!diffuse) throw new Error('no board');
    expect(diffuse.peakDb).toBeLessThan(-7);
    expect(diffuse.peakDb).toBeGreaterThan(diffuse.boundDb);
    // The samples of the search lie a little beside the true peak.
    expect(diffuse.peakDb).toBeCloseTo(diffuse.boardPeakDb, 0);
    expect(warnings.map(({ code }) => code)).not.toContain('image-lobe');
  });

  it('gives a block one state, whatever the incidence', () => {
    const oblique = { ...design, illumination: { kind: 'plane-wave' as const, thetaDeg: 30, phiDeg: 40, polarisation: 'x' as const } };
    const { targetRad, law } = placeCells(oblique);
    const { board } = law;
    if (!board) throw new Error('no board');
    expect(Math.cos(targetRad[0])).toBeCloseTo(Math.cos(Math.PI * board.state[0]), 9);
    expect(Math.cos(targetRad[1])).toBeCloseTo(Math.cos(targetRad[0]), 9);
  });

  it('refuses more blocks than can be searched', () => {
    const panel = { ...design.panel, outline: { kind: 'rectangle' as const, widthMm: 600, heightMm: 600 } };
    const fine = { ...design, panel, synthesis: { kind: 'diffuse' as const, blockColumns: 1, blockRows: 1, states: 2, seed: 1 } };
    expect(designFaults(fine)).toEqual([{ pointer: '#/synthesis/blockColumns', detail: 'makes 1600 blocks; the limit is 1024: take larger blocks' }]);
  });
});
