import { TestBed } from '@angular/core/testing';
import type { ImportMapping, Inspection } from '../../../shared/contracts/library';
import type { QualityReport } from '../../../shared/model/cell-family';
import { FileFindings } from './file-findings';
import { QualityList } from './quality-list';
import { originText } from './verdict-words';

const said = { severity: 'warning', line: 12, text: 'A frequency stands twice' } as const;
const inspection = {
  files: [
    { name: 'a.s1p', kind: 'touchstone', status: 'read', byteCount: 10, pointCount: 2, cellId: 'A', parameters: [], messages: [said] },
    { name: 'again.s1p', kind: 'touchstone', status: 'read', byteCount: 10, cellId: 'A', parameters: [], messages: [said] },
  ],
  messages: [{ severity: 'error', line: 0, text: 'a.s1p and again.s1p both describe A' }],
} as unknown as Inspection;

async function shown(mapping: ImportMapping = {}) {
  const fixture = TestBed.createComponent(FileFindings);
  fixture.componentRef.setInput('inspection', inspection);
  fixture.componentRef.setInput('mapping', mapping);
  const changes: ImportMapping[] = [];
  fixture.componentInstance.changed.subscribe((change) => changes.push(change));
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const box = (name: string) => element.querySelector(`input[aria-label="${name}"]`) as HTMLInputElement;
  return { element, changes, box };
}

describe('FileFindings', () => {
  it('shows each file with what is said of it and on which line', async () => {
    const { element } = await shown();
    expect(element.querySelectorAll('tbody tr')).toHaveLength(2);
    expect(element.textContent).toContain('line 12: A frequency stands twice');
  });

  it('takes a file as a second measurement, and takes that back', async () => {
    const first = await shown();
    first.box('again.s1p measures a cell again').click();
    expect(first.changes).toEqual([{ repeatFiles: ['again.s1p'] }]);
    const second = await shown({ repeatFiles: ['again.s1p', 'other.s1p'] });
    expect(second.box('again.s1p measures a cell again').checked).toBe(true);
    expect(second.box('a.s1p measures a cell again').checked).toBe(false);
    second.box('again.s1p measures a cell again').click();
    expect(second.changes).toEqual([{ repeatFiles: ['other.s1p'] }]);
  });

  it('leaves a file out without forgetting the other decisions', async () => {
    const { box, changes } = await shown({ repeatFiles: ['again.s1p'] });
    box('Leave out a.s1p').click();
    expect(changes).toEqual([{ repeatFiles: ['again.s1p'], ignoredFiles: ['a.s1p'] }]);
  });
});

describe('QualityList', () => {
  it('names the file and the line of what a check found', async () => {
    const finding = { check: 'passivity', verdict: 'fail', detail: 'Largest singular value 1.2', cellId: 'A', file: 'a.s1p', line: 27 } as const;
    const report: QualityReport = { verdict: 'fail', family: [{ check: 'coverage', verdict: 'pass', detail: 'Whole band' }], cells: [{ cellId: 'A', verdict: 'fail', findings: [finding] }] };
    const fixture = TestBed.createComponent(QualityList);
    fixture.componentRef.setInput('report', report);
    await fixture.whenStable();
    const rows = [...(fixture.nativeElement as HTMLElement).querySelectorAll('tbody td.found')].map((cell) => cell.textContent?.trim());
    expect(rows).toEqual(['Whole band', 'Largest singular value 1.2 a.s1p, line 27']);
  });

  it('names the file alone where a finding speaks of all of it', () => {
    expect([originText({ file: 'a.s1p' }), originText({ file: 'a.s1p', line: 3 }), originText({})]).toEqual(['a.s1p', 'a.s1p, line 3', '']);
  });
});
