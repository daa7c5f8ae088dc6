import * as fc from 'fast-check';
import type { Panel } from '../model/design-document';
import { panelLattice, type PanelLattice } from './panel-lattice';
import { siPanel } from './si-design';

const lattice = (panel: Partial<Panel>): PanelLattice =>
  panelLattice(
    siPanel({
      outline: { kind: 'rectangle', widthMm: 40, heightMm: 30 },
      lattice: { kind: 'rectangular', periodXMm: 10, periodYMm: 10 },
      keepOuts: [],
      ...panel,
    }),
  );

const mm = (values: Float64Array): number[] => Array.from(values, (x) => Number((x * 1000).toFixed(6)));

describe('the lattice of a panel', () => {
  it('stands at half-odd multiples for an even count and at whole ones for an odd count', () => {
    const { count, xM, yM } = lattice({});
    expect(count).toBe(12);
    expect(mm(xM).slice(0, 4)).toEqual([-15, -5, 5, 15]);
    expect([...new Set(mm(yM))]).toEqual([-10, 0, 10]);
  });

  it('orders the cells row by row from the lowest y, within a row from the lowest x', () => {
    const { row, column } = lattice({});
    expect(Array.from(row)).toEqual([0, 0, 0, 0, 1, 1, 1, 1, 2, 2, 2, 2]);
    expect(Array.from(column)).toEqual([0, 1, 2, 3, 0, 1, 2, 3, 0, 1, 2, 3]);
  });

  it('holds all periods of a side that is a whole number of them up to rounding', () => {
    const panel = { outline: { kind: 'rectangle', widthMm: 0.3, heightMm: 0.3 }, lattice: { kind: 'rectangular', periodXMm: 0.1, periodYMm: 0.1 } } as const;
    expect(lattice(panel).count).toBe(9);
  });

  it('leaves out the part of a side that holds no whole period', () => {
    expect(lattice({ outline: { kind: 'rectangle', widthMm: 49.9, heightMm: 30 } }).count).toBe(12);
  });

  it('keeps the centres inside or on an ellipse, on the grid of its bounding rectangle', () => {
    const { count, xM, yM } = lattice({ outline: { kind: 'ellipse', widthMm: 60, heightMm: 60 } });
    expect(count).toBe(32);
    xM.forEach((x, n) => expect(Math.hypot(x, yM[n])).toBeLessThanOrEqual(0.03 + 1e-9));
  });

  it('centres the grid on the bounding rectangle of a polygon', () => {
    const { xM, yM } = lattice({ outline: { kind: 'polygon', pointsMm: [[0, 0], [40, 0], [40, 20], [0, 20]] } });
    expect(mm(xM).slice(0, 4)).toEqual([5, 15, 25, 35]);
    expect([...new Set(mm(yM))]).toEqual([5, 15]);
  });

  it('has a triangular lattice with a cell at the origin and odd rows half a period on', () => {
    const { xM, yM } = lattice({ lattice: { kind: 'triangular', periodXMm: 10, rowSpacingMm: 8 }, outline: { kind: 'rectangle', widthMm: 20, heightMm: 16 } });
    const points = mm(xM).map((x, n) => [x, mm(yM)[n]]);
    expect(points).toEqual([[-5, -8], [5, -8], [-10, 0], [0, 0], [10, 0], [-5, 8], [5, 8]]);
  });

  it('keeps the centres on the very edge of a triangular lattice in an ellipse', () => {
    const { xM, yM } = lattice({ lattice: { kind: 'triangular', periodXMm: 10, rowSpacingMm: 8.660254 }, outline: { kind: 'ellipse', widthMm: 40, heightMm: 40 } });
    expect(mm(xM).filter((_, n) => Math.abs(yM[n]) < 1e-9)).toEqual([-20, -10, 0, 10, 20]);
  });

  it('leaves out cells inside or on a keep-out', () => {
    const { count, xM, yM } = lattice({ keepOuts: [{ kind: 'rectangle', widthMm: 10, heightMm: 5, centreMm: [10, 0] }] });
    expect(count).toBe(10);
    expect(mm(xM).filter((_, n) => Math.abs(yM[n]) < 1e-9)).toEqual([-15, -5]);
  });

  it('puts every cell where its column and row say', () => {
    fc.assert(
      fc.property(fc.double({ min: 3, max: 9, noNaN: true }), fc.boolean(), (period, triangular) => {
        const cells = lattice({
          outline: { kind: 'ellipse', widthMm: 70, heightMm: 50 },
          lattice: triangular ? { kind: 'triangular', periodXMm: period, rowSpacingMm: period * 0.9 } : { kind: 'rectangular', periodXMm: period, periodYMm: period * 1.1 },
        });
        const { grid } = cells;
        cells.xM.forEach((x, n) => {
          const shifted = grid.stagger !== 'none' && (cells.row[n] % 2 === 0) === (grid.stagger === 'even');
          expect(x).toBeCloseTo(grid.firstXM + (cells.column[n] + (shifted ? 0.5 : 0)) * grid.stepXM, 12);
          expect(cells.yM[n]).toBeCloseTo(grid.firstYM + cells.row[n] * grid.stepYM, 12);
        });
      }),
      { numRuns: 40 },
    );
  });
});
