import { Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { WhyNot } from './why-not';

@Component({ imports: [WhyNot], template: '<button type="button" [slantWhyNot]="reason()" (click)="pressed = pressed + 1">New project</button>' })
class Host {
  readonly reason = signal<string | null>(null);
  pressed = 0;
}

describe('a control with a reason against it', () => {
  async function shown(reason: string | null): Promise<{ button: HTMLButtonElement; host: Host; settle(): Promise<unknown> }> {
    const fixture = TestBed.createComponent(Host);
    fixture.componentInstance.reason.set(reason);
    await fixture.whenStable();
    const button = (fixture.nativeElement as HTMLElement).querySelector('button');
    if (button === null) throw new Error('no button is shown');
    return { button, host: fixture.componentInstance, settle: () => fixture.whenStable() };
  }

  it('works as ever without one', async () => {
    const { button, host } = await shown(null);
    button.click();
    expect(host.pressed).toBe(1);
    expect(button.hasAttribute('aria-disabled')).toBe(false);
  });

  it('does nothing with one, stays focusable, and is described by it', async () => {
    const { button, host, settle } = await shown('This needs the role designer.');
    button.click();
    expect(host.pressed).toBe(0);
    expect(button.getAttribute('aria-disabled')).toBe('true');
    expect(button.disabled).toBe(false);
    await settle();
    await new Promise((done) => setTimeout(done, 10));
    const description = document.getElementById(button.getAttribute('aria-describedby') ?? '');
    expect(description?.textContent).toBe('This needs the role designer.');
  });

  it('is free again when the reason goes', async () => {
    const { button, host, settle } = await shown('This needs the role designer.');
    host.reason.set(null);
    await settle();
    button.click();
    expect(host.pressed).toBe(1);
    expect(button.hasAttribute('aria-disabled')).toBe(false);
  });
});
