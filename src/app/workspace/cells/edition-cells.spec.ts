import { TestBed } from '@angular/core/testing';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { FakeWorkspace } from '../fields/fake-workspace';
import { WORKSPACE_STATE } from '../workspace-state';
import type { EditionInUse } from '../workspace-state';
import { EditionCells } from './edition-cells';

const edition = {
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc96401',
  description: { parameters: [{ id: 'L', label: 'Side', unit: 'mm' }] },
  cells: Array.from({ length: 11 }, (_, i) => ({ id: `L${i}`, parametersMm: [i / 2], fileHashes: [] })),
} as unknown as EditionInUse;
const design: DesignDocument = { ...STARTING_DESIGN, cells: { kind: 'edition', editionId: edition.id, rule: 'nearest-phase', excludedCells: ['L1'] } };

async function rig() {
  const workspace = new FakeWorkspace(design);
  TestBed.configureTestingModule({ providers: [{ provide: WORKSPACE_STATE, useValue: workspace }] });
  const fixture = TestBed.createComponent(EditionCells);
  fixture.componentRef.setInput('edition', edition);
  fixture.componentRef.setInput('use', Int32Array.from({ length: 11 }, (_, i) => i * 10));
  fixture.componentRef.setInput('phaseDegOf', new Map([[0, 144.5]]));
  await fixture.whenStable();
  return { workspace, fixture, element: fixture.nativeElement as HTMLElement };
}

describe('EditionCells', () => {
  it('shows parameter, phase and use of each cell, page by page', async () => {
    const { element, fixture } = await rig();
    expect(element.querySelector('tbody tr')?.textContent?.replace(/\s+/g, ' ').trim()).toBe('L00.000144.50left out');
    expect(element.textContent).toContain('Cells 1 to 8 of 11, 1 left out');
    [...element.querySelectorAll('button')].find((button) => button.textContent?.trim() === 'Later')?.click();
    await fixture.whenStable();
    expect(element.querySelectorAll('tbody tr')).toHaveLength(3);
  });

  it('excludes a cell and uses it again, as named steps', async () => {
    const { workspace, element, fixture } = await rig();
    const boxes = element.querySelectorAll<HTMLInputElement>('input[type=checkbox]');
    expect([boxes[0].checked, boxes[1].checked]).toEqual([false, true]);
    boxes[0].click();
    await fixture.whenStable();
    boxes[1].click();
    await fixture.whenStable();
    expect(workspace.design().cells).toMatchObject({ excludedCells: ['L0'] });
    expect(workspace.stepNames()).toEqual(['Leave out cell L0', 'Use cell L1 again']);
  });
});
