import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { replacedAt } from '../../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { WORKSPACE_STATE } from '../workspace-state';
import { DesignTable } from './design-table';
import type { DesignColumn } from './design-table';
import { FakeWorkspace } from './fake-workspace';
import { PendingEntries } from './pending-entries';

const columns: readonly DesignColumn[] = [
  { key: '0', label: 'Off axis', dimension: 'angle', unit: '°' },
  { key: '1', label: 'Level', dimension: 'level', unit: 'dBi' },
];

@Component({
  imports: [DesignTable],
  template: `<slant-design-table pointer="/requirement/mask/points" rowName="point" [columns]="columns" [least]="2" [nextRow]="nextRow" />`,
})
class MaskTable {
  readonly columns = columns;
  readonly nextRow = (rows: readonly (readonly number[])[]): readonly number[] => [(rows.at(-1)?.[0] ?? 0) + 10, rows.at(-1)?.[1] ?? 0];
}

const masked = (points: number[][]): DesignDocument => replacedAt(STARTING_DESIGN, '/requirement/mask', { kind: 'custom', points });

function rig(points: number[][]) {
  const workspace = new FakeWorkspace(masked(points));
  TestBed.configureTestingModule({ providers: [PendingEntries, { provide: WORKSPACE_STATE, useValue: workspace }] });
  const fixture = TestBed.createComponent(MaskTable);
  fixture.detectChanges();
  const element = fixture.nativeElement as HTMLElement;
  const press = async (name: string): Promise<void> => {
    const button = [...element.querySelectorAll('button')].find((one) => one.textContent?.trim() === name || one.getAttribute('aria-label') === name);
    if (!button) throw new Error(`no button ${name}`);
    button.click();
    await fixture.whenStable();
  };
  const pasteText = async (text: string): Promise<void> => {
    const box = element.querySelector('textarea');
    if (!box) throw new Error('nothing to paste into');
    box.value = text;
    box.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  };
  const points_ = () => (workspace.design().requirement.mask as { points: number[][] }).points;
  return { workspace, fixture, element, press, pasteText, points: points_ };
}

describe('DesignTable', () => {
  it('adds and removes rows as named steps', async () => {
    const { workspace, press, points } = rig([[5, 20], [10, 12]]);
    await press('Add point');
    expect(points()).toEqual([[5, 20], [10, 12], [20, 12]]);
    await press('Remove point 1');
    expect(points()).toEqual([[10, 12], [20, 12]]);
    expect(workspace.stepNames()).toEqual(['Add point: Mask points', 'Remove point 1: Mask points']);
  });

  it('keeps as many rows as must stay', () => {
    const { element } = rig([[5, 20], [10, 12]]);
    expect(element.querySelector<HTMLButtonElement>('[aria-label="Remove point 1"]')?.disabled).toBe(true);
  });

  it('takes a pasted table as a whole', async () => {
    const { press, pasteText, points, element } = rig([[5, 20], [10, 12]]);
    await press('Paste rows');
    await pasteText('angle\tlevel\n3\t21\n9\t10\n48\t-2');
    expect(element.textContent).toContain('3 rows read, heading left out');
    await press('Use 3 rows');
    expect(points()).toEqual([[3, 21], [9, 10], [48, -2]]);
    expect(element.querySelector('textarea')).toBeNull();
  });

  it('takes nothing of a table with an unreadable entry, and names it', async () => {
    const { pasteText, press, element, points } = rig([[5, 20], [10, 12]]);
    await press('Paste rows');
    await pasteText('3\t21\n9,5\t10');
    expect(element.textContent?.replace(/\s+/g, ' ')).toContain('Line 2, column 1: 9,5 Off axis: ');
    expect([...element.querySelectorAll('button')].find((one) => one.textContent?.includes('Use 1 rows'))?.disabled).toBe(true);
    expect(points()).toEqual([[5, 20], [10, 12]]);
  });

  it('keeps a pasted table that breaks a rule in its box, and says which', async () => {
    const { pasteText, press, element, points } = rig([[5, 20], [10, 12]]);
    await press('Paste rows');
    await pasteText('9\t21\n3\t10');
    await press('Use 2 rows');
    expect(element.textContent).toContain('angles must rise; got 3 after 9°');
    expect(element.querySelector('textarea')?.value).toBe('9\t21\n3\t10');
    expect(points()).toEqual([[5, 20], [10, 12]]);
  });

  it('shows long lists page by page', async () => {
    const many = Array.from({ length: 120 }, (_, i) => [i, -i / 10]);
    const { press, element } = rig(many);
    expect(element.querySelectorAll('tbody tr')).toHaveLength(50);
    await press('Later');
    await press('Later');
    expect(element.textContent).toContain('Rows 101 to 120 of 120');
    expect(element.querySelectorAll('tbody tr')).toHaveLength(20);
  });
});
