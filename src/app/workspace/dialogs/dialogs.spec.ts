import type { Type } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { MAT_DIALOG_DATA, MatDialogRef } from '@angular/material/dialog';
import type { DraftConflict } from '../draft-store';
import type { StripFigure } from '../strip-figures';
import { ConflictDialog } from './conflict-dialog';
import { FreezeDialog } from './freeze-dialog';
import type { FreezeQuestion } from './freeze-dialog';
import { HowComputedDialog } from './how-computed-dialog';

async function opened<T>(dialog: Type<T>, data: object) {
  const closings: unknown[] = [];
  TestBed.configureTestingModule({
    providers: [
      { provide: MAT_DIALOG_DATA, useValue: data },
      { provide: MatDialogRef, useValue: { close: (result?: unknown) => closings.push(result) } },
    ],
  });
  const fixture = TestBed.createComponent(dialog);
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  return {
    closings,
    element,
    text: () => element.textContent?.replace(/\s+/g, ' ') ?? '',
    async press(name: string) {
      [...element.querySelectorAll('button')].find((button) => button.textContent?.trim() === name)?.click();
      await fixture.whenStable();
      await fixture.whenStable();
    },
  };
}

describe('ConflictDialog', () => {
  const field = { unit: '°', base: 20, mine: 25, theirs: 40, changedBy: 'both', proposed: 'mine' };
  const conflict = {
    current: { changedBy: { name: 'Second designer' } },
    fields: [
      { ...field, pointer: '/a', label: 'Beam 1 θ' },
      { ...field, pointer: '/b', label: 'Least gain', unit: 'dBi', base: 34, mine: 34, theirs: null, changedBy: 'them', proposed: 'theirs' },
    ],
  } as unknown as DraftConflict;

  it('shows both versions of every field and proposes a side', async () => {
    const { text, element } = await opened(ConflictDialog, conflict);
    expect(text()).toContain('Second designer changed this draft as well');
    expect(text()).toContain('One field was changed by both of you.');
    expect(text()).toContain('Least gain, dBi34 34 not set');
    expect([...element.querySelectorAll<HTMLInputElement>('input')].map(({ checked }) => checked)).toEqual([true, false, false, true]);
  });

  it('gives back what was chosen', async () => {
    const { closings, press, element } = await opened(ConflictDialog, conflict);
    element.querySelector<HTMLInputElement>('[aria-label="Keep theirs for Beam 1 θ"]')?.click();
    await press('Keep as chosen');
    expect(closings).toEqual([{ '/a': 'theirs', '/b': 'theirs' }]);
  });

  it('can take one side for everything, and can wait', async () => {
    const { closings, press } = await opened(ConflictDialog, conflict);
    await press('Tick all mine');
    await press('Keep as chosen');
    await press('Decide later');
    expect(closings).toEqual([{ '/a': 'mine', '/b': 'mine' }, undefined]);
  });
});

describe('FreezeDialog', () => {
  const question = (freeze: FreezeQuestion['freeze']): FreezeQuestion => ({
    number: 4,
    parentNumber: 3,
    changes: [{ pointer: '/requirement/beams/0/thetaDeg', label: 'Beam 1 θ', unit: '°', before: 19.5, after: 20 }],
    freeze,
  });

  it('shows what changed since the parent and freezes with the message', async () => {
    const messages: string[] = [];
    const { text, element, press, closings } = await opened(FreezeDialog, question(async (message) => (messages.push(message), null)));
    expect(text()).toContain('Beam 1 θ: 19.5 → 20 °');
    const box = element.querySelector('textarea');
    if (box) box.value = '  Steered to 20 degrees ';
    await press('Freeze revision 4');
    expect([messages, closings]).toEqual([['Steered to 20 degrees'], [true]]);
  });

  it('wants a message', async () => {
    const { press, text, closings } = await opened(FreezeDialog, question(async () => null));
    await press('Freeze revision 4');
    expect(text()).toContain('Say in a few words what this revision is about.');
    expect(closings).toEqual([]);
  });

  it('keeps the message when freezing did not work', async () => {
    const { press, text, element, closings } = await opened(FreezeDialog, question(async () => 'The server is out of reach'));
    const box = element.querySelector('textarea');
    if (box) box.value = 'Fourth';
    await press('Freeze revision 4');
    expect(text()).toContain('The server is out of reach.');
    expect([box?.value, closings]).toEqual(['Fourth', []]);
  });
});

describe('HowComputedDialog', () => {
  it('shows the figure as it stands with its formula', async () => {
    const figure: StripFigure = { id: 'sidelobe', label: 'Sidelobe level', value: '−19.50', unit: 'dB', trend: null, limit: '≤ −18.0', margin: '+1.50', verdict: 'meets', gauge: null, reason: null };
    const { text, press, closings } = await opened(HowComputedDialog, figure);
    expect(text()).toContain('How computed: sidelobe level');
    expect(text()).toContain('limit ≤ −18.0, margin +1.50');
    await press('Close');
    expect(closings).toHaveLength(1);
  });
});
