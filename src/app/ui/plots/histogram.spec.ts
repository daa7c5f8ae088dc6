import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { Histogram } from './histogram';

describe('Histogram', () => {
  let fixture: ComponentFixture<Histogram>;
  let element: HTMLElement;
  beforeEach(async () => {
    jest.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue({ width: 264 } as DOMRect);
    fixture = TestBed.createComponent(Histogram);
    const inputs = { values: [-12.6, -1.2, 0.3, 0.6, 9.8, 13.4], scale: { map: 'diverging', from: -15, to: 15 }, label: 'Phase error', quantity: 'phase error', unit: '°', band: 4.48, marked: 9.8 };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    element = fixture.nativeElement as HTMLElement;
  });
  afterEach(() => jest.restoreAllMocks());

  it('draws a bar for every bin that holds something and names it', () => {
    expect([...element.querySelectorAll('.bar title')].map((title) => title.textContent)).toEqual([
      '\u221213.00 to \u221212.00 °: 1', '\u22122.00 to \u22121.00 °: 1', '0.00 to 1.00 °: 2', '9.00 to 10.00 °: 1', '13.00 to 14.00 °: 1',
    ]);
  });
  it('marks the bin of the chosen value and the band of the RMS', () => {
    expect(element.querySelector('.bar.marked title')?.textContent).toContain('9.00 to 10.00');
    expect(element.textContent).toContain('RMS ±4.48°');
    expect(element.textContent).toContain('phase error, ° (bins of 1°)');
  });
  it('tells which values a picked bar stands for', () => {
    const picked: object[] = [];
    fixture.componentInstance.picked.subscribe((range) => picked.push(range));
    element.querySelector('.bar.marked')?.dispatchEvent(new MouseEvent('click'));
    expect(picked).toEqual([{ from: 9, to: 10 }]);
  });
  it('hands out its counts', () => {
    const { columns } = fixture.componentInstance.exportTable();
    expect(columns.map(({ head }) => head)).toEqual(['phase error from, °', 'phase error to, °', 'count']);
    expect([...(columns[2].values as number[])].reduce((a, b) => a + b)).toBe(6);
  });
});
