import { edgeFade, strengthAt } from './paint-crests';
import { sectionScale } from './section-drawing';

describe('strength of a crest', () => {
  it('grows with the amplitude and is nearly solid at the strongest', () => {
    const strengths = [0, 0.1, 0.2, 0.5, 1].map((amplitude) => strengthAt(amplitude, 1));
    expect([...strengths].sort((a, b) => a - b)).toEqual(strengths);
    expect(strengths[4]).toBeCloseTo(1, 5);
    expect(strengths[0]).toBeLessThan(0.1);
  });

  it('fades to nothing at the left and right edges and to a quarter at the top', () => {
    const scale = sectionScale(900, 800);
    expect(edgeFade(scale, 0, 400)).toBe(0);
    expect(edgeFade(scale, 900, 400)).toBe(0);
    expect(edgeFade(scale, 450, 400)).toBe(1);
    expect(edgeFade(scale, 450, 0)).toBe(0.25);
  });
});
