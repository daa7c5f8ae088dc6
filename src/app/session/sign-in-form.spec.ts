import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { sessionOf } from './session-fixture';
import { SignInForm } from './sign-in-form';

describe('sign-in form', () => {
  let fixture: ComponentFixture<SignInForm>;
  let http: HttpTestingController;
  let signedIn: number;
  const element = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const field = (name: string): HTMLInputElement => {
    const found = element().querySelector<HTMLInputElement>(`input[name="${name}"]`);
    if (found === null) throw new Error(`no field ${name}`);
    return found;
  };
  const send = async (email: string, password: string): Promise<void> => {
    field('email').value = email;
    field('password').value = password;
    element().querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true }));
    await fixture.whenStable();
  };
  const settled = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
  };

  beforeEach(async () => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(SignInForm);
    signedIn = 0;
    fixture.componentInstance.signedIn.subscribe(() => (signedIn += 1));
    document.body.append(element());
    await fixture.whenStable();
  });
  afterEach(() => {
    http.verify();
    element().remove();
  });

  it('is understood by password managers and hides the password until it is asked to show it', async () => {
    expect(field('email').autocomplete).toBe('username');
    expect(field('password').autocomplete).toBe('current-password');
    expect(field('password').type).toBe('password');
    element().querySelector<HTMLButtonElement>('button[aria-label="Show the password"]')?.click();
    await fixture.whenStable();
    expect(field('password').type).toBe('text');
  });

  it('asks for what is missing before it asks the server', async () => {
    await send('', 'secret');
    expect(element().querySelector('[role="alert"]')?.textContent).toContain('e-mail address');
    expect(document.activeElement).toBe(field('email'));
    await send('designer@merrow.example', '');
    expect(element().querySelector('[role="alert"]')?.textContent).toContain('Type the password');
    expect(document.activeElement).toBe(field('password'));
  });

  it('signs in', async () => {
    await send('designer@merrow.example', 'right');
    const call = http.expectOne({ method: 'POST', url: '/api/session' });
    expect(call.request.body).toEqual({ email: 'designer@merrow.example', password: 'right' });
    call.flush(sessionOf(['designer']));
    await settled();
    expect(signedIn).toBe(1);
  });

  it('says what the server said, with the id of the request, and marks the password to be typed over', async () => {
    await send('designer@merrow.example', 'wrong');
    const refusal = { type: '/problems/not-signed-in', title: 'Not signed in', status: 401, detail: 'Address or password is wrong.', requestId: '3523' };
    http.expectOne('/api/session').flush(refusal, { status: 401, statusText: 'Unauthorized' });
    await settled();
    expect(element().querySelector('slant-fault-note')?.textContent).toContain('Address or password is wrong.');
    expect(element().querySelector('slant-fault-note')?.textContent).toContain('3523');
    expect(document.activeElement).toBe(field('password'));
    expect(field('password').selectionEnd).toBe(5);
    expect(signedIn).toBe(0);
  });

  it('sends once, however often the button is pressed meanwhile', async () => {
    await send('designer@merrow.example', 'right');
    await send('designer@merrow.example', 'right');
    http.expectOne('/api/session').flush(sessionOf(['designer']));
    await settled();
    expect(signedIn).toBe(1);
  });
});
