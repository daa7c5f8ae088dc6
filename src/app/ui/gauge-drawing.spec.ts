import { gaugeDrawing } from './gauge-drawing';

describe('gauge', () => {
  it('hatches the side that is forbidden and runs from the limit to the value', () => {
    const gauge = gaugeDrawing({ limitAt: 0.25, valueAt: 0.75, forbidden: 'left' });
    expect(gauge).toMatchObject({ run: 'M29.5 4H88.5', limit: 'M29.5 0V8', valueX: 88.5 });
    const xs = [...(gauge?.hatch.matchAll(/[ML]([\d.]+) /g) ?? [])].map((match) => Number(match[1]));
    expect(Math.min(...xs)).toBe(0);
    expect(Math.max(...xs)).toBeLessThanOrEqual(29.5);
  });

  it('keeps a value beyond the line at its end, where it can still be seen', () => {
    expect(gaugeDrawing({ limitAt: 0.5, valueAt: 9, forbidden: 'right' })?.valueX).toBe(115);
    expect(gaugeDrawing({ limitAt: 0.5, valueAt: -9, forbidden: 'right' })?.valueX).toBe(3);
  });

  it('draws nothing without a limit', () => {
    expect(gaugeDrawing(null)).toBeNull();
  });
});
