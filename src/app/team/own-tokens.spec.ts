import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { OwnTokens } from './own-tokens';

const token = {
  id: '6f1c1b7e-58a4-4f0b-9a53-000000000001',
  name: 'nightly check',
  scopes: ['read', 'predict'],
  createdAt: '2026-12-01T12:00:00.000Z',
  expiresAt: '2026-12-31T12:00:00.000Z',
  lastUsedAt: null,
};

describe('own tokens', () => {
  let fixture: ComponentFixture<OwnTokens>;
  let http: HttpTestingController;
  const element = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const settled = async (milliseconds = 0): Promise<void> => {
    await new Promise((done) => setTimeout(done, milliseconds));
    await fixture.whenStable();
  };

  beforeEach(async () => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(OwnTokens);
    await settled();
    http.expectOne('/api/tokens').flush({ items: [] });
    await settled();
  });
  afterEach(() => http.verify());

  async function make(): Promise<void> {
    const name = element().querySelector<HTMLInputElement>('input:not([type="checkbox"])');
    if (name === null) throw new Error('no field for the name');
    name.value = 'nightly check';
    element().querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true }));
    const call = http.expectOne({ method: 'POST', url: '/api/tokens' });
    expect(call.request.body).toEqual({ name: 'nightly check', scopes: ['read', 'predict'], days: 30 });
    call.flush({ ...token, secret: 'slw_6eOpS69BhrOBLtLpisb1' });
    await settled();
    http.expectOne({ method: 'GET', url: '/api/tokens' }).flush({ items: [token] });
    await settled();
  }

  it('show the secret of a new one once, and copy it', async () => {
    const written: string[] = [];
    Object.defineProperty(navigator, 'clipboard', { configurable: true, value: { writeText: async (text: string) => void written.push(text) } });
    await make();
    expect(element().querySelector('code')?.textContent).toBe('slw_6eOpS69BhrOBLtLpisb1');
    element().querySelector<HTMLButtonElement>('.secret button')?.click();
    await settled();
    expect(written).toEqual(['slw_6eOpS69BhrOBLtLpisb1']);
    expect(element().querySelector('.secret button')?.textContent).toBe('Copied');
    Reflect.deleteProperty(navigator, 'clipboard');
  });

  it('mark the secret where the browser has no clipboard', async () => {
    document.body.append(element());
    await make();
    element().querySelector<HTMLButtonElement>('.secret button')?.click();
    await settled();
    expect(getSelection()?.toString()).toBe('slw_6eOpS69BhrOBLtLpisb1');
    expect(element().querySelector('.secret button')?.textContent).toBe('Copy');
    element().remove();
  });

  it('are revoked after a question, and the secret on show goes with them', async () => {
    await make();
    element().querySelector<HTMLButtonElement>('[aria-label="Revoke the token nightly check"]')?.click();
    await settled();
    const dialog = document.querySelector('slant-confirm-dialog');
    expect(dialog?.textContent).toContain('refused at once');
    [...(dialog?.querySelectorAll('button') ?? [])].find(({ textContent }) => textContent?.trim() === 'Revoke')?.click();
    // The dialog closes over a moment.
    await settled(300);
    http.expectOne({ method: 'DELETE', url: `/api/tokens/${token.id}` }).flush(null);
    await settled();
    http.expectOne({ method: 'GET', url: '/api/tokens' }).flush({ items: [] });
    await settled();
    expect(element().querySelector('.secret')).toBeNull();
    expect(element().textContent).toContain('No token yet');
  });
});
