import { TestBed } from '@angular/core/testing';
import { Confirm } from './confirm';

const question = { title: 'Disable Reviewer?', text: 'Every session of theirs ends at once.', deed: 'Disable' };

async function ask(button: string): Promise<boolean> {
  const answer = TestBed.inject(Confirm).ask(question);
  TestBed.tick();
  await new Promise((done) => setTimeout(done));
  const dialog = document.querySelector('slant-confirm-dialog');
  expect(dialog?.textContent).toContain(question.title);
  expect(dialog?.textContent).toContain(question.text);
  [...(dialog?.querySelectorAll('button') ?? [])].find(({ textContent }) => textContent?.trim() === button)?.click();
  return answer;
}

describe('confirm', () => {
  it('is true only for the deed itself', async () => {
    expect(await ask('Disable')).toBe(true);
    expect(await ask('Cancel')).toBe(false);
  });
});
