import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import type { Type } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { ActivatedRoute, provideRouter } from '@angular/router';

export interface EntranceRig {
  readonly element: HTMLElement;
  readonly http: HttpTestingController;
  settled(): Promise<void>;
  /** The field, or an error that names it. */
  field(selector: string): HTMLInputElement;
  send(): void;
}

/** Opens a page that stands before sign-in, for specs; `fragment` is what follows # in its address. */
export async function openEntrance<T>(page: Type<T>, fragment: string | null = null, inputs: Readonly<Record<string, string>> = {}): Promise<EntranceRig> {
  Object.assign(globalThis, { ResizeObserver: class { observe(): void {} disconnect(): void {} } });
  Object.defineProperty(window, 'matchMedia', { configurable: true, value: () => ({ matches: false, addEventListener: () => undefined }) });
  TestBed.configureTestingModule({
    providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([]), { provide: ActivatedRoute, useValue: { snapshot: { fragment } } }],
  });
  const fixture = TestBed.createComponent(page);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  const element = fixture.nativeElement as HTMLElement;
  const settled = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
  };
  await settled();
  const field = (selector: string): HTMLInputElement => {
    const found = element.querySelector<HTMLInputElement>(selector);
    if (found === null) throw new Error(`no field ${selector}`);
    return found;
  };
  return { element, http: TestBed.inject(HttpTestingController), settled, field, send: () => void element.querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true })) };
}
