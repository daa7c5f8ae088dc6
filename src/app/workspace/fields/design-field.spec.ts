import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { SAMPLE_HEAD } from '../sample-prediction';
import { WORKSPACE_STATE } from '../workspace-state';
import { DesignChoice } from './design-choice';
import { DesignField } from './design-field';
import { FakeWorkspace } from './fake-workspace';
import { PendingEntries } from './pending-entries';

@Component({
  imports: [DesignField, DesignChoice],
  template: `
    <slant-design-field pointer="/requirement/designFrequencyGHz" dimension="frequency" unit="GHz" />
    <slant-design-field pointer="/requirement/minGainDbi" dimension="level" unit="dBi" [optional]="true" />
    <slant-design-choice pointer="/requirement/polarisation" [options]="[{ value: 'x', label: 'x' }, { value: 'y', label: 'y' }]" />
  `,
})
class TwoFields {}

function rig() {
  const workspace = new FakeWorkspace();
  TestBed.configureTestingModule({ providers: [PendingEntries, { provide: WORKSPACE_STATE, useValue: workspace }] });
  const fixture = TestBed.createComponent(TwoFields);
  fixture.detectChanges();
  return { workspace, fixture, pending: TestBed.inject(PendingEntries) };
}

function boxOf(fixture: ComponentFixture<unknown>, label: string): HTMLInputElement {
  const element = fixture.nativeElement as HTMLElement;
  const found = [...element.querySelectorAll('label')].find((candidate) => candidate.textContent?.trim() === label);
  const box = found && element.querySelector<HTMLInputElement>(`#${found.htmlFor}`);
  if (!box) throw new Error(`no field ${label}`);
  return box;
}

async function enter(fixture: ComponentFixture<unknown>, label: string, text: string): Promise<HTMLInputElement> {
  const box = boxOf(fixture, label);
  box.value = text;
  box.dispatchEvent(new Event('input'));
  box.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
  await fixture.whenStable();
  return box;
}

const seen = (fixture: ComponentFixture<unknown>): string => (fixture.nativeElement as HTMLElement).textContent?.replace(/\s+/g, ' ') ?? '';

describe('DesignField', () => {
  it('shows the value with its unit and takes another unit', async () => {
    const { workspace, fixture } = rig();
    expect(boxOf(fixture, 'Design frequency').value).toBe('28');
    expect(seen(fixture)).toContain('GHz');
    const box = await enter(fixture, 'Design frequency', '28500 MHz');
    expect(workspace.design().requirement.designFrequencyGHz).toBe(28.5);
    expect(box.value).toBe('28.5');
    expect(workspace.stepNames()).toEqual(['Set Design frequency']);
  });

  it('writes the same value in its usual form again and counts no step', async () => {
    const { workspace, fixture } = rig();
    expect((await enter(fixture, 'Design frequency', '28e9 Hz')).value).toBe('28');
    expect(workspace.stepNames()).toEqual([]);
  });

  it('keeps a refused entry with reason and remedy, and the design as it was', async () => {
    const { workspace, fixture, pending } = rig();
    const box = await enter(fixture, 'Design frequency', '28,5');
    expect(box.value).toBe('28,5');
    expect(box.getAttribute('aria-invalid')).toBe('true');
    expect(seen(fixture)).toContain('Use 28.5');
    expect(workspace.design().requirement.designFrequencyGHz).toBe(28);
    expect(pending.all()).toHaveLength(1);
    const suggest = [...(fixture.nativeElement as HTMLElement).querySelectorAll('button')].find((button) => button.textContent === 'Use 28.5');
    suggest?.click();
    await fixture.whenStable();
    expect(workspace.design().requirement.designFrequencyGHz).toBe(28.5);
    expect(pending.all()).toEqual([]);
  });

  it('still holds a refused entry after its sheet was left and opened again', async () => {
    const { fixture } = rig();
    await enter(fixture, 'Design frequency', 'fast');
    fixture.destroy();
    const again = TestBed.createComponent(TwoFields);
    await again.whenStable();
    expect(boxOf(again, 'Design frequency').value).toBe('fast');
    expect(seen(again)).toContain('Not taken:');
  });

  it('gives a refused entry up on Escape', async () => {
    const { fixture, pending } = rig();
    const box = await enter(fixture, 'Design frequency', 'fast');
    box.dispatchEvent(new KeyboardEvent('keydown', { key: 'Escape' }));
    await fixture.whenStable();
    expect(box.value).toBe('28');
    expect(pending.all()).toEqual([]);
  });

  it('takes a limit away when its field is emptied', async () => {
    const { workspace, fixture } = rig();
    const box = await enter(fixture, 'Least gain', '');
    expect(workspace.design().requirement).not.toHaveProperty('minGainDbi');
    expect(box.placeholder).toBe('not set');
  });

  it('follows an undo', async () => {
    const { workspace, fixture } = rig();
    const box = await enter(fixture, 'Design frequency', '30');
    workspace.undo();
    await fixture.whenStable();
    expect(box.value).toBe('28');
  });

  it('steps with the arrow keys in one undo step, ten at once with Shift', async () => {
    const { workspace, fixture } = rig();
    const box = boxOf(fixture, 'Design frequency');
    box.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowUp', cancelable: true }));
    box.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowUp', shiftKey: true, cancelable: true }));
    await fixture.whenStable();
    expect(workspace.design().requirement.designFrequencyGHz).toBe(29.1);
    expect(workspace.stepNames()).toEqual(['Set Design frequency']);
  });

  it('shows the remarks of its place', async () => {
    const { workspace, fixture } = rig();
    const warning = { code: 'frequency-not-covered' as const, pointer: '#/requirement/designFrequencyGHz', severity: 'warn' as const, message: 'Described from 26 to 27 GHz', numbers: {} };
    workspace.prediction.set({ head: { ...SAMPLE_HEAD, warnings: [warning] }, cells: {} as never, cuts: [], uv: null, of: workspace.design() });
    await fixture.whenStable();
    expect(seen(fixture)).toContain('Check: Described from 26 to 27 GHz');
  });

  it('cannot be typed into by somebody who may only look', async () => {
    const { workspace, fixture } = rig();
    workspace.viewOnlyReason.set('Only designers change panels');
    await fixture.whenStable();
    expect(boxOf(fixture, 'Design frequency').readOnly).toBe(true);
  });
});

describe('DesignChoice', () => {
  it('names the step after the choice', async () => {
    const { workspace, fixture } = rig();
    const radios = (fixture.nativeElement as HTMLElement).querySelectorAll<HTMLInputElement>('input[type=radio]');
    expect(radios[0].checked).toBe(true);
    radios[1].click();
    await fixture.whenStable();
    expect(workspace.design().requirement.polarisation).toBe('y');
    expect(workspace.stepNames()).toEqual(['Polarisation: y']);
  });
});
