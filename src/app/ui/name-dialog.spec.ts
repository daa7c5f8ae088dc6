import { TestBed } from '@angular/core/testing';
import { AskName } from './name-dialog';

const settled = (): Promise<void> => new Promise((done) => setTimeout(done));

async function opened(): Promise<{ answer: Promise<string | undefined>; dialog: HTMLElement; name(text: string): Promise<void> }> {
  const answer = TestBed.inject(AskName).ask({ title: 'New panel', label: 'Name', deed: 'Make the panel', value: 'A' });
  TestBed.tick();
  await settled();
  const dialog = document.querySelector<HTMLElement>('slant-name-dialog');
  if (dialog === null) throw new Error('no dialog opened');
  return {
    answer,
    dialog,
    name: async (text) => {
      const field = dialog.querySelector('input');
      if (field === null) throw new Error('the dialog has no field');
      field.value = text;
      dialog.querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true }));
      TestBed.tick();
      await settled();
    },
  };
}

describe('name dialog', () => {
  it('gives back the name without the blanks around it', async () => {
    const { answer, name } = await opened();
    await name('  B, slipway wall ');
    expect(await answer).toBe('B, slipway wall');
  });

  it('says what a name is when none is given, and stays open', async () => {
    const { answer, dialog, name } = await opened();
    await name('   ');
    expect(dialog.querySelector('[role="alert"]')?.textContent).toContain('1 to 120 characters');
    await name('C');
    expect(await answer).toBe('C');
  });

  it('gives nothing back when it is cancelled', async () => {
    const { answer, dialog } = await opened();
    dialog.querySelector<HTMLButtonElement>('button[type="button"]')?.click();
    expect(await answer).toBeUndefined();
  });
});
