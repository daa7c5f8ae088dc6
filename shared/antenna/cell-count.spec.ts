import type { Panel } from '../model/design-document';
import { cellCountFault, cellCountUpperBound, countCells } from './cell-count';
import { panelLattice } from './panel-lattice';
import { siPanel } from './si-design';

const panel = (changes: Partial<Panel>): Panel => ({
  operation: 'reflect',
  outline: { kind: 'rectangle', widthMm: 200, heightMm: 200 },
  lattice: { kind: 'rectangular', periodXMm: 5, periodYMm: 5 },
  keepOuts: [],
  ...changes,
});

describe('counting cells', () => {
  it('counts a rectangle as its bound and an ellipse below it', () => {
    expect(countCells(panel({}))).toBe(1600);
    expect(cellCountUpperBound(panel({}))).toBe(1600);
    const round = panel({ outline: { kind: 'ellipse', widthMm: 200, heightMm: 200 } });
    expect(cellCountUpperBound(round)).toBe(1600);
    expect(countCells(round)).toBeLessThan(1300);
  });

  it('counts what the lattice places', () => {
    for (const lattice of [{ kind: 'rectangular', periodXMm: 7, periodYMm: 5 }, { kind: 'triangular', periodXMm: 7, rowSpacingMm: 6 }] as const) {
      const some = panel({ lattice, outline: { kind: 'polygon', pointsMm: [[-90, -80], [70, -50], [20, 60]] }, keepOuts: [{ kind: 'ellipse', widthMm: 20, heightMm: 30, centreMm: [0, 0] }] });
      expect(countCells(some)).toBe(panelLattice(siPanel(some)).count);
      expect(countCells(some)).toBeLessThanOrEqual(cellCountUpperBound(some));
    }
  });

  it('allows a million cells and refuses more, naming the count and the limit', () => {
    expect(cellCountFault(panel({ outline: { kind: 'rectangle', widthMm: 5000, heightMm: 5000 } }))).toBeUndefined();
    expect(cellCountFault(panel({ outline: { kind: 'rectangle', widthMm: 5005, heightMm: 5000 } }))).toBe('the panel would have 1001000 cells; the limit is 1000000');
  });

  it('refuses an absurd lattice at once, without a row in memory', () => {
    const absurd = panel({ outline: { kind: 'rectangle', widthMm: 1e5, heightMm: 1e5 }, lattice: { kind: 'rectangular', periodXMm: 1e-6, periodYMm: 1e-6 } });
    expect(cellCountFault(absurd)).toMatch(/^the panel would have 1e\+22 cells; the limit is 1000000$/);
  });

  it('allows an ellipse whose bounding rectangle holds more than a million', () => {
    expect(cellCountFault(panel({ outline: { kind: 'ellipse', widthMm: 5500, heightMm: 5500 } }))).toBeUndefined();
  });

  it('says when there is no cell at all', () => {
    expect(cellCountFault(panel({ outline: { kind: 'rectangle', widthMm: 4, heightMm: 200 } }))).toContain('smaller than one period');
    expect(cellCountFault(panel({ keepOuts: [{ kind: 'rectangle', widthMm: 300, heightMm: 300, centreMm: [0, 0] }] }))).toContain('no cell centre lies inside');
  });
});
