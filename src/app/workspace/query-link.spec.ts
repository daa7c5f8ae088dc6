import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { queryLink } from './query-link';

@Component({ selector: 'slant-linked-view', changeDetection: ChangeDetectionStrategy.OnPush, template: '{{ floor() }}' })
class LinkedView {
  readonly floor = queryLink(
    (query) => Number(query.get('floor') ?? 50),
    (floor) => ({ floor: floor === 50 ? null : String(floor) }),
  );
}

describe('queryLink', () => {
  let harness: RouterTestingHarness;
  beforeEach(async () => {
    TestBed.configureTestingModule({ providers: [provideRouter([{ path: 'view', component: LinkedView }])] });
    harness = await RouterTestingHarness.create();
  });
  const rest = () => new Promise((done) => setTimeout(done, 300));

  it('starts with what the address says', async () => {
    const view = await harness.navigateByUrl('/view?floor=40', LinkedView);
    expect(view.floor()).toBe(40);
  });
  it('writes the state into the address when it rests, next to what others keep there', async () => {
    const view = await harness.navigateByUrl('/view?other=1', LinkedView);
    for (const floor of [30, 35, 60]) view.floor.set(floor);
    harness.detectChanges();
    await rest();
    expect(TestBed.inject(Router).url).toBe('/view?other=1&floor=60');
  });
  it('keeps what changes while the address is being written', async () => {
    const view = await harness.navigateByUrl('/view', LinkedView);
    view.floor.set(30);
    harness.detectChanges();
    await new Promise((done) => setTimeout(done, 252));
    view.floor.set(35);
    harness.detectChanges();
    await rest();
    expect([view.floor(), TestBed.inject(Router).url]).toEqual([35, '/view?floor=35']);
  });
  it('follows back and forward, and leaves the address when it is as at first', async () => {
    const view = await harness.navigateByUrl('/view?floor=40', LinkedView);
    await TestBed.inject(Router).navigateByUrl('/view?floor=20');
    expect(view.floor()).toBe(20);
    view.floor.set(50);
    harness.detectChanges();
    await rest();
    expect(TestBed.inject(Router).url).toBe('/view');
  });
});
