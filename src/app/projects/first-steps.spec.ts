import { provideHttpClient } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import { sessionOf } from '../session/session-fixture';
import { SessionStore } from '../session/session-store';
import { FirstSteps } from './first-steps';

describe('first steps', () => {
  beforeEach(() => {
    localStorage.clear();
    TestBed.configureTestingModule({ providers: [provideHttpClient()] });
  });

  async function shown(): Promise<{ element: HTMLElement; settle(): Promise<unknown> }> {
    const fixture = TestBed.createComponent(FirstSteps);
    await fixture.whenStable();
    return { element: fixture.nativeElement as HTMLElement, settle: () => fixture.whenStable() };
  }
  const texts = (element: HTMLElement): string[] => [...element.querySelectorAll('li')].map(({ textContent }) => textContent?.trim() ?? '');

  it('are those of the roles that the person has', async () => {
    TestBed.inject(SessionStore).take(sessionOf(['lab', 'administrator']));
    const { element } = await shown();
    expect(texts(element)[0]).toContain('Import a family');
    expect(texts(element).at(-1)).toContain('Invite people');
  });

  it('can be ticked off, and stay so in this browser', async () => {
    TestBed.inject(SessionStore).take(sessionOf(['designer']));
    const first = await shown();
    expect(first.element.textContent).toContain('0 of 4 done');
    first.element.querySelectorAll('input')[1].click();
    await first.settle();
    expect(first.element.textContent).toContain('1 of 4 done');
    const again = await shown();
    expect([...again.element.querySelectorAll('input')].map(({ checked }) => checked)).toEqual([false, true, false, false]);
  });

  it('go for good when they are dismissed', async () => {
    TestBed.inject(SessionStore).take(sessionOf(['designer']));
    const { element, settle } = await shown();
    element.querySelector('button')?.click();
    await settle();
    expect(element.textContent?.trim()).toBe('');
    expect((await shown()).element.textContent?.trim()).toBe('');
  });

  it('take no room for roles that have none', async () => {
    TestBed.inject(SessionStore).take(sessionOf(['fabricator']));
    expect((await shown()).element.textContent?.trim()).toBe('');
  });
});
