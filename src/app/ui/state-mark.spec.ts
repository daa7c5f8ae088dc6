import { TestBed } from '@angular/core/testing';
import { StateMark, markWord } from './state-mark';
import type { MarkState } from './state-mark';

const STATES: readonly MarkState[] = ['empty', 'in-work', 'meets', 'falls-short', 'objection', 'stale', 'not-evaluated'];

async function shown(state: MarkState, inputs: { showWord?: boolean; detail?: string } = {}): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(StateMark);
  fixture.componentRef.setInput('state', state);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('state mark', () => {
  it('has a word of its own for every state', () => {
    expect(new Set(STATES.map(markWord)).size).toBe(STATES.length);
  });

  it.each(STATES)('says its word for %s, shown or only read out', async (state) => {
    expect((await shown(state, { showWord: true })).textContent?.trim()).toBe(markWord(state));
    const hidden = await shown(state);
    expect(hidden.querySelector('.visually-hidden')?.textContent).toBe(markWord(state));
  });

  it('never draws what was not evaluated like what meets', async () => {
    const drawing = async (state: MarkState): Promise<string> => (await shown(state)).querySelector('svg')?.innerHTML ?? '';
    expect(await drawing('not-evaluated')).not.toBe(await drawing('meets'));
    expect(await drawing('falls-short')).not.toBe(await drawing('meets'));
  });

  it('adds its reason to the tooltip', async () => {
    const mark = await shown('falls-short', { detail: 'mask, by 0.29 dB' });
    expect(mark.querySelector('[title]')?.getAttribute('title')).toBe('falls short: mask, by 0.29 dB');
  });
});
