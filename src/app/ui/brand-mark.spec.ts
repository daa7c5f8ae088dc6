import { TestBed } from '@angular/core/testing';
import { BrandMark } from './brand-mark';

describe('brand mark', () => {
  it('grows its cells along one diagonal, the smallest at the lower left', async () => {
    const fixture = TestBed.createComponent(BrandMark);
    await fixture.whenStable();
    const sides = [...(fixture.nativeElement as HTMLElement).querySelectorAll('rect')].map((cell) => Number(cell.getAttribute('width')));
    expect(sides).toHaveLength(16);
    expect(Math.max(...sides)).toBe(sides[3]);
    expect(Math.min(...sides)).toBe(sides[12]);
    // Cells of one slanted front are equal.
    expect(sides[0]).toBeCloseTo(sides[5], 9);
    expect(sides[10]).toBeCloseTo(sides[15], 9);
  });
});
