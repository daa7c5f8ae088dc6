import type { Type } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { SheetHeader } from '../sheet-header';
import { WORKSPACE_STATE } from '../workspace-state';
import { FakeWorkspace } from './fake-workspace';
import { PendingEntries } from './pending-entries';

/** A sheet on its own in front of a fake workspace, for specs: what a person sees and presses. */
export async function sheetRig<T>(sheet: Type<T>, design?: DesignDocument, providers: readonly object[] = []) {
  const workspace = new FakeWorkspace(design);
  TestBed.configureTestingModule({
    providers: [PendingEntries, SheetHeader, provideRouter([]), { provide: WORKSPACE_STATE, useValue: workspace }, ...providers],
  });
  const fixture = TestBed.createComponent(sheet);
  const element = fixture.nativeElement as HTMLElement;
  await fixture.whenStable();

  const field = (label: string): HTMLInputElement => {
    const found = [...element.querySelectorAll('label')].find((candidate) => candidate.textContent?.trim() === label);
    const box = found && element.querySelector<HTMLInputElement>(`[id="${found.htmlFor}"]`);
    if (!box) throw new Error(`no field ${label}`);
    return box;
  };
  return {
    workspace,
    fixture,
    element,
    header: TestBed.inject(SheetHeader),
    field,
    text: (): string => element.textContent?.replace(/\s+/g, ' ') ?? '',
    async press(name: string): Promise<void> {
      const button = [...element.querySelectorAll('button')].find((one) => one.textContent?.trim() === name || one.getAttribute('aria-label') === name);
      if (!button) throw new Error(`no button ${name}`);
      button.click();
      await fixture.whenStable();
    },
    async choose(name: string): Promise<void> {
      const label = [...element.querySelectorAll('label')].find((one) => one.textContent?.trim() === name && one.querySelector('input'));
      if (!label) throw new Error(`no choice ${name}`);
      label.querySelector('input')?.click();
      await fixture.whenStable();
    },
    async enter(label: string, text: string): Promise<void> {
      const box = field(label);
      box.value = text;
      box.dispatchEvent(new Event('input'));
      box.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
      await fixture.whenStable();
    },
  };
}
