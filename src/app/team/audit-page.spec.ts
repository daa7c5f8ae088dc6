import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { AuditPage } from './audit-page';

const row = (sequence: number, action: string): object => ({
  sequence,
  at: '2026-12-01T12:00:00.000Z',
  person: null,
  action,
  object: 'panel:42ae568d-9fdb-4718-8f0a-111111111111',
  detail: { before: 'A', after: 'B' },
  hash: 'c53d4cd1b253'.padEnd(64, '0'),
});

describe('audit page', () => {
  let fixture: ComponentFixture<AuditPage>;
  let http: HttpTestingController;
  const element = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const settled = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
  };
  async function open(page: object): Promise<void> {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])] });
    Object.assign(globalThis, { ResizeObserver: class { observe(): void {} disconnect(): void {} } });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(AuditPage);
    await settled();
    http.expectOne('/api/audit?limit=100').flush(page);
    await settled();
  }

  it('says that the chain of hashes is whole, and what was done to what', async () => {
    await open({ items: [row(1, 'panel.renamed')], next: null, chainIntact: true });
    expect(element().querySelector('[role="status"]')?.textContent).toContain('the chain of hashes is whole');
    const cells = [...element().querySelectorAll('tbody td')].map(({ textContent }) => textContent?.trim());
    expect(cells.slice(2)).toEqual(['the system', 'panel.renamed', 'panel 42ae568d', 'before A; after B', 'c53d4cd1b253']);
  });

  it('never hides a broken chain', async () => {
    await open({ items: [row(1, 'panel.renamed')], next: null, chainIntact: false });
    expect(element().querySelector('.fail')?.textContent).toContain('the chain of hashes is broken');
  });

  it('appends older rows', async () => {
    await open({ items: [row(2, 'panel.renamed')], next: 'cursor', chainIntact: true });
    [...element().querySelectorAll('button')].find(({ textContent }) => textContent === 'Older')?.click();
    http.expectOne('/api/audit?limit=100&after=cursor').flush({ items: [row(1, 'panel.created')], next: null, chainIntact: true });
    await settled();
    expect([...element().querySelectorAll('tbody tr td:first-child')].map(({ textContent }) => textContent)).toEqual(['2', '1']);
    expect(element().textContent).not.toContain('Older');
  });
});
