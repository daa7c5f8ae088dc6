import { TestBed } from '@angular/core/testing';
import { Theme } from './theme';

function machineWants(dark: boolean): void {
  Object.defineProperty(window, 'matchMedia', { configurable: true, value: () => ({ matches: dark, addEventListener: () => undefined }) });
}

describe('theme', () => {
  beforeEach(() => localStorage.clear());

  it('follows the machine until someone chooses', () => {
    machineWants(true);
    const theme = TestBed.inject(Theme);
    expect(theme.shown()).toBe('dark');
    theme.choose('light');
    TestBed.tick();
    expect(theme.shown()).toBe('light');
    expect(document.documentElement.dataset['theme']).toBe('light');
  });

  it('remembers a choice, and forgets nonsense', () => {
    machineWants(false);
    localStorage.setItem('slantwise.theme', 'dark');
    expect(TestBed.inject(Theme).choice()).toBe('dark');
    TestBed.resetTestingModule();
    localStorage.setItem('slantwise.theme', 'mauve');
    expect(TestBed.inject(Theme).choice()).toBe('system');
  });
});
