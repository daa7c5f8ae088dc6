import { TestBed } from '@angular/core/testing';
import { FaultNote } from './fault-note';

async function shown(inputs: { text: string; requestId?: string }): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(FaultNote);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('fault note', () => {
  it('is read out at once and carries the id of the request apart from the text', async () => {
    const note = await shown({ text: 'The panel changed meanwhile. Read it again.', requestId: '0f9d' });
    expect(note.querySelector('[role="alert"]')?.textContent).toBe('The panel changed meanwhile. Read it again.');
    expect(note.querySelector('.request')?.textContent).toBe('Request 0f9d');
  });

  it('has no line for an id when there was no answer', async () => {
    expect((await shown({ text: 'The server does not answer.' })).querySelector('.request')).toBeNull();
  });
});
