import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { UvMap } from './uv-map';

const size = 65;
const levelDb = Float32Array.from({ length: size * size }, (_, i) => {
  const [u, v] = [(2 * (i % size)) / (size - 1) - 1, (2 * Math.floor(i / size)) / (size - 1) - 1];
  return 34 - 400 * ((u - 0.342) ** 2 + v ** 2);
});

describe('UvMap', () => {
  let fixture: ComponentFixture<UvMap>;
  let element: HTMLElement;
  let steered: object[];
  beforeEach(async () => {
    jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
    jest.spyOn(Element.prototype, 'getBoundingClientRect').mockReturnValue({ width: 444, left: 0, top: 0 } as DOMRect);
    fixture = TestBed.createComponent(UvMap);
    const inputs = {
      levels: { size, levelDb }, peakDb: 34, beam: { thetaDeg: 20, phiDeg: 0 }, steerable: true,
      lobes: [{ letter: 'a', thetaDeg: 14.9, phiDeg: 0 }, { letter: 'b', thetaDeg: 25.3, phiDeg: 0 }],
      marked: [{ kind: 'grating-lobe', label: 'grating lobe θ 70.0°, φ 180.0°', thetaDeg: 70, phiDeg: 180 }],
    };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    steered = [];
    fixture.componentInstance.steered.subscribe((to) => steered.push(to));
    await fixture.whenStable();
    element = fixture.nativeElement as HTMLElement;
  });
  afterEach(() => jest.restoreAllMocks());

  const handle = (): SVGGElement => element.querySelector('.handle') as SVGGElement;
  const pointer = (kind: string, clientX: number, clientY: number) => Object.assign(new MouseEvent(kind, { clientX, clientY, bubbles: true }), { pointerId: 1 });

  it('names the wanted direction to eyes and to screen readers', () => {
    expect(element.querySelector('.tag')?.textContent?.replace(/\s+/g, ' ').trim()).toContain('θ 20.0°');
    expect(handle().getAttribute('aria-valuetext')).toBe('θ 20.0°, φ 0.0°');
  });
  it('letters the lobes and marks grating lobes', () => {
    expect([...element.querySelectorAll('.balloon-text')].map((text) => text.textContent)).toEqual(['a', 'b']);
    expect(element.querySelector('.grating-lobe title')?.textContent).toContain('θ 70.0°');
  });
  it('draws the -3 dB line around the beam', () => {
    expect(element.querySelector('.half-power')?.getAttribute('d')).toMatch(/^M/);
  });
  it('steers along u and v by arrow keys, ten times as far with Shift', () => {
    handle().dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight', cancelable: true }));
    handle().dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowUp', shiftKey: true, cancelable: true }));
    expect(steered).toEqual([{ thetaDeg: 20.3, phiDeg: 0, settled: true }, { thetaDeg: 20.2, phiDeg: 8.3, settled: true }]);
  });
  it('follows the pointer while dragged and settles when let go', () => {
    Element.prototype.setPointerCapture = () => undefined;
    handle().dispatchEvent(pointer('pointerdown', 288, 222));
    element.querySelector('svg')?.dispatchEvent(pointer('pointermove', 319, 222));
    handle().dispatchEvent(pointer('pointerup', 319, 222));
    expect(steered).toEqual([{ thetaDeg: 30, phiDeg: 0, settled: false }, { thetaDeg: 30, phiDeg: 0, settled: true }]);
  });
  it('cannot be steered by who may not edit', async () => {
    fixture.componentRef.setInput('steerable', false);
    await fixture.whenStable();
    handle().dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight' }));
    expect([steered, handle().getAttribute('tabindex'), handle().getAttribute('aria-disabled')]).toEqual([[], null, 'true']);
  });
  it('reads the level under the pointer and says that it is interpolated', async () => {
    element.querySelector('svg')?.dispatchEvent(pointer('pointermove', 222 + 0.342 * 194, 222));
    await fixture.whenStable();
    expect(element.querySelector('.read-out')?.textContent).toMatch(/u 0\.3420, v 0\.0000, θ 20\.00°, φ 0\.00°: 3\d\.\d\d dBi, interpolated/);
  });
  it('hands out only what lies in the visible circle', () => {
    const { columns } = fixture.componentInstance.exportTable();
    expect(columns.map(({ head }) => head)).toEqual(['u', 'v', 'Gain over the hemisphere, dBi']);
    expect(columns[0].values.length).toBeLessThan(size * size * 0.8);
  });
});
